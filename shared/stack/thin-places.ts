import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { boxGrow, boxOfRegion } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";

export type ThinPlace = { readonly region: Region; readonly where: Point };

/** The first step takes this much less a side, so that a stroke of just the limit is left a line to grow from. */
const leftMm = 0.005;
/** The second step gives this much more a side, so that the grid takes no slivers along the edges. */
const slackMm = 0.02;
/** Less than this share of the limit's square is a rounded-off corner, not a stroke. */
const smallestShare = 0.05;

/**
 * Where a region is narrower than `widthMm`: what an opening of that width takes away. The opening's second step is
 * mitred, so that corners of 45° and more are not taken for strokes; tips of 30° and less are, since there the material
 * runs out.
 */
export function thinPlaces(region: Region, widthMm: number, kernel: Kernel): ThinPlace[] {
  if (region.length === 0 || !(widthMm > 0)) return [];
  return remembered(kernel, region, `thin places ${widthMm}`, () => lostToOpening(region, widthMm, kernel));
}

function lostToOpening(region: Region, widthMm: number, kernel: Kernel): ThinPlace[] {
  const half = Math.max(0, widthMm / 2 - leftMm);
  const opened = kernel.offset(kernel.offset(region, -half, "round"), half + slackMm, "mitre");
  const lost = kernel.difference(region, opened);
  return connectedPieces(lost)
    .filter((part) => regionAreaMm2(part) > smallestShare * widthMm * widthMm)
    .map((part) => ({ region: part, where: regionCentroid(part) ?? part[0]?.[0] ?? { x: 0, y: 0 } }));
}

/** Where a gap inside a region or between its parts is narrower than `widthMm`: the same, for what is not material. */
export function thinGaps(region: Region, widthMm: number, kernel: Kernel): ThinPlace[] {
  const box = boxOfRegion(region);
  if (!box) return [];
  const around = flattenPath(rectanglePath(boxGrow(box, 3 * widthMm)));
  return thinPlaces(kernel.difference(around, region), widthMm, kernel);
}

/**
 * The least width in mm that a region has in one of its thin places, to 0.02 mm, looked for up to `limitMm`. 0 where it
 * runs out to a point; null when nothing is thinner than the limit.
 */
export function thinnestWidth(
  region: Region,
  limitMm: number,
  kernel: Kernel,
): { readonly widthMm: number; readonly where: Point } | null {
  return remembered(kernel, region, `thinnest width ${limitMm}`, () => searchThinnest(region, limitMm, kernel));
}

function searchThinnest(
  region: Region,
  limitMm: number,
  kernel: Kernel,
): { readonly widthMm: number; readonly where: Point } | null {
  let found = thinPlaces(region, limitMm, kernel);
  if (found.length === 0) return null;
  let passes = 0;
  let fails = limitMm;
  while (fails - passes > 0.02) {
    const middle = (passes + fails) / 2;
    const thinner = thinPlaces(region, middle, kernel);
    if (thinner.length === 0) passes = middle;
    else {
      fails = middle;
      found = thinner;
    }
  }
  const where = found[0]?.where;
  return where ? { widthMm: passes, where } : null;
}
