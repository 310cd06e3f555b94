import type { Path, Point, Polygon, Region, Ring, Segment } from "./path.ts";
import { flatteningToleranceMm } from "./tolerance.ts";

/** A curve never becomes more edges than this, whatever its size: 0.02 mm holds for curves up to some kilometres. */
const mostStepsPerCurve = 4096;

/**
 * Straight edges within `toleranceMm` of the path's curves, ring by ring; read by the even-odd rule like the path.
 * Rings that keep fewer than three different points are left out.
 */
export function flattenPath(path: Path, toleranceMm: number = flatteningToleranceMm): Region {
  return path.map((ring) => flattenRing(ring, toleranceMm)).filter((polygon) => polygon.length >= 3);
}

/** Straight edges within `toleranceMm` of one ring, without repeated points. */
export function flattenRing(ring: Ring, toleranceMm: number = flatteningToleranceMm): Polygon {
  const points: Point[] = [ring.start];
  let from = ring.start;
  for (const segment of ring.segments) {
    for (const point of segmentPoints(from, segment, toleranceMm)) {
      const last = points.at(-1);
      if (!last || last.x !== point.x || last.y !== point.y) points.push(point);
    }
    from = segment.to;
  }
  const first = points[0];
  const last = points.at(-1);
  if (points.length > 1 && first && last && first.x === last.x && first.y === last.y) points.pop();
  return points;
}

/** The points of one segment after `from`, its end included. */
export function segmentPoints(from: Point, segment: Segment, toleranceMm: number): Point[] {
  if (segment.kind === "line") return [segment.to];
  const { c1, c2, to } = segment;
  const steps = cubicSteps(from, c1, c2, to, toleranceMm);
  const points: Point[] = [];
  for (let step = 1; step < steps; step++) points.push(cubicPoint(from, c1, c2, to, step / steps));
  points.push(to);
  return points;
}

/**
 * How many equal steps of t keep a cubic's chords within the tolerance: ⌈√(0.75 · D / tolerance)⌉, with D the larger
 * of |p0 − 2 p1 + p2| and |p1 − 2 p2 + p3| (the chord of a step h leaves the curve by at most h²/8 · max |B″|, and B″ ≤ 6 D).
 */
export function cubicSteps(p0: Point, p1: Point, p2: Point, p3: Point, tolerance: number): number {
  const first = Math.hypot(p0.x - 2 * p1.x + p2.x, p0.y - 2 * p1.y + p2.y);
  const second = Math.hypot(p1.x - 2 * p2.x + p3.x, p1.y - 2 * p2.y + p3.y);
  const steps = Math.ceil(Math.sqrt((0.75 * Math.max(first, second)) / tolerance));
  return Math.max(1, Math.min(mostStepsPerCurve, steps));
}

/** The point of a cubic at t between 0 and 1. */
export function cubicPoint(p0: Point, p1: Point, p2: Point, p3: Point, t: number): Point {
  const u = 1 - t;
  const a = u * u * u;
  const b = 3 * u * u * t;
  const c = 3 * u * t * t;
  const d = t * t * t;
  return { x: a * p0.x + b * p1.x + c * p2.x + d * p3.x, y: a * p0.y + b * p1.y + c * p2.y + d * p3.y };
}
