import type { Point, Segment } from "./path.ts";

type Cubic = Extract<Segment, { kind: "cubic" }>;

/**
 * Where a cubic in Bernstein form, by its four coefficients, changes its sign between 0 and 1, in order. Between the places
 * where its slope is nothing it only rises or falls, so that halving finds each one.
 */
export function cubicRootsOnLine(coefficients: readonly number[]): number[] {
  const [d0 = 0, d1 = 0, d2 = 0, d3 = 0] = coefficients;
  if ([d1, d2, d3].every((one) => one > 0 === d0 > 0)) return [];
  const value = (t: number): number => {
    const u = 1 - t;
    return u * u * u * d0 + 3 * u * u * t * d1 + 3 * u * t * t * d2 + t * t * t * d3;
  };
  const stops = [0, ...slopeRoots(d1 - d0, d2 - d1, d3 - d2), 1];
  return stops.slice(1).flatMap((end, index) => {
    const start = stops[index] ?? 0;
    return value(start) > 0 === value(end) > 0 ? [] : [halved(value, start, end)];
  });
}

/** Where the quadratic with Bernstein coefficients a, b, c is nothing between 0 and 1, in order. */
function slopeRoots(a: number, b: number, c: number): number[] {
  const square = a - 2 * b + c;
  const linear = 2 * (b - a);
  if (Math.abs(square) < 1e-12) return linear === 0 ? [] : [-a / linear].filter(isInside);
  const root = Math.sqrt(Math.max(0, linear * linear - 4 * square * a));
  return [(-linear - root) / (2 * square), (-linear + root) / (2 * square)].toSorted((x, y) => x - y).filter(isInside);
}

const isInside = (t: number): boolean => t > 0 && t < 1;

function halved(value: (t: number) => number, start: number, end: number): number {
  let [low, high] = [start, end];
  const rises = value(end) > 0;
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (value(middle) > 0 === rises) high = middle;
    else low = middle;
  }
  return (low + high) / 2;
}

/** A cubic divided at places between 0 and 1, in order, by de Casteljau's construction. */
export function cubicSplit(from: Point, cubic: Cubic, places: readonly number[]): Cubic[] {
  const parts: Cubic[] = [];
  let [start, rest, done] = [from, cubic, 0];
  for (const place of places) {
    const share = (place - done) / (1 - done);
    const p01 = between(start, rest.c1, share);
    const p12 = between(rest.c1, rest.c2, share);
    const p23 = between(rest.c2, rest.to, share);
    const [p012, p123] = [between(p01, p12, share), between(p12, p23, share)];
    const middle = between(p012, p123, share);
    parts.push({ kind: "cubic", c1: p01, c2: p012, to: middle });
    rest = { kind: "cubic", c1: p123, c2: p23, to: rest.to };
    start = middle;
    done = place;
  }
  return [...parts, rest];
}

const between = (a: Point, b: Point, share: number): Point => ({
  x: a.x + share * (b.x - a.x),
  y: a.y + share * (b.y - a.y),
});
