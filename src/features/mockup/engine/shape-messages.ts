import type { ShapeMade, ShapeTask } from "./work-shape.ts";

export type ShapeQuestion = { readonly sequence: number; readonly task: ShapeTask };
export type ShapeAnswer = { readonly sequence: number } & (
  | { readonly ok: true; readonly made: ShapeMade }
  | { readonly ok: false; readonly reason: string }
);

/** The ends of a worker that shapes pieces; tests put the same work behind them without one. */
export type ShapePort = {
  readonly postMessage: (question: ShapeQuestion) => void;
  readonly addEventListener: (type: "message", listener: (event: { data: ShapeAnswer }) => void) => void;
  readonly terminate: () => void;
};
