import type { Point } from "../geometry/path.ts";
import { outside, turned } from "./edge-walk.ts";
import { cornerPoint, type Edge, type traceEdges } from "./trace-edges.ts";

/** Where a junction lies, and the edges of its that run through it smoothly: the direction in which each leaves it. */
export type Junction = { readonly at: Point; readonly through: ReadonlyMap<string, Point> };

/** An end of an edge, by the corner and the heading in which it leaves it. */
export const endKey = (corner: number, heading: number): string => `${corner} ${heading}`;

/** Two edges whose directions differ by less run into each other. */
const smoothRadians = (30 * Math.PI) / 180;
/** Directions at a junction are taken from points about this many pixels away. */
const reach = 4;

/**
 * The places of all junctions. Where a shape lies before the border of two others, its outline runs through the junction:
 * the place is taken from it alone, and it keeps its direction there.
 */
export function placeJunctions({ grid, edges }: ReturnType<typeof traceEdges>): ReadonlyMap<number, Junction> {
  const ends = new Map<number, { key: string; points: readonly Point[]; onRim: boolean }[]>();
  const add = (corner: number | null, heading: number, points: readonly Point[], { left, right }: Edge): void => {
    if (corner === null) return;
    const found = ends.get(corner) ?? [];
    found.push({ key: endKey(corner, heading), points, onRim: left === outside || right === outside });
    ends.set(corner, found);
  };
  for (const edge of edges) {
    add(edge.from, edge.leaving, edge.points.slice(0, 12), edge);
    add(edge.to, turned(edge.arriving, 2), edge.points.slice(-12).toReversed(), edge);
  }
  const placed = new Map<number, Junction>();
  for (const [corner, meeting] of ends) placed.set(corner, placeOf(cornerPoint(grid, corner), meeting, grid.labels));
  return placed;
}

type End = { readonly key: string; readonly points: readonly Point[]; readonly onRim: boolean };

function placeOf(corner: Point, ends: readonly End[], { width, height }: { width: number; height: number }): Junction {
  const inner = ends.find(({ onRim }) => !onRim);
  const near = inner?.points[0];
  if (ends.some(({ onRim }) => onRim)) {
    // On the rim the junction slides along it to where the inner border arrives.
    const at = near && ends.length === 3 ? near : corner;
    const upright = corner.x === 0 || corner.x === width;
    const level = corner.y === 0 || corner.y === height;
    return { at: { x: upright ? corner.x : at.x, y: level ? corner.y : at.y }, through: new Map() };
  }
  const directions = ends.map(({ points }) => directionOf(points));
  let best: { a: number; b: number; bend: number } | null = null;
  for (const [a, from] of directions.entries()) {
    for (let b = a + 1; b < directions.length; b++) {
      const to = directions[b];
      if (!from || !to) continue;
      const bend = Math.PI - Math.acos(Math.max(-1, Math.min(1, from.x * to.x + from.y * to.y)));
      if (!best || bend < best.bend) best = { a, b, bend };
    }
  }
  const firsts = ends.flatMap(({ points }) => points.slice(0, 1));
  if (!best || best.bend > smoothRadians) return { at: middleOf(firsts), through: new Map() };
  const [one, other] = [ends[best.a], ends[best.b]];
  const [p, q] = [one?.points[0] ?? corner, other?.points[0] ?? corner];
  const along = unit(minus(farPoint(one?.points ?? [p]), farPoint(other?.points ?? [q])));
  return {
    at: middleOf([p, q]),
    through: new Map([
      [one?.key ?? "", along],
      [other?.key ?? "", { x: -along.x, y: -along.y }],
    ]),
  };
}

function farPoint(points: readonly Point[]): Point {
  return points[Math.min(points.length, reach) - 1] ?? { x: 0, y: 0 };
}

function directionOf(points: readonly Point[]): Point | null {
  const [near] = points;
  const far = farPoint(points.slice(1));
  return near && points.length > 2 ? unit(minus(far, near)) : null;
}

function middleOf(points: readonly Point[]): Point {
  const sum = points.reduce((all, { x, y }) => ({ x: all.x + x, y: all.y + y }), { x: 0, y: 0 });
  return { x: sum.x / points.length, y: sum.y / points.length };
}

const minus = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y });
const unit = ({ x, y }: Point): Point => {
  const length = Math.hypot(x, y) || 1;
  return { x: x / length, y: y / length };
};
