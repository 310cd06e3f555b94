import { boxCentre, boxesOverlap, boxOfRegion } from "../geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import type { Box, Point, Region } from "../geometry/path.ts";
import { type SmallestBox, smallestBox } from "../geometry/smallest-box.ts";
import { isShorter } from "../geometry/tolerance.ts";

/**
 * Outlines that a disc round a hole may not cross, so that it lies on one level: the cap's over what lies on the piece,
 * the barrel's foot over what lies under it. A side says where the hole must be besides.
 */
export type Level = {
  readonly outlines: Region;
  readonly diameter: number;
  readonly side?: "inside" | "outside";
  /** Round the outlines, for who asks of many places. */
  readonly box?: Box;
};

/** Where a hole may be. All mm. */
export type HoleConstraints = {
  /** From a hole's middle to the nearest edge of the piece. */
  readonly edge: number;
  /** From a hole's middle to the next one's. */
  readonly apart: number;
  readonly level: readonly Level[];
};

/** How many places are tried on the way from a corner to the middle. */
const tries = 60;
/** No piece takes more holes than this; a wrong pitch must not fill it. */
const mostHoles = 400;

/** Whether a hole may be there. */
export function mayHoleBeAt(point: Point, piece: Region, { edge, level }: HoleConstraints): boolean {
  if (!(regionContains(piece, point) && !isShorter(distanceToRegionEdgeMm(piece, point), edge))) return false;
  return level.every((one) => keepsLevel(point, one));
}

/** Whether a disc round a place crosses no outline and lies on the side that is asked for. */
export function keepsLevel(point: Point, { outlines, diameter, side, box: known }: Level): boolean {
  const radius = diameter / 2;
  const box = known ?? boxOfRegion(outlines);
  const around = { x: point.x - radius, y: point.y - radius, width: diameter, height: diameter };
  if (!box || !boxesOverlap(box, around)) return side !== "inside";
  if (isShorter(distanceToRegionEdgeMm(outlines, point), radius)) return false;
  return side === undefined || regionContains(outlines, point) === (side === "inside");
}

/**
 * Holes towards the four corners of a piece's box, as far out as they may be: upper left, upper right, lower left, lower
 * right. A piece that has no room for four gets fewer; one without room gets none. `fits` may ask for more of them all,
 * as that each still has a window when the panel moves: then they come nearer each other until it says yes, and stay
 * outermost when it never does without losing a hole.
 */
export function cornerHoles(
  piece: Region,
  constraints: HoleConstraints,
  fits: (holes: readonly Point[]) => boolean = () => true,
): Point[] {
  const outermost = cornersFrom(piece, constraints, 1);
  for (let first = 1; first <= tries; first++) {
    const holes = cornersFrom(piece, constraints, first);
    if (holes.length < outermost.length) break;
    if (fits(holes)) return holes;
  }
  return outermost;
}

/** Corners from the `first` of the places on the way to the middle. */
function cornersFrom(piece: Region, constraints: HoleConstraints, first: number): Point[] {
  const box = boxOfRegion(piece);
  if (!box) return [];
  const middle = boxCentre(box);
  const found: Point[] = [];
  for (const [dx, dy] of [
    [-1, -1],
    [1, -1],
    [-1, 1],
    [1, 1],
  ] as const) {
    const corner = { x: middle.x + (dx * box.width) / 2, y: middle.y + (dy * box.height) / 2 };
    for (let step = first; step <= tries; step++) {
      const part = step / tries;
      const point = { x: corner.x + (middle.x - corner.x) * part, y: corner.y + (middle.y - corner.y) * part };
      if (!mayHoleBeAt(point, piece, constraints)) continue;
      if (isApart(point, found, constraints.apart)) found.push(point);
      break;
    }
  }
  return found;
}

/**
 * Holes in rows and columns over a piece's box, evenly, no further than `pitch` mm from each other along x and y, the
 * outer ones at the edge distance. Places where no hole may be are left out. Row by row from the top.
 */
export function evenHoles(piece: Region, constraints: HoleConstraints, pitch: number): Point[] {
  const box = boxOfRegion(piece);
  if (!box || !(pitch > 0)) return [];
  const columns = evenPlaces(box.x + constraints.edge, box.x + box.width - constraints.edge, pitch);
  const rows = evenPlaces(box.y + constraints.edge, box.y + box.height - constraints.edge, pitch);
  const found: Point[] = [];
  for (const y of rows) {
    for (const x of columns) {
      const point = { x, y };
      if (found.length >= mostHoles) return found;
      if (mayHoleBeAt(point, piece, constraints) && isApart(point, found, constraints.apart)) found.push(point);
    }
  }
  return found;
}

/**
 * Holes in one row along the middle of a piece's smallest box, evenly, no further than `pitch` mm from each other, the
 * outer ones at the edge distance: for what is too narrow for two rows. Places where no hole may be are left out. `fits`
 * as for the corners.
 */
export function rowHoles(
  piece: Region,
  constraints: HoleConstraints,
  pitch: number,
  fits: (holes: readonly Point[]) => boolean = () => true,
): Point[] {
  const box = smallestBox(piece);
  if (!box || !(pitch > 0)) return [];
  const half = Math.max(0, box.length / 2 - constraints.edge);
  const outermost = rowOf(piece, box, constraints, half, pitch);
  for (let step = 0; step < tries; step++) {
    const holes = rowOf(piece, box, constraints, half * (1 - step / tries), pitch);
    if (holes.length < Math.min(2, outermost.length)) break;
    if (fits(holes)) return holes;
  }
  return outermost;
}

function rowOf(
  piece: Region,
  { centre, turn }: SmallestBox,
  constraints: HoleConstraints,
  half: number,
  pitch: number,
): Point[] {
  const angle = (turn * Math.PI) / 180;
  const found: Point[] = [];
  for (const along of evenPlaces(-half, half, pitch)) {
    const point = { x: centre.x + along * Math.cos(angle), y: centre.y + along * Math.sin(angle) };
    if (mayHoleBeAt(point, piece, constraints) && isApart(point, found, constraints.apart)) found.push(point);
  }
  return found;
}

/** Both ends and as many between as the pitch asks for; the middle where the ends have crossed. */
function evenPlaces(from: number, to: number, pitch: number): number[] {
  if (!(to > from)) return [(from + to) / 2];
  const gaps = Math.min(mostHoles, Math.ceil((to - from) / pitch - 1e-9));
  return Array.from({ length: gaps + 1 }, (_, index) => from + ((to - from) * index) / gaps);
}

function isApart(point: Point, others: readonly Point[], apart: number): boolean {
  return others.every((other) => !isShorter(Math.hypot(other.x - point.x, other.y - point.y), apart));
}
