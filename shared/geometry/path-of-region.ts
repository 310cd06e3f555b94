import type { Path, Region } from "./path.ts";
import { polygonRing } from "./shapes.ts";

/** A region as a path of straight edges. Rings with fewer than three points are left out. */
export function pathOfRegion(region: Region): Path {
  return region.filter((polygon) => polygon.length >= 3).map(polygonRing);
}
