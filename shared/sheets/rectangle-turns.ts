import { lengthToleranceMm } from "../geometry/tolerance.ts";
import type { CutShape } from "./cut-shape.ts";
import { isTurnAllowed } from "./outline-turns.ts";

/** The turn, from 0 up to 90, at which a rectangle's sides lie along the axes; null for a shape that is no rectangle. */
export function rectangleTurn({ region, areaMm2 }: Pick<CutShape, "region" | "areaMm2">): number | null {
  const [ring] = region;
  const [a, b, c, d] = ring ?? [];
  if (region.length !== 1 || ring?.length !== 4 || !a || !b || !c || !d) return null;
  const long = Math.hypot(b.x - a.x, b.y - a.y);
  const wide = Math.hypot(c.x - b.x, c.y - b.y);
  // Both diagonals and both pairs of sides are equal in a rectangle and in nothing else.
  const pairs = [
    [long, Math.hypot(d.x - c.x, d.y - c.y)],
    [wide, Math.hypot(a.x - d.x, a.y - d.y)],
    [Math.hypot(c.x - a.x, c.y - a.y), Math.hypot(d.x - b.x, d.y - b.y)],
  ] as const;
  if (areaMm2 <= 0 || pairs.some(([one, other]) => Math.abs(one - other) > 2 * lengthToleranceMm)) return null;
  const degrees = (-Math.atan2(b.y - a.y, b.x - a.x) * 180) / Math.PI;
  const turn = ((degrees % 90) + 90) % 90;
  return turn < 1e-9 || 90 - turn < 1e-9 ? 0 : turn;
}

/** The allowed turns at which a rectangle lies along the axes: one for each of its two ways; none when it must lie askew. */
export function sidesAlongAxes(shape: CutShape, grainTurn: number): readonly number[] {
  const turn = rectangleTurn(shape);
  if (turn === null) return [];
  const allowed = (degrees: number) => isTurnAllowed(degrees, shape.piece.turns, grainTurn);
  const ways = [
    [turn, turn + 180],
    [turn + 90, turn + 270],
  ].map((same) => same.find(allowed));
  return ways.filter((way) => way !== undefined);
}
