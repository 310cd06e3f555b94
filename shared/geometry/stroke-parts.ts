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

  const closed = options.closed && points.length > 2;
  const parts: Polygon[] = [];
  const edges = closed ? points.length : points.length - 1;
  const directions = Array.from({ length: edges }, (_, index) =>
    direction(at(points, index), at(points, (index + 1) % points.length)),
  );
  for (const [index, along] of directions.entries()) {
    const from = at(points, index);
    const to = at(points, (index + 1) % points.length);
    const side = { x: -along.y * half, y: along.x * half };
    parts.push([plus(from, side), minus(from, side), minus(to, side), plus(to, side)]);
    if (closed || index > 0) {
      const before = at(directions, (index + edges - 1) % edges);
      const corner = joinPart(from, before, along, half, from.smooth ? "round" : options.join, options.mitreLimit);
      if (corner) parts.push(corner);
    }
  }
  if (!closed) {
    const start = capPart(first, negated(at(directions, 0)), half, options.cap);
    const end = capPart(at(points, points.length - 1), at(directions, edges - 1), half, options.cap);
    if (start) parts.push(start);
    if (end) parts.push(end);
  }
  return parts.map((part) => (signedRingArea(part) < 0 ? part.toReversed() : part));
}

function joinPart(corner: Point, before: Point, after: Point, half: number, join: Join | "bevel", limit: number) {
  const cross = before.x * after.y - before.y * after.x;
  const dot = before.x * after.x + before.y * after.y;
  if (Math.abs(cross) < 1e-9 && dot > 0) return null;
  // The gap opens on the side away from the turn.
  const outward = cross > 0 ? -1 : 1;
  const a = { x: -before.y * half * outward, y: before.x * half * outward };
  const b = { x: -after.y * half * outward, y: after.x * half * outward };
  if (join === "round") return [corner, ...arc(corner, a, b, half, dot)];
  if (join === "mitre" && Math.abs(cross) >= 1e-9) {
    // Length of the mitre over the stroke's width is 1 / sin(half of the angle between the edges); dot = -cos of that angle.
    const ratioSquared = 2 / (1 + dot);
    if (ratioSquared <= limit * limit) {
      const reach = 1 / (1 + dot);
      return [
        corner,
        plus(corner, a),
        { x: corner.x + (a.x + b.x) * reach, y: corner.y + (a.y + b.y) * reach },
        plus(corner, b),
      ];
    }
  }
  return [corner, plus(corner, a), plus(corner, b)];
}

function capPart(end: Point, outward: Point, half: number, cap: Cap): Polygon | null {
  if (cap === "butt") return null;
  const side = { x: -outward.y * half, y: outward.x * half };
  if (cap === "square") {
    const reach = { x: outward.x * half, y: outward.y * half };
    return [plus(end, side), minus(end, side), plus(minus(end, side), reach), plus(plus(end, side), reach)];
  }
  const tip = { x: outward.x * half, y: outward.y * half };
  return [...arc(end, side, tip, half, 0), ...arc(end, tip, negated(side), half, 0).slice(1)];
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

/** Points of the shorter arc about `centre` from `centre + a` to `centre + b`, both ends included. */
function arc(centre: Point, a: Point, b: Point, radius: number, cosine: number): Point[] {
  const angle = Math.acos(Math.max(-1, Math.min(1, cosine)));
  const steps = arcSteps(angle, radius);
  const way = a.x * b.y - a.y * b.x < 0 ? -1 : 1;
  const points: Point[] = [plus(centre, a)];
  for (let step = 1; step < steps; step++) {
    const turn = (way * angle * step) / steps;
    const cos = Math.cos(turn);
    const sin = Math.sin(turn);
    points.push({ x: centre.x + a.x * cos - a.y * sin, y: centre.y + a.x * sin + a.y * cos });
  }
  points.push(plus(centre, b));
  return points;
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
const negated = (a: Point): Point => ({ x: -a.x, y: -a.y });

function at<T>(list: readonly T[], index: number): T {
  const item = list[index];
  if (item === undefined) throw new RangeError(`No item ${index} in a list of ${list.length}.`);
  return item;
}
