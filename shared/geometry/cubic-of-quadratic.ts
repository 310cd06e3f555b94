import type { Point, Segment } from "./path.ts";

/** The same curve as a quadratic's, as a cubic: its handles lie two thirds of the way to the quadratic's one. */
export function cubicOfQuadratic(from: Point, control: Point, to: Point): Segment {
  const towards = (end: Point): Point => ({
    x: end.x + (2 / 3) * (control.x - end.x),
    y: end.y + (2 / 3) * (control.y - end.y),
  });
  return { kind: "cubic", c1: towards(from), c2: towards(to), to };
}
