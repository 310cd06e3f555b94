import { distanceToSegmentMm } from "./contains.ts";
import { cubicPoint } from "./flatten.ts";
import type { Point, Segment } from "./path.ts";

type Cubic = readonly [Point, Point, Point, Point];

const mostRefinements = 4;

/**
 * Lines and cubics through a run of points, none of which lies farther than `toleranceMm` from them. `start` and `end` are unit
 * directions into the run from its two ends, taken from the points where they are null. Pieces meet without a corner.
 * After P. J. Schneider, "An Algorithm for Automatically Fitting Digitized Curves", Graphics Gems (1990), pages 612 to 626.
 * The first point is where the run starts; nothing is returned for fewer than two.
 */
export function fitCurves(
  points: readonly Point[],
  options: { toleranceMm: number; start: Point | null; end: Point | null },
): Segment[] {
  const { toleranceMm } = options;
  const first = points[0];
  const last = points.at(-1);
  if (!first || !last || points.length < 2) return [];
  if (points.length === 2 || points.every((point) => distanceToSegmentMm(point, first, last) <= toleranceMm / 4))
    return [{ kind: "line", to: last }];

  const reach = 10 * toleranceMm;
  const start = options.start ?? endDirection(points, reach);
  const end = options.end ?? endDirection(points.toReversed(), reach);
  let parameters = chordParameters(points);
  let cubic = leastSquares(points, parameters, start, end);
  let worst = worstPoint(points, parameters, cubic);
  for (let step = 0; worst.error > toleranceMm && worst.error < 8 * toleranceMm && step < mostRefinements; step++) {
    parameters = parameters.map((t, index) => nearer(cubic, points[index] ?? first, t));
    cubic = leastSquares(points, parameters, start, end);
    worst = worstPoint(points, parameters, cubic);
  }
  if (worst.error <= toleranceMm) return [{ kind: "cubic", c1: cubic[1], c2: cubic[2], to: last }];

  const through = middleDirection(points, worst.index, reach);
  return [
    ...fitCurves(points.slice(0, worst.index + 1), { toleranceMm, start, end: scaled(through, -1) }),
    ...fitCurves(points.slice(worst.index), { toleranceMm, start: through, end }),
  ];
}

/**
 * The direction in which a parabola through the first point and two others leaves it. The others lie `reach` and twice that away,
 * where the run is long enough: nearer ones would make a direction of what the grid and the flattening added.
 */
function endDirection(points: readonly Point[], reach: number): Point {
  const [a, near] = points;
  if (!a || !near) return { x: 1, y: 0 };
  const away = (point: Point) => Math.hypot(point.x - a.x, point.y - a.y);
  const first = points.findIndex((point) => away(point) >= reach);
  const b = points[first];
  const c = b && points.slice(first + 1).find((point) => away(point) >= 2 * away(b));
  if (!b || !c) return unit(subtract(b ?? points[points.length >> 1] ?? near, a));
  const d1 = away(b);
  const d2 = Math.hypot(c.x - b.x, c.y - b.y);
  const wa = -(2 * d1 + d2) / (d1 * (d1 + d2));
  const wb = (d1 + d2) / (d1 * d2);
  const wc = -d1 / (d2 * (d1 + d2));
  return unit({ x: wa * a.x + wb * b.x + wc * c.x, y: wa * a.y + wb * b.y + wc * c.y });
}

/** The direction in which the run passes a point, from points at least `reach` away on both sides where there are any. */
function middleDirection(points: readonly Point[], index: number, reach: number): Point {
  const at = points[index] ?? origin;
  const isFar = (point: Point) => Math.hypot(point.x - at.x, point.y - at.y) >= reach;
  const before = points.slice(0, index).findLast(isFar) ?? points[0] ?? at;
  const after = points.slice(index + 1).find(isFar) ?? points.at(-1) ?? at;
  const chord = unit(subtract(after, before));
  // Of unequal distances the nearer says more: the directions to both sides, each weighted with the other's length.
  const back = subtract(at, before);
  const forth = subtract(after, at);
  const backLength = Math.hypot(back.x, back.y);
  const forthLength = Math.hypot(forth.x, forth.y);
  if (backLength === 0 || forthLength === 0) return chord;
  return unit(plus(scaled(back, forthLength / backLength), scaled(forth, backLength / forthLength)));
}

