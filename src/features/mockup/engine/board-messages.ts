import type { BareSign, LaidBoard } from "./lay-board.ts";
import type { AskPort } from "./use-asked.ts";

type Asked = { readonly sign: BareSign };
type Said = { readonly ok: true; readonly laid: LaidBoard } | { readonly ok: false; readonly reason: string };

export type BoardQuestion = { readonly sequence: number } & Asked;
export type BoardAnswer = { readonly sequence: number } & Said;
export type BoardPort = AskPort<Asked, Said>;
