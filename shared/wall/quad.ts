import type { Point } from "../geometry/path.ts";

/** Four corners: upper left, upper right, lower right, lower left. */
export type Quad = readonly [Point, Point, Point, Point];

/** Why four marked corners can't be those of a sheet on a wall. */
export type CornerFault = "crossed" | "mirrored" | "too small" | "in a line";

/** What the fault is and what to do, for the reader. */
export const cornerFaultWords: Readonly<Record<CornerFault, string>> = {
  crossed:
    "The corners cross. Put each on its own corner of the sheet: upper left, upper right, lower right, lower left.",
  mirrored:
    "The corners run the wrong way round. Upper left and upper right have changed places with those below or beside.",
  "too small":
    "The sheet is too small in the photo to measure by. Mark one at least 40 px wide and high, or take the photo from nearer.",
  "in a line": "Three corners lie in a line. Put each on its own corner of the sheet.",
};

/** Sides shorter than this, px, say nothing of the wall: a corner marked one px off would be 2.5 % of it. */
const leastSidePx = 40;
/** Sine of the smallest angle between two sides. */
const leastSine = 0.02;

/**
 * What is wrong with the corners of a sheet as marked in a photo (px, y down); null when nothing is. A sheet seen from
 * before its wall is convex and runs clockwise, from wherever the photo is taken.
 */
export function cornerFault(corners: Quad): CornerFault | null {
  const turns = corners.map((_, index) => turnAt(corners, index));
  if (turns.some((turn) => !Number.isFinite(turn))) return "crossed";
  if (turns.some((turn) => Math.abs(turn) < leastSine)) return "in a line";
  if (turns.every((turn) => turn < 0)) return "mirrored";
  if (turns.some((turn) => turn < 0)) return "crossed";
  const shortest = Math.min(...corners.map((corner, index) => lengthOf(corner, cornerAt(corners, index + 1))));
  return shortest < leastSidePx ? "too small" : null;
}

/** Sine of the turn from the side before a corner into the one after it: above 0 to the right, as a clock's hand. */
function turnAt(corners: Quad, index: number): number {
  const [before, at, after] = [cornerAt(corners, index + 3), cornerAt(corners, index), cornerAt(corners, index + 1)];
  const [ax, ay, bx, by] = [at.x - before.x, at.y - before.y, after.x - at.x, after.y - at.y];
  const lengths = Math.hypot(ax, ay) * Math.hypot(bx, by);
  return lengths === 0 ? 0 : (ax * by - ay * bx) / lengths;
}

const lengthOf = (a: Point, b: Point): number => Math.hypot(b.x - a.x, b.y - a.y);

/** The corner of that place, counted round. */
export function cornerAt([a, b, c, d]: Quad, index: number): Point {
  const place = ((index % 4) + 4) % 4;
  return place === 0 ? a : place === 1 ? b : place === 2 ? c : d;
}

/** The same done to each corner. */
export function mapQuad([a, b, c, d]: Quad, map: (corner: Point) => Point): Quad {
  return [map(a), map(b), map(c), map(d)];
}
