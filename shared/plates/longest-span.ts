import { distanceToSegmentMm } from "../geometry/contains.ts";
import type { Point } from "../geometry/path.ts";

/** A point this near to the line between its neighbours holds that line, mm. */
const onLineMm = 5;

/**
 * The longest way in mm that a sheet must span between neighbouring points that hold it: the longest side of the shape
 * round them or, if longer, the longest step that is needed to reach them all. An upper estimate; 0 for fewer than two.
 */
export function longestSpanMm(points: readonly Point[]): number {
  return Math.max(longestSide(points), longestStep(points));
}

/** Prim's tree: the shortest steps that join all points; of them the longest. */
function longestStep(points: readonly Point[]): number {
  const [first, ...rest] = points;
  if (!first) return 0;
  let left = rest.map((point) => ({ point, distance: distance(first, point) }));
  let longest = 0;
  while (left.length > 0) {
    const next = left.reduce((least, one) => (one.distance < least.distance ? one : least));
    longest = Math.max(longest, next.distance);
    left = left
      .filter((one) => one !== next)
      .map(({ point, distance: known }) => ({ point, distance: Math.min(known, distance(next.point, point)) }));
  }
  return longest;
}

/** The longest side of the convex shape round the points, cut where another point lies on it. */
function longestSide(points: readonly Point[]): number {
  const hull = convexHull(points);
  // Of a line there is no shape round it, and the steps along it say everything.
  if (hull.length < 3) return 0;
  return hull.reduce((longest, from, index) => {
    const to = hull[(index + 1) % hull.length] ?? from;
    const on = points
      .filter((point) => distanceToSegmentMm(point, from, to) <= onLineMm)
      .map((point) => distance(from, point))
      .toSorted((a, b) => a - b);
    return on.reduce((most, at, place) => Math.max(most, at - (on[place - 1] ?? 0)), longest);
  }, 0);
}

/** Andrew's monotone chain. */
function convexHull(points: readonly Point[]): Point[] {
  const sorted = points.toSorted((a, b) => a.x - b.x || a.y - b.y);
  const half = (list: readonly Point[]): Point[] => {
    const chain: Point[] = [];
    for (const point of list) {
      while (chain.length >= 2 && !turnsLeft(chain.at(-2), chain.at(-1), point)) chain.pop();
      chain.push(point);
    }
    return chain.slice(0, -1);
  };
  return [...half(sorted), ...half(sorted.toReversed())];
}

function turnsLeft(a: Point | undefined, b: Point | undefined, c: Point): boolean {
  return !!a && !!b && (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x) > 1e-9;
}

const distance = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);
