import type { LimitUnit } from "../limit-units.ts";
import type { Limits } from "../limits.ts";

export type LimitKey = keyof Limits;

/** The headings under which the limits stand, in order. */
export const limitHeadings = {
  support: "Support under bonded pieces",
  strokes: "Thin strokes",
  holes: "Holes under caps",
  movement: "Movement of acrylic and wood",
  bonds: "What a bond takes",
  edges: "Holes near an edge",
  pockets: "Pockets",
  grip: "Grip of standoffs",
  screws: "Screws in the wood",
  caps: "Caps and feet",
  stiffness: "Push and sag",
  bed: "Bed of the machine",
  stock: "Stock on hand",
  colour: "Colour against artwork",
  lettering: "Lettering",
  pieces: "Small, handed and similar pieces",
  slats: "Slats and frames",
  hanging: "Hanging and safety",
} as const;

export type LimitText = {
  readonly group: keyof typeof limitHeadings;
  /** The rules that keep to it. */
  readonly rules: readonly number[];
  readonly label: string;
  readonly unit: LimitUnit;
  /** Where the default comes from, and what it is for. */
  readonly why: string;
};

export type LimitTexts = Readonly<Partial<Record<LimitKey, LimitText>>>;
