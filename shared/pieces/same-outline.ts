import { boxCentre, boxOfRegion } from "../geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { matrixMultiply, regionTransform, rotateMatrix, translateMatrix } from "../geometry/transform.ts";

/** Whether neither of two regions reaches more than `withinMm` over the other's edge. Both as the kernel gives them. */
export function isWithin(one: Region, other: Region, withinMm: number, kernel: Kernel): boolean {
  // Most pairs differ in some corner, which is found in a fraction of the time that an offset takes.
  if (cornerReachesOver(one, other, withinMm) || cornerReachesOver(other, one, withinMm)) return false;
  const reachesOver = (a: Region, b: Region) => kernel.difference(a, kernel.offset(b, withinMm, "round")).length > 0;
  return !reachesOver(one, other) && !reachesOver(other, one);
}

/** Corners that are looked at, evenly along the outlines: enough to tell most shapes apart, few enough for large ones. */
const mostCorners = 64;
/** What the kernel's grid and its arcs may add to an offset, mm. */
const slackMm = 0.02;

function cornerReachesOver(one: Region, other: Region, withinMm: number): boolean {
  const corners = one.flat();
  const step = Math.max(1, Math.floor(corners.length / mostCorners));
  return corners.some(
    (corner, index) =>
      index % step === 0 &&
      !regionContains(other, corner) &&
      distanceToRegionEdgeMm(other, corner) > withinMm + slackMm,
  );
}

/** The region with the middle of its box at the origin, turned by degrees about it. */
export function centred(region: Region, turn = 0): Region {
  const box = boxOfRegion(region);
  if (!box) return [];
  const { x, y } = boxCentre(box);
  const matrix = matrixMultiply(rotateMatrix(turn), translateMatrix(-x, -y));
  return regionTransform(region, matrix);
}
