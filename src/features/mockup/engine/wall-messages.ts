import type { OnWall } from "#shared/drawing/on-wall.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { AskPort } from "./use-asked.ts";

export type WallAsked = { readonly document: MockupDocument; readonly unit: LengthUnit };
export type WallSaid = { readonly ok: true; readonly onWall: OnWall } | { readonly ok: false; readonly reason: string };

export type WallQuestion = WallAsked & { readonly sequence: number };
export type WallAnswer = WallSaid & { readonly sequence: number };
export type WallPort = AskPort<WallAsked, WallSaid>;
