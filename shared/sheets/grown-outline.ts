import { simplifyRing } from "../artwork/simplify-ring.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { flatteningToleranceMm } from "../geometry/tolerance.ts";

/** The kernel's arcs run inside true arcs by as much. */
const arcSlackMm = 0.01;
/** Outlines of many points are replaced by simpler ones around them, no farther out than twice this. */
const simplifyMm = 0.05;
const fewPoints = 24;

/** How much farther than half the gap a grown outline may reach at most. */
export const mostSlackMm = arcSlackMm + flatteningToleranceMm + 2 * simplifyMm;

/**
 * An outline that holds everything within `distanceMm` of the region, with few points: two pieces whose grown outlines
 * don't overlap keep twice the distance. Straight-edged pieces that may touch (distance 0) are taken as they are.
 */
export function grownOutline(
  region: Region,
  distanceMm: number,
  { curved }: { readonly curved: boolean },
  kernel: Kernel,
): Region {
  const isLong = region.some((ring) => ring.length > fewPoints);
  if (distanceMm === 0 && !curved && !isLong) return region;
  const base = distanceMm + arcSlackMm + (curved ? flatteningToleranceMm : 0);
  const grown = kernel.offset(region, base, "round");
  if (grown.every((ring) => ring.length <= fewPoints)) return grown;
  const wider = kernel.offset(region, base + simplifyMm, "round");
  // Simplified by less than it was widened, it still holds what it must; crossings that came of it are joined.
  return kernel.union(
    wider.map((ring) => simplifyRing(ring, simplifyMm)),
    "nonzero",
  );
}
