import { regionAreaMm2 } from "../geometry/area.ts";
import { boxesOverlap, boxGrow, boxOfRegion } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import { type ThinPlace, thinPlaces } from "../stack/thin-places.ts";
import { lengthRange } from "../units/outcome.ts";

/** A corner loses half its width over less than this many limits of length: it is as steep as 14° (our choice). */
const cornerLimits = 4;
/** Up to this share of a corner's length is narrower than a quarter of the limit; of a slot all or nothing is. */
const mostCornerLeft = 0.75;

/**
 * The narrowest gap inside a region or between its parts, in mm to 0.02, looked for up to `limitMm`, with its place; null
 * when no gap is narrower, or when there is nothing to look at. The corner where two strokes meet narrows to nothing too, but it is cut and cleaned from its
 * open side, so it is no gap unless it is long.
 */
export function thinnestGap(
  region: Region,
  limitMm: number,
  kernel: Kernel,
): { readonly widthMm: number; readonly where: Point } | null {
  const box = boxOfRegion(region);
  if (!box || !(limitMm > 0 && limitMm <= lengthRange.most)) return null;
  // Far enough out that the space between outline and frame is no gap.
  const around = flattenPath(rectanglePath(boxGrow(box, 3 * limitMm)));
  const air = kernel.difference(around, region);
  const places = thinPlaces(air, limitMm, kernel);
  if (places.length === 0) return null;
  const narrow = thinPlaces(air, limitMm / 4, kernel);
  const gaps = places.filter((place) => !isCorner(place, narrow, limitMm, kernel));
  return narrowestOf(gaps, air, limitMm, kernel);
}

function isCorner(place: ThinPlace, narrow: readonly ThinPlace[], limitMm: number, kernel: Kernel): boolean {
  const length = lengthOf(place);
  if (length >= cornerLimits * limitMm) return false;
  const left = narrow.filter((other) => sharedArea(place, other, kernel) > 0).map(lengthOf);
  return left.length > 0 && Math.max(...left) < mostCornerLeft * length;
}

const lengthOf = ({ region }: ThinPlace): number => smallestBox(region)?.length ?? 0;

function sharedArea(one: ThinPlace, other: ThinPlace, kernel: Kernel): number {
  const [a, b] = [boxOfRegion(one.region), boxOfRegion(other.region)];
  return a && b && boxesOverlap(a, b) ? regionAreaMm2(kernel.intersect(one.region, other.region)) : 0;
}

function narrowestOf(
  gaps: readonly ThinPlace[],
  air: Region,
  limitMm: number,
  kernel: Kernel,
): { readonly widthMm: number; readonly where: Point } | null {
  const [first] = gaps;
  if (!first) return null;
  let { where } = first;
  let passes = 0;
  let fails = limitMm;
  while (fails - passes > 0.02) {
    const middle = (passes + fails) / 2;
    const narrower = thinPlaces(air, middle, kernel).find((place) =>
      gaps.some((gap) => sharedArea(place, gap, kernel) > 0),
    );
    if (narrower) {
      fails = middle;
      where = narrower.where;
    } else passes = middle;
  }
  return { widthMm: passes, where };
}
