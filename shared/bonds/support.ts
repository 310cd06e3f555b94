import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";

export type Support = {
  /** Area in mm² that lies on the support: what the adhesive holds by. */
  readonly overlapMm2: number;
  /** Share of the piece's area off its support, 0 to 1. A piece without area has nothing off it. */
  readonly unsupportedShare: number;
  /** How far in mm the piece reaches from its support at most; null when it lies on none. */
  readonly reachMm: number | null;
  /** Middle of what reaches farthest; null when nothing is unsupported. */
  readonly where: Point | null;
  readonly unsupported: Region;
};

/** Strips along an edge narrower than twice this come from rounding and flattening. */
const sliverMm = 0.03;
const reachStepMm = 0.05;

/** How a piece lies on what is under it. Both regions as the kernel gives them. */
export function measureSupport(piece: Region, support: Region, kernel: Kernel): Support {
  const area = regionAreaMm2(piece);
  const overlapMm2 = regionAreaMm2(kernel.intersect(piece, support));
  const off = kernel.difference(piece, support);
  const unsupported = kernel.offset(off, -sliverMm, "round").length > 0 ? off : [];
  if (area === 0 || unsupported.length === 0) {
    return { overlapMm2, unsupportedShare: 0, reachMm: area === 0 ? null : 0, where: null, unsupported: [] };
  }
  const unsupportedShare = Math.min(1, regionAreaMm2(unsupported) / area);
  if (overlapMm2 === 0) {
    return { overlapMm2, unsupportedShare, reachMm: null, where: regionCentroid(unsupported), unsupported };
  }
  return { overlapMm2, unsupportedShare, unsupported, ...farthestReach(unsupported, support, kernel) };
}

/** Grows the support until it covers the rest, halving the interval; the last that stays out shows the place. */
function farthestReach(unsupported: Region, support: Region, kernel: Kernel): { reachMm: number; where: Point | null } {
  const box = boxOfRegion([...unsupported, ...support]);
  let covered = box ? Math.hypot(box.width, box.height) : 0;
  let out = 0;
  let rest = unsupported;
  while (covered - out > reachStepMm) {
    const middle = (covered + out) / 2;
    const left = kernel.difference(unsupported, kernel.offset(support, middle, "round"));
    if (left.length === 0) covered = middle;
    else {
      out = middle;
      rest = left;
    }
  }
  // Several parts may reach equally far: the middle of one is a spot on the sign, the middle of all may be none.
  return { reachMm: (covered + out) / 2, where: regionCentroid(rest.slice(0, 1)) };
}
