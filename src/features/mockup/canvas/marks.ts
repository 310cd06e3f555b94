import type { Box, Point } from "#shared/geometry/path.ts";
import type { CapCover } from "../model/cap-covers.ts";
import type { Guide } from "../model/catch-guides.ts";
import type { Measure } from "../model/move-measures.ts";

/** A distance with its figure in the person's unit. */
export type LetteredMeasure = Measure & { readonly text: string };

/** A box that a hand draws, and the boxes of the pieces that it would choose. */
export type Sweep = { readonly box: Box; readonly within: readonly Box[] };

/** What is drawn over the picture to guide the hand. All in mm of the board. */
export type Marks = {
  /** Boxes of what is chosen. */
  readonly chosen: readonly Box[];
  /** The hole that is picked out, with its cap's diameter. */
  readonly hole: (Point & { readonly diameter: number }) | null;
  /** The holes of the chosen layer with what covers them. */
  readonly covers: readonly CapCover[];
  readonly guides: readonly Guide[];
  readonly measures: readonly LetteredMeasure[];
  readonly sweep: Sweep | null;
  /** A spot that a finding points at. */
  readonly spot: Point | null;
};

export const noMarks: Marks = { chosen: [], hole: null, covers: [], guides: [], measures: [], sweep: null, spot: null };
