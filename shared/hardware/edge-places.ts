import { boxOfRegion } from "../geometry/box.ts";
import { regionContains } from "../geometry/contains.ts";
import type { Box, Point, Region } from "../geometry/path.ts";
import { isShorter, lengthsEqual } from "../geometry/tolerance.ts";
import { edgeOverlapMm } from "./edge-grip.ts";
import { keepsLevel, type Level } from "./hole-proposals.ts";

type Holder = { readonly barrelDiameter: number; readonly gripDepth: number };

/** Where along the upper and lower edge a holder is tried: at a quarter first, then nearer the corner, then the middle. */
const shares = [0.25, 0.2, 0.3, 0.15, 0.35, 0.1, 0.4, 0.05, 0.45] as const;
/** Half a kernel step is reached in so many halvings of a sign's height. */
const halvings = 40;

/**
 * Places of edge grips on a piece: two at its upper edge and two at its lower one, which carry it, so far out that the
 * slot reaches over the edge by its depth: the middle half a holder less that outside. Where an edge slopes or curves
 * that is measured to the nearest point of it. A place that `level` does not allow is tried along the edge; without any
 * it is left out. Upper left, upper right, lower left, lower right.
 */
export function edgeGripPlaces(piece: Region, holder: Holder, level: readonly Level[]): Point[] {
  const box = boxOfRegion(piece);
  if (!box) return [];
  const found: Point[] = [];
  for (const side of [-1, 1] as const) {
    for (const half of ["left", "right"] as const) {
      const places = shares.map((share) => (half === "left" ? share : 1 - share)).map((share) => ({ share, side }));
      const place = places
        .map((one) => placeAt(piece, box, holder, one))
        .find(
          (one): one is Point =>
            one !== null &&
            level.every((each) => keepsLevel(one, each)) &&
            found.every(({ x, y }) => !isShorter(Math.hypot(x - one.x, y - one.y), holder.barrelDiameter)),
        );
      if (place) found.push(place);
    }
  }
  return found;
}

/** From outside towards the piece until the slot is over the edge by its depth; null where it comes upon no edge. */
function placeAt(
  piece: Region,
  box: Box,
  { barrelDiameter, gripDepth }: Holder,
  { share, side }: { readonly share: number; readonly side: -1 | 1 },
): Point | null {
  const x = box.x + share * box.width;
  const middle = box.y + box.height / 2;
  const at = (out: number): Point => ({ x, y: middle + side * out });
  let outside = box.height / 2 + barrelDiameter;
  // A point of the edge on the way: the outermost place that lies in the piece, by steps of a holder's quarter.
  let inside = outside;
  while (inside > 0 && !regionContains(piece, at(inside))) inside -= barrelDiameter / 4;
  if (!regionContains(piece, at(inside))) return null;
  for (let step = 0; step < halvings; step++) {
    const between = (inside + outside) / 2;
    if (edgeOverlapMm(barrelDiameter, piece, at(between)) > gripDepth) inside = between;
    else outside = between;
  }
  const place = at(outside);
  return lengthsEqual(edgeOverlapMm(barrelDiameter, piece, place), gripDepth, 0.01) ? place : null;
}
