import { boxGrow, boxOfRegion } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { thinnestWidth } from "../stack/thin-places.ts";
import { lengthRange } from "../units/outcome.ts";

/**
 * The least width in mm of a gap inside a region or between its parts, to 0.02 mm, looked for up to `limitMm`, with its
 * place: the thinnest width of what is not material. Null when no gap is narrower, or when there is nothing to look at.
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
  return thinnestWidth(kernel.difference(around, region), limitMm, kernel);
}
