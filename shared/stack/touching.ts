import { boxesOverlap, boxOfRegion } from "../geometry/box.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Box, Region } from "../geometry/path.ts";

/**
 * Two outlines that share a strip narrower than twice this don't carry each other: neighbours in a drawing overlap by
 * the flattening's hundredths of a millimetre, and a saw or a laser takes more than that away.
 */
const sliverMm = 0.05;

export type Spread = { readonly region: Region; readonly box: Box | null };

export const spreadOf = (region: Region): Spread => ({ region, box: boxOfRegion(region) });

/** Whether two outlines lie over each other by more than a sliver. */
export function areasTouch(a: Spread, b: Spread, kernel: Kernel): boolean {
  if (!a.box || !b.box || !boxesOverlap(a.box, b.box)) return false;
  return remembered(kernel, [...a.region, ...b.region], `touch ${a.region.length}`, () => {
    const shared = kernel.intersect(a.region, b.region);
    return shared.length > 0 && kernel.offset(shared, -sliverMm, "round").length > 0;
  });
}
