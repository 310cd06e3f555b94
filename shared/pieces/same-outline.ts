import { boxCentre, boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { matrixMultiply, regionTransform, rotateMatrix, translateMatrix } from "../geometry/transform.ts";

/** Whether neither of two regions reaches more than `withinMm` over the other's edge. Both as the kernel gives them. */
export function isWithin(one: Region, other: Region, withinMm: number, kernel: Kernel): boolean {
  const reachesOver = (a: Region, b: Region) => kernel.difference(a, kernel.offset(b, withinMm, "round")).length > 0;
  return !reachesOver(one, other) && !reachesOver(other, one);
}

/** The region with the middle of its box at the origin, turned by degrees about it. */
export function centred(region: Region, turn = 0): Region {
  const box = boxOfRegion(region);
  if (!box) return [];
  const { x, y } = boxCentre(box);
  const matrix = matrixMultiply(rotateMatrix(turn), translateMatrix(-x, -y));
  return regionTransform(region, matrix);
}
