import { distanceToSegmentMm } from "../geometry/contains.ts";
import type { Point, Polygon } from "../geometry/path.ts";

/** How many points a straight run may swallow before it is cut: keeps the work linear. */
const longestRun = 64;

/**
 * The ring without points that lie within `tolerance` of the straight line between the points kept on both sides.
 * The first point stays. A ring that would keep fewer than three points is returned as it is.
 */
export function simplifyRing(ring: Polygon, tolerance: number): Polygon {
  const first = ring[0];
  if (!first || ring.length < 4) return ring;
  const kept: Point[] = [first];
  let anchor = 0;
  for (let next = 2; next <= ring.length; next++) {
    const from = ring[anchor] ?? first;
    const to = ring[next % ring.length] ?? first;
    if (next - anchor <= longestRun && runIsStraight(ring, anchor, next, from, to, tolerance)) continue;
    anchor = next - 1;
    kept.push(ring[anchor] ?? first);
  }
  return kept.length < 3 ? ring : kept;
}

function runIsStraight(
  ring: Polygon,
  anchor: number,
  next: number,
  from: Point,
  to: Point,
  tolerance: number,
): boolean {
  for (let index = anchor + 1; index < next; index++) {
    const point = ring[index];
    if (point && distanceToSegmentMm(point, from, to) > tolerance) return false;
  }
  return true;
}
