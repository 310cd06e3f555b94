import type { BareSign, LaidBoard } from "./lay-board.ts";

export type BoardQuestion = { readonly sequence: number; readonly sign: BareSign };
export type BoardAnswer = { readonly sequence: number } & (
  | { readonly ok: true; readonly laid: LaidBoard }
  | { readonly ok: false; readonly reason: string }
);

/** The ends of a worker that lays boards; tests put the same work behind them without one. */
export type BoardPort = {
  readonly postMessage: (question: BoardQuestion) => void;
  readonly addEventListener: (type: "message", listener: (event: { data: BoardAnswer }) => void) => void;
  readonly terminate: () => void;
};
