import type { AskPort } from "./use-asked.ts";
import type { ShapeMade, ShapeTask } from "./work-shape.ts";

export type ShapeAsked = { readonly task: ShapeTask };
export type ShapeSaid =
  | { readonly ok: true; readonly made: ShapeMade }
  | { readonly ok: false; readonly reason: string };

export type ShapeQuestion = ShapeAsked & { readonly sequence: number };
export type ShapeAnswer = ShapeSaid & { readonly sequence: number };
export type ShapePort = AskPort<ShapeAsked, ShapeSaid>;
