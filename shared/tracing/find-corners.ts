import { distanceToSegmentMm } from "../geometry/contains.ts";
import type { Point } from "../geometry/path.ts";

/** A corner of an outline: which of its points lies nearest, and where the two sides meet. */
export type Corner = { readonly index: number; readonly at: Point };

/** A turn of less is no corner. */
const leastTurn = (35 * Math.PI) / 180;
/** Sides shorter than this, in pixels, that turn the same way at both ends cut a corner off. */
const chamfer = 2.6;
/** Points nearer to a corner than this, in pixels, are rounded by the pixel they lie in. */
export const roundedPx = 1.1;
/** The sides' directions at a corner come from points up to this far away. */
const sidePx = 7;
/** A meeting of the sides farther from the outline is no corner of it. */
const farthestPx = 2;

/**
 * Where an outline of points about a pixel apart has its corners. A polygon within `offPx` of the points is drawn; one of its
 * corners is a corner of the outline when an arc that touched both sides would pass it at more than twice that distance (on
 * any circle that distance is `offPx`, whatever its size). `closed` outlines return to their first point.
 */
export function findCorners(points: readonly Point[], { closed, offPx }: { closed: boolean; offPx: number }): Corner[] {
  const polygon = withoutChamfers(points, closed ? closedPolygon(points, offPx) : openPolygon(points, offPx), closed);
  const corners: Corner[] = [];
  for (const [place, vertex] of polygon.entries()) {
    const before = polygon[place - 1] ?? (closed ? polygon.at(-1) : undefined);
    const after = polygon[place + 1] ?? (closed ? polygon[0] : undefined);
    if (!before || !after || before === after) continue;
    const turn = turnAt(before.at, vertex.at, after.at);
    const side = Math.min(distance(before.at, vertex.at), distance(vertex.at, after.at));
    if (turn < leastTurn || (side / 2) * Math.tan(turn / 4) < 2 * offPx) continue;
    corners.push({ index: vertex.index, at: sharpened(points, before, vertex, after) });
  }
  return corners;
}

type Vertex = { readonly index: number; readonly at: Point };

function openPolygon(points: readonly Point[], off: number): Vertex[] {
  return split(points, 0, points.length - 1, off).map((index) => ({ index, at: pointOf(points, index) }));
}

/** Split at the two points farthest from each other in a rough search, so that these are no accidents of the start. */
function closedPolygon(points: readonly Point[], off: number): Vertex[] {
  const start = farthest(points, farthest(points, 0));
  const turnedPoints = [...points.slice(start), ...points.slice(0, start), pointOf(points, start)];
  const middle = farthest(turnedPoints, 0);
  const kept = [
    ...split(turnedPoints, 0, middle, off),
    ...split(turnedPoints, middle, points.length, off).slice(1, -1),
  ];
  return kept.map((index) => ({ index: (index + start) % points.length, at: pointOf(turnedPoints, index) }));
}

/**
 * Indexes of the points that a polygon within `off` keeps (D. H. Douglas and T. K. Peucker, Cartographica 10, 1973).
 */
function split(points: readonly Point[], from: number, to: number, off: number): number[] {
  const kept = [from, to];
  const open: [number, number][] = [[from, to]];
  for (let run = open.pop(); run; run = open.pop()) {
    const [start, end] = run;
    let worst = off;
    let at = -1;
    for (let index = start + 1; index < end; index++) {
      const away = distanceToSegmentMm(pointOf(points, index), pointOf(points, start), pointOf(points, end));
      if (away > worst) [worst, at] = [away, index];
    }
    if (at < 0) continue;
    kept.push(at);
    open.push([start, at], [at, end]);
  }
  return kept.sort((a, b) => a - b);
}

