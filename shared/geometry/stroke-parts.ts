import { signedRingArea } from "./area.ts";
import type { Cap, Join } from "./kernel.ts";
import type { Point, Polygon, Region } from "./path.ts";

/** A point of a line to be drawn with a pen. `smooth` marks one inside a curve: it is joined round whatever the join. */
export type StrokePoint = Point & { readonly smooth?: boolean };

export type StrokeOptions = {
  readonly closed: boolean;
  readonly widthMm: number;
  readonly join: Join | "bevel";
  readonly cap: Cap;
  readonly mitreLimit: number;
};

/** How far a chord of a round join or cap may run inside the true arc. */
const arcToleranceMm = 0.01;
/** How far joins and caps reach into the boxes they adjoin. */
const overlapMm = 0.05;

/** Holes no larger than this, in mm², come from rounding to the kernel's grid where three parts meet. */
const gridHoleMm2 = 2e-5;

/** The united parts without the pinholes that rounding leaves between them. */
export function withoutPinholes(outline: Region): Region {
  return outline.filter((ring) => signedRingArea(ring) < -gridHoleMm2 || signedRingArea(ring) > 0);
}

/**
 * The shapes whose union (non-zero) is the stroke of `line` in mm as SVG 2, section 13.7 "Computing the shape of the
 * stroke" has it: a box per edge, a wedge per join, two caps on an open line. A mitre over the limit becomes a bevel.
 * A line without length gives a dot with round and square caps and nothing with butt ones. All parts turn the same way.
 */
export function strokeParts(line: readonly StrokePoint[], options: StrokeOptions): Region {
  const half = options.widthMm / 2;
  if (!(half > 0)) return [];
  const points = withoutRepeats(line, options.closed);
  const first = points[0];
  if (!first) return [];
  if (points.length === 1) return dot(first, half, options.cap);

  const { closed } = options;
  const parts: Polygon[] = [];
  const overlap = Math.min(overlapMm, half / 2);
  const edges = closed ? points.length : points.length - 1;
  const directions = Array.from({ length: edges }, (_, index) =>
    direction(at(points, index), at(points, (index + 1) % points.length)),
  );
  const lengths = directions.map((_, index) => {
    const from = at(points, index);
    const to = at(points, (index + 1) % points.length);
    return Math.hypot(to.x - from.x, to.y - from.y);
  });
  for (const [index, along] of directions.entries()) {
    const from = at(points, index);
    const to = at(points, (index + 1) % points.length);
    const side = { x: -along.y * half, y: along.x * half };
    parts.push([plus(from, side), minus(from, side), minus(to, side), plus(to, side)]);
    if (closed || index > 0) {
      const before = at(directions, (index + edges - 1) % edges);
      const corner = joinPart(from, before, along, {
        half,
        join: from.smooth ? "round" : options.join,
        limit: options.mitreLimit,
        overlap: Math.min(overlap, at(lengths, index) / 2, at(lengths, (index + edges - 1) % edges) / 2),
      });
      if (corner) parts.push(corner);
    }
  }
  if (!closed) {
    const cap = (end: Point, outward: Point, length: number) =>
      capPart(end, outward, { half, cap: options.cap, overlap: Math.min(overlap, length / 2) });
    const start = cap(first, scaled(at(directions, 0), -1), at(lengths, 0));
    const end = cap(at(points, points.length - 1), at(directions, edges - 1), at(lengths, edges - 1));
    if (start) parts.push(start);
    if (end) parts.push(end);
  }
  return parts.map((part) => (signedRingArea(part) < 0 ? part.toReversed() : part));
}

