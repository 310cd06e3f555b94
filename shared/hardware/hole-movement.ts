import type { Point } from "../geometry/path.ts";

export type MovementConditions = {
  /** Linear expansion of the panel per kelvin. */
  readonly expansionPerK: number;
  readonly temperatureK: number;
  /** Wood's movement across the grain per point of moisture. */
  readonly woodPerPoint: number;
  readonly moisturePoints: number;
  /** Direction of the grain, degrees clockwise from the x axis. */
  readonly grainTurn: number;
};

/**
 * How far in mm a hole of a panel moves against the wood under it, seen from the fixed hole:
 * L · (α |ΔT| + C |ΔM| sin²β), with β between that direction and the grain (Wood Handbook GTR-282, equation 13-2, and
 * linear expansion). Nothing for the fixed hole itself.
 */
export function holeMovementMm(fixed: Point, hole: Point, conditions: MovementConditions): number {
  const { expansionPerK, temperatureK, woodPerPoint, moisturePoints, grainTurn } = conditions;
  const dx = hole.x - fixed.x;
  const dy = hole.y - fixed.y;
  const length = Math.hypot(dx, dy);
  if (length === 0) return 0;
  const sine = Math.sin(Math.atan2(dy, dx) - (grainTurn * Math.PI) / 180);
  return length * (expansionPerK * Math.abs(temperatureK) + woodPerPoint * Math.abs(moisturePoints) * sine * sine);
}

/** The hole that the others move against: the one marked fixed, else the middle of them all; null for none. */
export function fixedPoint(
  holes: readonly { readonly x: number; readonly y: number; readonly fixed: boolean }[],
): Point | null {
  const fixed = holes.find((hole) => hole.fixed);
  if (fixed) return { x: fixed.x, y: fixed.y };
  if (holes.length === 0) return null;
  const sum = holes.reduce((all, hole) => ({ x: all.x + hole.x, y: all.y + hole.y }), { x: 0, y: 0 });
  return { x: sum.x / holes.length, y: sum.y / holes.length };
}