/** The polygon with each short side that cuts a corner off replaced by the corner. */
function withoutChamfers(points: readonly Point[], polygon: readonly Vertex[], closed: boolean): Vertex[] {
  const kept = [...polygon];
  for (let place = closed ? 0 : 1; place < kept.length - (closed ? 0 : 2) && kept.length > 3; place++) {
    const at = (offset: number) => kept[(place + offset + kept.length) % kept.length];
    const [before, a, b, after] = [at(-1), at(0), at(1), at(2)];
    if (!before || !a || !b || !after || distance(a.at, b.at) > chamfer) continue;
    if (Math.min(distance(before.at, a.at), distance(b.at, after.at)) < chamfer) continue;
    const [first, second] = [signedTurn(before.at, a.at, b.at), signedTurn(a.at, b.at, after.at)];
    if (first * second <= 0 || Math.abs(first + second) < leastTurn || Math.abs(first + second) > 2.7) continue;
    const corner = crossing(before.at, a.at, b.at, after.at);
    if (!corner || distance(corner, a.at) > 2 * farthestPx || distance(corner, b.at) > 2 * farthestPx) continue;
    const steps = (b.index - a.index + points.length) % points.length;
    const index = (a.index + (steps >> 1)) % points.length;
    kept[(place + kept.length) % kept.length] = { index, at: corner };
    kept.splice((place + 1) % kept.length, 1);
  }
  return kept;
}

/** Where straight lines through the points on both sides meet: the pixel has rounded the corner itself. */
function sharpened(points: readonly Point[], before: Vertex, vertex: Vertex, after: Vertex): Point {
  const back = sideLine(points, vertex, before, -1);
  const forth = sideLine(points, vertex, after, 1);
  const meeting = crossing(back.from, back.to, forth.from, forth.to);
  return meeting && distance(meeting, pointOf(points, vertex.index)) <= farthestPx ? meeting : vertex.at;
}

/** The line of least squares through the points from a corner towards the next one. */
function sideLine(points: readonly Point[], vertex: Vertex, end: Vertex, step: 1 | -1): { from: Point; to: Point } {
  const near: Point[] = [];
  for (let taken = 1; taken < points.length; taken++) {
    const index = (vertex.index + step * taken + points.length * 2) % points.length;
    const point = pointOf(points, index);
    const away = distance(point, vertex.at);
    if (away > sidePx) break;
    if (away > roundedPx && distance(point, end.at) > roundedPx) near.push(point);
    if (index === end.index) break;
  }
  if (near.length < 3) return { from: vertex.at, to: end.at };
  const x = near.reduce((sum, point) => sum + point.x, 0) / near.length;
  const y = near.reduce((sum, point) => sum + point.y, 0) / near.length;
  let xx = 0;
  let xy = 0;
  let yy = 0;
  for (const point of near) {
    xx += (point.x - x) ** 2;
    xy += (point.x - x) * (point.y - y);
    yy += (point.y - y) ** 2;
  }
  const angle = Math.atan2(2 * xy, xx - yy) / 2;
  return { from: { x, y }, to: { x: x + Math.cos(angle), y: y + Math.sin(angle) } };
}

function crossing(a: Point, b: Point, c: Point, d: Point): Point | null {
  const u = { x: b.x - a.x, y: b.y - a.y };
  const v = { x: d.x - c.x, y: d.y - c.y };
  const across = u.x * v.y - u.y * v.x;
  if (Math.abs(across) < 0.2 * Math.hypot(u.x, u.y) * Math.hypot(v.x, v.y)) return null;
  const t = ((c.x - a.x) * v.y - (c.y - a.y) * v.x) / across;
  return { x: a.x + t * u.x, y: a.y + t * u.y };
}

function signedTurn(a: Point, b: Point, c: Point): number {
  const cross = (b.x - a.x) * (c.y - b.y) - (b.y - a.y) * (c.x - b.x);
  return Math.atan2(cross, (b.x - a.x) * (c.x - b.x) + (b.y - a.y) * (c.y - b.y));
}

const turnAt = (a: Point, b: Point, c: Point): number => Math.abs(signedTurn(a, b, c));

function farthest(points: readonly Point[], from: number): number {
  const here = pointOf(points, from);
  return points.reduce(
    (best, point, index) => (distance(point, here) > distance(pointOf(points, best), here) ? index : best),
    from,
  );
}

function pointOf(points: readonly Point[], index: number): Point {
  return points[index] ?? { x: 0, y: 0 };
}

const distance = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);
