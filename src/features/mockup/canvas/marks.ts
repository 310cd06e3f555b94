import type { Box, Point } from "#shared/geometry/path.ts";
import type { Guide } from "../model/catch-guides.ts";

/** What is drawn over the picture to guide the hand. All in mm of the board. */
export type Marks = {
  /** Boxes of what is chosen. */
  readonly chosen: readonly Box[];
  /** The hole that is picked out, with its cap's diameter. */
  readonly hole: (Point & { readonly diameter: number }) | null;
  readonly guides: readonly Guide[];
  /** A spot that a finding points at. */
  readonly spot: Point | null;
};

export const noMarks: Marks = { chosen: [], hole: null, guides: [], spot: null };