function chordParameters(points: readonly Point[]): number[] {
  const lengths = [0];
  for (let index = 1; index < points.length; index++) {
    const step = subtract(points[index] ?? origin, points[index - 1] ?? origin);
    lengths.push((lengths[index - 1] ?? 0) + Math.hypot(step.x, step.y));
  }
  const total = lengths.at(-1) || 1;
  return lengths.map((length) => length / total);
}

/** The cubic with the given end directions whose points at the parameters lie nearest to the run's. */
function leastSquares(points: readonly Point[], parameters: readonly number[], start: Point, end: Point): Cubic {
  const first = points[0] ?? origin;
  const last = points.at(-1) ?? origin;
  let c00 = 0;
  let c01 = 0;
  let c11 = 0;
  let x0 = 0;
  let x1 = 0;
  for (const [index, point] of points.entries()) {
    const t = parameters[index] ?? 0;
    const u = 1 - t;
    const b1 = 3 * u * u * t;
    const b2 = 3 * u * t * t;
    const atEnds = u * u * u + b1;
    const toEnds = t * t * t + b2;
    const rest = { x: point.x - first.x * atEnds - last.x * toEnds, y: point.y - first.y * atEnds - last.y * toEnds };
    c00 += b1 * b1;
    c01 += b1 * b2 * dot(start, end);
    c11 += b2 * b2;
    x0 += b1 * dot(start, rest);
    x1 += b2 * dot(end, rest);
  }
  const determinant = c00 * c11 - c01 * c01;
  const chord = Math.hypot(last.x - first.x, last.y - first.y);
  let a = (x0 * c11 - x1 * c01) / determinant;
  let b = (c00 * x1 - c01 * x0) / determinant;
  // Handles that vanish, point backwards or run away are of no use: a third of the chord is a fair guess.
  const least = chord * 1e-3;
  if (!(a > least && b > least && a < 4 * chord && b < 4 * chord)) a = b = chord / 3;
  return [first, plus(first, scaled(start, a)), plus(last, scaled(end, b)), last];
}

function worstPoint(points: readonly Point[], parameters: readonly number[], cubic: Cubic) {
  let error = 0;
  let index = points.length >> 1;
  for (let at = 1; at < points.length - 1; at++) {
    const on = cubicPoint(...cubic, parameters[at] ?? 0);
    const away = subtract(points[at] ?? origin, on);
    const distance = Math.hypot(away.x, away.y);
    if (distance > error) {
      error = distance;
      index = at;
    }
  }
  return { error, index };
}

/** One Newton step towards the parameter of the cubic's point nearest to `point`. */
function nearer([p0, p1, p2, p3]: Cubic, point: Point, t: number): number {
  const u = 1 - t;
  const away = subtract(cubicPoint(p0, p1, p2, p3, t), point);
  const d1 = subtract(p1, p0);
  const d2 = subtract(p2, p1);
  const d3 = subtract(p3, p2);
  const first = {
    x: 3 * (u * u * d1.x + 2 * u * t * d2.x + t * t * d3.x),
    y: 3 * (u * u * d1.y + 2 * u * t * d2.y + t * t * d3.y),
  };
  const second = {
    x: 6 * (u * (d2.x - d1.x) + t * (d3.x - d2.x)),
    y: 6 * (u * (d2.y - d1.y) + t * (d3.y - d2.y)),
  };
  const slope = dot(first, first) + dot(away, second);
  if (slope === 0) return t;
  return Math.max(0, Math.min(1, t - dot(away, first) / slope));
}

const origin: Point = { x: 0, y: 0 };
const plus = (a: Point, b: Point): Point => ({ x: a.x + b.x, y: a.y + b.y });
const subtract = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y });
const scaled = ({ x, y }: Point, factor: number): Point => ({ x: x * factor, y: y * factor });
const dot = (a: Point, b: Point): number => a.x * b.x + a.y * b.y;
function unit({ x, y }: Point): Point {
  const length = Math.hypot(x, y) || 1;
  return { x: x / length, y: y / length };
}
