import type { Point, Region } from "./path.ts";

/** The box of least area around something, turned as it may be. Lengths mm. */
export type SmallestBox = {
  readonly centre: Point;
  /** The longer side and its direction: degrees clockwise from the x axis, from 0 up to but not including 180. */
  readonly length: number;
  readonly turn: number;
  readonly width: number;
};

/**
 * The smallest box around a region, in any direction; null for an empty one. One of its sides lies along an edge of the
 * convex hull (H. Freeman, R. Shapira, Communications of the ACM 18(7), 1975), so each edge is tried once, with the hull's
 * farthest points followed round by rotating calipers. Of equally small ones the first edge's.
 */
export function smallestBox(region: Region): SmallestBox | null {
  const hull = convexHull(region.flat());
  const [first, second] = hull;
  if (!first) return null;
  if (!second) return { centre: first, length: 0, width: 0, turn: 0 };
  let best: { area: number; box: SmallestBox } | null = null;
  const calipers = { right: 0, top: 0, left: 0 };
  for (const [index, from] of hull.entries()) {
    const to = hull[(index + 1) % hull.length] ?? from;
    const edge = Math.hypot(to.x - from.x, to.y - from.y);
    if (edge === 0) continue;
    const along = { x: (to.x - from.x) / edge, y: (to.y - from.y) / edge };
    const across = { x: -along.y, y: along.x };
    calipers.right = advance(hull, Math.max(calipers.right, index), along);
    calipers.top = advance(hull, Math.max(calipers.top, calipers.right), across);
    calipers.left = advance(hull, Math.max(calipers.left, calipers.top), { x: -along.x, y: -along.y });
    const low = dot(pointOf(hull, calipers.left), along);
    const high = dot(pointOf(hull, calipers.right), along);
    const near = dot(from, across);
    const far = dot(pointOf(hull, calipers.top), across);
    const area = (high - low) * (far - near);
    if (!best || area < best.area - 1e-12 * best.area) {
      const middle = { along: (low + high) / 2, across: (near + far) / 2 };
      best = { area, box: boxFrom(along, across, middle, high - low, far - near) };
    }
  }
  return best?.box ?? null;
}

function boxFrom(
  along: Point,
  across: Point,
  middle: { readonly along: number; readonly across: number },
  size: number,
  depth: number,
): SmallestBox {
  const centre = {
    x: along.x * middle.along + across.x * middle.across,
    y: along.y * middle.along + across.y * middle.across,
  };
  const longer = size >= depth ? along : across;
  const degrees = (Math.atan2(longer.y, longer.x) * 180) / Math.PI;
  const turn = ((degrees % 180) + 180) % 180;
  return { centre, length: Math.max(size, depth), width: Math.min(size, depth), turn };
}

/** The last point of a run that goes further in that direction, from `start` on round the hull. */
function advance(hull: readonly Point[], start: number, direction: Point): number {
  let index = start;
  // A hull's height in one direction rises and falls once, so climbing ends after one round at most.
  for (let steps = 0; steps < hull.length; steps++) {
    if (dot(pointOf(hull, index + 1), direction) < dot(pointOf(hull, index), direction)) break;
    index++;
  }
  return index;
}

const dot = (a: Point, b: Point): number => a.x * b.x + a.y * b.y;

function pointOf(hull: readonly Point[], index: number): Point {
  return hull[index % hull.length] ?? { x: 0, y: 0 };
}

/** Corners of the convex hull, each turning the same way, without points on its edges (A. M. Andrew, 1979). */
export function convexHull(points: readonly Point[]): Point[] {
  const sorted = points.toSorted((a, b) => a.x - b.x || a.y - b.y);
  const lower = halfHull(sorted);
  const upper = halfHull(sorted.toReversed());
  const hull = [...lower.slice(0, -1), ...upper.slice(0, -1)];
  return hull.length > 0 ? hull : lower;
}

function halfHull(sorted: readonly Point[]): Point[] {
  const hull: Point[] = [];
  for (const point of sorted) {
    while (hull.length > 1 && !turnsLeft(hull.at(-2) ?? point, hull.at(-1) ?? point, point)) hull.pop();
    const last = hull.at(-1);
    if (!last || last.x !== point.x || last.y !== point.y) hull.push(point);
  }
  return hull;
}

function turnsLeft(a: Point, b: Point, c: Point): boolean {
  return (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x) > 0;
}
