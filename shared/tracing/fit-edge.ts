import { distanceToSegmentMm } from "../geometry/contains.ts";
import { fitCurves } from "../geometry/fit-curves.ts";
import type { Point, Ring, Segment } from "../geometry/path.ts";
import { findCorners, roundedPx } from "./find-corners.ts";

/** An end of an edge: where it lies, and the direction into the edge where a neighbour's goes on through it. */
export type EdgeEnd = { readonly at: Point; readonly direction: Point | null };

/** How far a fitted edge may run beside its points, and how often those are evened out before. */
export type EdgeFit = { readonly tolerancePx: number; readonly passes: number };

/** How near the polygon that finds corners follows the points, in fit tolerances and in pixels. */
const polygonOff = { least: 0.3, most: 1.4 };

/**
 * Lines and curves within `tolerancePx` of an edge's points: corners stay corners, straight runs straight, the rest becomes few cubics.
 * An edge without ends is a ring.
 */
export function fitEdge(
  points: readonly Point[],
  ends: { readonly from: EdgeEnd; readonly to: EdgeEnd } | null,
  { tolerancePx, passes }: EdgeFit,
): Ring {
  const offPx = Math.max(polygonOff.least, Math.min(polygonOff.most, tolerancePx * 0.8));
  if (ends) {
    const all = [ends.from.at, ...points, ends.to.at];
    const corners = findCorners(all, { closed: false, offPx });
    const stops = [{ index: 0, at: ends.from.at }, ...corners, { index: all.length - 1, at: ends.to.at }];
    const segments = stops.slice(1).flatMap((to, place) => {
      const from = stops[place] ?? to;
      return fitRun(evened(runBetween(all, from, to), passes), tolerancePx, {
        start: place === 0 ? ends.from.direction : null,
        end: place === stops.length - 2 ? ends.to.direction : null,
      });
    });
    return { start: ends.from.at, segments };
  }
  const corners = findCorners(points, { closed: true, offPx });
  return corners.length === 0
    ? fitSmooth(evenedRing(points, passes), tolerancePx)
    : fitBetween(points, corners, { tolerancePx, passes });
}

function fitBetween(
  points: readonly Point[],
  corners: readonly { index: number; at: Point }[],
  { tolerancePx, passes }: EdgeFit,
): Ring {
  const ordered = corners.toSorted((a, b) => a.index - b.index);
  const segments = ordered.flatMap((from, place) => {
    const to = ordered[(place + 1) % ordered.length] ?? from;
    return fitRun(evened(runBetween(points, from, to), passes), tolerancePx, { start: null, end: null });
  });
  return { start: ordered[0]?.at ?? { x: 0, y: 0 }, segments };
}

/** A ring without corners: cut at four places, through each of which it passes in one direction. */
function fitSmooth(points: readonly Point[], tolerance: number): Ring {
  const cuts = Math.max(1, Math.min(4, Math.floor(points.length / 6)));
  const places = Array.from({ length: cuts }, (_, cut) => Math.floor((cut * points.length) / cuts));
  const passing = places.map((index) => {
    const reach = Math.max(1, Math.min(4, points.length >> 4));
    const before = pointAt(points, index - reach);
    const after = pointAt(points, index + reach);
    const length = Math.hypot(after.x - before.x, after.y - before.y) || 1;
    return { x: (after.x - before.x) / length, y: (after.y - before.y) / length };
  });
  const segments = places.flatMap((index, cut) => {
    const next = (cut + 1) % cuts;
    const steps = ((places[next] ?? 0) - index + points.length) % points.length || points.length;
    const run = Array.from({ length: steps + 1 }, (_, step) => pointAt(points, index + step));
    const end = passing[next];
    return fitCurves(run, {
      toleranceMm: tolerance,
      start: passing[cut] ?? null,
      end: end ? { x: -end.x, y: -end.y } : null,
    });
  });
  return { start: pointAt(points, 0), segments };
}

type Stop = { readonly index: number; readonly at: Point };

/** The points from one corner to the next, without those that the pixels at the corners have rounded. */
function runBetween(points: readonly Point[], from: Stop, to: Stop): Point[] {
  const steps = (to.index - from.index + points.length) % points.length || points.length;
  const between: Point[] = [];
  for (let step = 1; step < steps; step++) {
    const point = pointAt(points, from.index + step);
    if (away(point, from.at) > roundedPx && away(point, to.at) > roundedPx) between.push(point);
  }
  return [from.at, ...between, to.at];
}

function fitRun(run: readonly Point[], tolerance: number, ends: { start: Point | null; end: Point | null }): Segment[] {
  const [first] = run;
  const last = run.at(-1);
  if (!first || !last) return [];
  // Half the tolerance either way is noise on a straight line.
  if (run.every((point) => distanceToSegmentMm(point, first, last) <= tolerance / 2))
    return [{ kind: "line", to: last }];
  return fitCurves(run, { toleranceMm: tolerance, ...ends });
}

/** The run with every inner point moved to the mean of itself, twice, and its neighbours; so many times. */
function evened(run: readonly Point[], passes: number): readonly Point[] {
  let current = run;
  for (let pass = 0; pass < passes; pass++)
    current = current.map((point, index) => {
      const before = current[index - 1];
      const after = current[index + 1];
      return before && after ? meanOf(before, point, after) : point;
    });
  return current;
}

function evenedRing(points: readonly Point[], passes: number): readonly Point[] {
  let current = points;
  for (let pass = 0; pass < passes; pass++)
    current = current.map((point, index) => meanOf(pointAt(current, index - 1), point, pointAt(current, index + 1)));
  return current;
}

const meanOf = (a: Point, b: Point, c: Point): Point => ({
  x: (a.x + 2 * b.x + c.x) / 4,
  y: (a.y + 2 * b.y + c.y) / 4,
});

function pointAt(points: readonly Point[], index: number): Point {
  return points[(index + points.length * 2) % points.length] ?? { x: 0, y: 0 };
}

const away = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);