function joinPart(
  corner: Point,
  before: Point,
  after: Point,
  options: { half: number; join: Join | "bevel"; limit: number; overlap: number },
): Polygon | null {
  const { half, join, limit, overlap } = options;
  const cross = before.x * after.y - before.y * after.x;
  const dot = before.x * after.x + before.y * after.y;
  if (Math.abs(cross) < 1e-9 && dot > 0) return null;
  // The gap opens on the side away from the turn.
  const outward = cross > 0 ? -1 : 1;
  const a = { x: -before.y * half * outward, y: before.x * half * outward };
  const b = { x: -after.y * half * outward, y: after.x * half * outward };
  // Reaching a little into both boxes, or rounding to the grid would leave slits along their ends.
  const inset = 1 - overlap / half;
  const into = [
    plus(plus(corner, scaled(b, inset)), scaled(after, overlap)),
    plus(corner, scaled(after, overlap)),
    plus(corner, scaled(direction(before, after), overlap)),
    plus(corner, scaled(before, -overlap)),
    plus(plus(corner, scaled(a, inset)), scaled(before, -overlap)),
  ];
  if (join === "round") return [...into, ...arc(corner, a, half, -outward * Math.acos(Math.max(-1, Math.min(1, dot))))];
  if (join === "mitre" && Math.abs(cross) >= 1e-9) {
    // Length of the mitre over the stroke's width is 1 / sin(half of the angle between the edges); dot = -cos of that angle.
    const ratioSquared = 2 / (1 + dot);
    if (ratioSquared <= limit * limit) {
      const reach = 1 / (1 + dot);
      return [...into, plus(corner, a), plus(corner, scaled(plus(a, b), reach)), plus(corner, b)];
    }
  }
  return [...into, plus(corner, a), plus(corner, b)];
}

function capPart(end: Point, outward: Point, options: { half: number; cap: Cap; overlap: number }): Polygon | null {
  const { half, cap, overlap } = options;
  if (cap === "butt") return null;
  const side = { x: -outward.y * half, y: outward.x * half };
  const back = scaled(outward, -overlap);
  const inset = scaled(side, 1 - overlap / half);
  const base = [plus(minus(end, inset), back), plus(plus(end, inset), back)];
  if (cap === "square") {
    const reach = scaled(outward, half);
    return [...base, plus(end, side), plus(plus(end, side), reach), plus(minus(end, side), reach), minus(end, side)];
  }
  return [...base, ...arc(end, side, half, -Math.PI)];
}

function dot(centre: Point, half: number, cap: Cap): Region {
  if (cap === "butt") return [];
  const { x, y } = centre;
  if (cap === "square") {
    return [
      [
        { x: x - half, y: y - half },
        { x: x + half, y: y - half },
        { x: x + half, y: y + half },
        { x: x - half, y: y + half },
      ],
    ];
  }
  const count = Math.max(8, 4 * arcSteps(Math.PI / 2, half));
  return [
    Array.from({ length: count }, (_, index) => ({
      x: x + half * Math.cos((2 * Math.PI * index) / count),
      y: y + half * Math.sin((2 * Math.PI * index) / count),
    })),
  ];
}

/** Points of an arc about `centre` that starts at `centre + from` and turns by `angle`, both ends included. */
function arc(centre: Point, from: Point, radius: number, angle: number): Point[] {
  const steps = arcSteps(Math.abs(angle), radius);
  return Array.from({ length: steps + 1 }, (_, step) => {
    const cos = Math.cos((angle * step) / steps);
    const sin = Math.sin((angle * step) / steps);
    return { x: centre.x + from.x * cos - from.y * sin, y: centre.y + from.x * sin + from.y * cos };
  });
}

function arcSteps(angle: number, radius: number): number {
  const step = 2 * Math.acos(Math.max(0, 1 - arcToleranceMm / radius));
  return Math.max(1, Math.ceil(angle / Math.max(step, 0.01)));
}

function withoutRepeats(line: readonly StrokePoint[], closed: boolean): StrokePoint[] {
  const points: StrokePoint[] = [];
  for (const point of line) {
    const last = points.at(-1);
    if (!last || Math.hypot(point.x - last.x, point.y - last.y) > 1e-9) points.push(point);
  }
  const first = points[0];
  const last = points.at(-1);
  if (closed && points.length > 1 && first && last && Math.hypot(first.x - last.x, first.y - last.y) <= 1e-9)
    points.pop();
  return points;
}

function direction(from: Point, to: Point): Point {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  return { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
}

const plus = (a: Point, b: Point): Point => ({ x: a.x + b.x, y: a.y + b.y });
const minus = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y });
const scaled = (a: Point, factor: number): Point => ({ x: a.x * factor, y: a.y * factor });

function at<T>(list: readonly T[], index: number): T {
  const item = list[index];
  if (item === undefined) throw new RangeError(`No item ${index} in a list of ${list.length}.`);
  return item;
}
