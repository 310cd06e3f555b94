import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import { distanceToRegionEdgeMm } from "../geometry/contains.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";

export type Support = {
  /** Area in mm² that lies on the support: what the adhesive holds by. */
  readonly overlapMm2: number;
  /** Share of the piece's area off its support, 0 to 1. A piece without area has nothing off it. */
  readonly unsupportedShare: number;
  /** How far in mm the piece reaches from where it is bonded at most; null when it lies on nothing. */
  readonly reachMm: number | null;
  /** Middle of what reaches farthest; null when nothing is unsupported. */
  readonly where: Point | null;
  readonly unsupported: Region;
};

/** Strips along an edge narrower than twice this come from rounding and flattening. */
const sliverMm = 0.03;
const reachStepMm = 0.05;

/** What of a piece lies on nothing, slivers along its edge left out; empty when all of it is carried. */
export function unsupportedPart(piece: Region, support: Region, kernel: Kernel): Region {
  return remembered(kernel, [...piece, ...support], `unsupported ${piece.length}`, () =>
    offSupport(piece, support, kernel),
  );
}

function offSupport(piece: Region, support: Region, kernel: Kernel): Region {
  const off = kernel.difference(piece, support);
  return off.length > 0 && kernel.offset(off, -sliverMm, "round").length > 0 ? off : [];
}

/** How a piece lies on what is under it. Both regions as the kernel gives them. */
export function measureSupport(piece: Region, support: Region, kernel: Kernel): Support {
  return remembered(kernel, [...piece, ...support], `support ${piece.length}`, () => lieOn(piece, support, kernel));
}

function lieOn(piece: Region, support: Region, kernel: Kernel): Support {
  const area = regionAreaMm2(piece);
  const bonded = kernel.intersect(piece, support);
  const overlapMm2 = regionAreaMm2(bonded);
  const unsupported = unsupportedPart(piece, support, kernel);
  if (area === 0 || unsupported.length === 0) {
    return { overlapMm2, unsupportedShare: 0, reachMm: area === 0 ? null : 0, where: null, unsupported: [] };
  }
  const unsupportedShare = Math.min(1, regionAreaMm2(unsupported) / area);
  if (overlapMm2 === 0) {
    return { overlapMm2, unsupportedShare, reachMm: null, where: regionCentroid(unsupported), unsupported };
  }
  return { overlapMm2, unsupportedShare, unsupported, ...farthestReach(unsupported, bonded, kernel) };
}

/**
 * The farthest corner of what hangs over, as a rule. Where the middle of a bridge is farther still, what is bonded is
 * grown until it covers all, halving the interval; the last that stays out shows the place.
 */
function farthestReach(
  unsupported: Region,
  bonded: Region,
  kernel: Kernel,
): { readonly reachMm: number; readonly where: Point | null } {
  let { reachMm: out, where } = farthestCorner(unsupported, bonded);
  let covered = out + reachStepMm;
  const leftAt = (distance: number) => kernel.difference(unsupported, kernel.offset(bonded, distance, "round"));
  if (leftAt(covered).length === 0) return { reachMm: out, where };
  const box = boxOfRegion([...unsupported, ...bonded]);
  covered = box ? Math.hypot(box.width, box.height) : out;
  while (covered - out > reachStepMm) {
    const middle = (covered + out) / 2;
    const left = leftAt(middle);
    if (left.length === 0) covered = middle;
    else {
      out = middle;
      // Several parts may reach equally far: the middle of one is a spot on the sign, the middle of all may be none.
      where = regionCentroid(left.slice(0, 1));
    }
  }
  return { reachMm: (covered + out) / 2, where };
}

function farthestCorner(unsupported: Region, support: Region): { reachMm: number; where: Point | null } {
  let reachMm = 0;
  let where: Point | null = null;
  for (const corner of unsupported.flat()) {
    const distance = distanceToRegionEdgeMm(support, corner);
    if (distance <= reachMm) continue;
    reachMm = distance;
    where = corner;
  }
  return { reachMm, where };
}
