import type { Point } from "../geometry/path.ts";
import { bearingOf, directionOf } from "./direction.ts";

/** A turn in degrees clockwise about a point, and after it a shift in mm. */
export type RigidStep = { readonly about: Point; readonly turn: number; readonly dx: number; readonly dy: number };

export type RoundOrder = {
  readonly centre: Point;
  /** mm from the centre; null leaves each as far from it as it is. */
  readonly radius: number | null;
  /** Degrees clockwise from the first to the last, or 360 for all the way round, where the last comes a step before the first. */
  readonly sweep: number;
  /** Whether things turn along as they go round; else they stay upright. */
  readonly turned: boolean;
};

/** Where a thing stands that lies on the centre itself: at the top. */
const topBearing = -90;

const isFull = (sweep: number): boolean => Math.abs(sweep) >= 360;

/**
 * Steps that bring things round a centre at equal angles, in the order given: the one named first keeps its bearing, the
 * others follow in the order in which they lie round the centre, clockwise (counter-clockwise for a sweep under 0). Null
 * when one lies on the centre and no radius says how far out it belongs.
 */
export function stepsRound(middles: readonly Point[], order: RoundOrder): RigidStep[] | null {
  const [first] = middles;
  if (!first) return [];
  const start = bearingOf(order.centre, first) ?? topBearing;
  const towards = order.sweep < 0 ? -1 : 1;
  const behind = (point: Point) => {
    const bearing = bearingOf(order.centre, point) ?? topBearing;
    return ((((bearing - start) * towards) % 360) + 360) % 360;
  };
  const around = middles
    .map((middle, index) => ({ index, angle: index === 0 ? 0 : behind(middle) }))
    .sort((a, b) => (a.index === 0 ? -1 : b.index === 0 ? 1 : a.angle - b.angle || a.index - b.index));
  const spaces = isFull(order.sweep) ? middles.length : Math.max(1, middles.length - 1);
  const each = (isFull(order.sweep) ? 360 * towards : order.sweep) / spaces;
  const steps: (RigidStep | null)[] = middles.map(() => null);
  for (const [place, { index }] of around.entries()) {
    const middle = middles[index];
    steps[index] = middle ? stepTo(middle, start + place * each, order) : null;
  }
  return steps.every((step) => step !== null) ? steps : null;
}

/**
 * Steps for a thing itself, which moves only when a radius is given, and for `count` copies of it round a centre. Null
 * when it lies on the centre and no radius is given.
 */
export function stepsOfCopiesRound(
  middle: Point,
  count: number,
  order: RoundOrder,
): { readonly own: RigidStep; readonly copies: readonly RigidStep[] } | null {
  const start = bearingOf(order.centre, middle) ?? topBearing;
  const towards = order.sweep < 0 ? -1 : 1;
  const each = isFull(order.sweep) ? (360 * towards) / (count + 1) : order.sweep / count;
  const [own, ...copies] = Array.from({ length: count + 1 }, (_, place) => stepTo(middle, start + place * each, order));
  if (!own || copies.some((step) => step === null)) return null;
  return { own, copies: copies.filter((step) => step !== null) };
}

function stepTo(middle: Point, bearing: number, { centre, radius, turned }: RoundOrder): RigidStep | null {
  const was = bearingOf(centre, middle);
  const far = radius ?? Math.hypot(middle.x - centre.x, middle.y - centre.y);
  if (far === 0) return null;
  const { x, y } = directionOf(bearing);
  return {
    about: middle,
    turn: turned ? bearing - (was ?? topBearing) : 0,
    dx: centre.x + far * x - middle.x,
    dy: centre.y + far * y - middle.y,
  };
}
