import { signedRingArea } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import type { Box, Point, Region } from "../geometry/path.ts";

/** An outline's edges that look one way along an axis: where they lie across it, and where along it at both ends. */
type Face = { readonly low: number; readonly high: number; readonly atLow: number; readonly atHigh: number };

/** A shape as far as sliding it left or up is concerned. */
export type Slider = {
  readonly box: Box;
  readonly left: readonly Face[];
  readonly right: readonly Face[];
  readonly top: readonly Face[];
  readonly bottom: readonly Face[];
};

/** Edges that meet over less than this do not hold each other up, mm; so a shape slides along another it touches. */
const grazingMm = 1e-6;
/** What overlaps by less than this touches, mm. */
const touchingMm = 1e-4;

/** The outer and inner edges of a region that the kernel gave, mirrored or not. */
export function sliderOf(region: Region): Slider {
  const faces = { left: [] as Face[], right: [] as Face[], top: [] as Face[], bottom: [] as Face[] };
  // The ring with the most area is an outer one and tells which way round the region runs.
  const largest = region.reduce((most, ring) => (bulk(ring) > bulk(most) ? ring : most), region[0] ?? []);
  const sense = signedRingArea(largest) < 0 ? -1 : 1;
  for (const ring of region) {
    let previous = ring.at(-1);
    for (const point of ring) {
      if (previous) addFaces(faces, previous, point, sense);
      previous = point;
    }
  }
  return { ...faces, box: boxOfRegion(region) ?? { x: 0, y: 0, width: 0, height: 0 } };
}

const bulk = (ring: readonly Point[]): number => Math.abs(signedRingArea(ring));

function addFaces(faces: Record<"left" | "right" | "top" | "bottom", Face[]>, a: Point, b: Point, sense: number): void {
  // Clockwise on the sheet, material lies to the right of the way: an edge that runs down looks right, one that runs left looks down.
  if (b.y !== a.y) {
    const face = a.y < b.y ? faceOf(a.y, b.y, a.x, b.x) : faceOf(b.y, a.y, b.x, a.x);
    faces[(b.y - a.y) * sense > 0 ? "right" : "left"].push(face);
  }
  if (b.x !== a.x) {
    const face = a.x < b.x ? faceOf(a.x, b.x, a.y, b.y) : faceOf(b.x, a.x, b.y, a.y);
    faces[(b.x - a.x) * sense > 0 ? "top" : "bottom"].push(face);
  }
}

const faceOf = (low: number, high: number, atLow: number, atHigh: number): Face => ({ low, high, atLow, atHigh });

/** How far `moving`, laid at `at`, can slide left ("x") or up ("y") before it meets `standing`, laid at `other`; at most `far`, mm. */
export function slideDistance(
  axis: "x" | "y",
  moving: Slider,
  at: Point,
  standing: Slider,
  other: Point,
  far: number,
): number {
  const across = axis === "x" ? "y" : "x";
  const alongSize = axis === "x" ? "width" : "height";
  const acrossSize = axis === "x" ? "height" : "width";
  const shift = at[axis] - other[axis];
  const offset = at[across] - other[across];
  const from = moving.box[across] + offset;
  const meets =
    from < standing.box[across] + standing.box[acrossSize] - grazingMm &&
    from + moving.box[acrossSize] > standing.box[across] + grazingMm;
  const behind = moving.box[axis] + moving.box[alongSize] + shift < standing.box[axis];
  const beyond = moving.box[axis] + shift - far > standing.box[axis] + standing.box[alongSize];
  if (!meets || behind || beyond) return far;
  let least = far;
  for (const face of axis === "x" ? moving.left : moving.top) {
    const low = face.low + offset;
    const high = face.high + offset;
    for (const wall of axis === "x" ? standing.right : standing.bottom) {
      const start = Math.max(low, wall.low);
      const end = Math.min(high, wall.high);
      if (end - start <= grazingMm) continue;
      const gap = Math.min(
        level(face, start - offset) + shift - level(wall, start),
        level(face, end - offset) + shift - level(wall, end),
      );
      if (gap > -touchingMm && gap < least) least = Math.max(0, gap);
    }
  }
  return least;
}

function level({ low, high, atLow, atHigh }: Face, at: number): number {
  return atLow + ((atHigh - atLow) * (at - low)) / (high - low);
}
