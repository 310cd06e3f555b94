import type { Point, Polygon, Region } from "./path.ts";

/** Whether a point lies inside the region by the even-odd rule. A point on an edge may fall on either side. */
export function regionContains(region: Region, point: Point): boolean {
  return region.reduce((inside, ring) => (ringContains(ring, point) ? !inside : inside), false);
}

/** Whether a point lies inside one ring by the even-odd rule (crossings of a ray to the right). */
export function ringContains(ring: Polygon, { x, y }: Point): boolean {
  let inside = false;
  let previous = ring.at(-1);
  for (const point of ring) {
    if (previous && point.y > y !== previous.y > y) {
      const crossing = point.x + ((y - point.y) * (previous.x - point.x)) / (previous.y - point.y);
      if (x < crossing) inside = !inside;
    }
    previous = point;
  }
  return inside;
}

/** Shortest distance in mm from a point to the edges of a region, inside or out; Infinity for an empty one. */
export function distanceToRegionEdgeMm(region: Region, point: Point): number {
  return region.reduce((least, ring) => Math.min(least, distanceToRingMm(ring, point)), Number.POSITIVE_INFINITY);
}

function distanceToRingMm(ring: Polygon, point: Point): number {
  let least = Number.POSITIVE_INFINITY;
  let previous = ring.at(-1);
  for (const next of ring) {
    if (previous) least = Math.min(least, distanceToSegmentMm(point, previous, next));
    previous = next;
  }
  return least;
}

/** Distance in mm from a point to the straight piece from `a` to `b`. */
export function distanceToSegmentMm(point: Point, a: Point, b: Point): number {
  const dx = b.x - a.x;
  const dy = b.y - a.y;
  const lengthSquared = dx * dx + dy * dy;
  const along = lengthSquared === 0 ? 0 : ((point.x - a.x) * dx + (point.y - a.y) * dy) / lengthSquared;
  const t = Math.max(0, Math.min(1, along));
  return Math.hypot(point.x - a.x - t * dx, point.y - a.y - t * dy);
}
