import type { Point } from "../geometry/path.ts";

/** The unit vector that points `degrees` clockwise from the x axis; at quarter turns without a trace of the other axis. */
export function directionOf(degrees: number): Point {
  const turn = ((degrees % 360) + 360) % 360;
  const quarter = quarters.get(turn);
  if (quarter) return quarter;
  const radians = (turn * Math.PI) / 180;
  return { x: Math.cos(radians), y: Math.sin(radians) };
}

const quarters: ReadonlyMap<number, Point> = new Map([
  [0, { x: 1, y: 0 }],
  [90, { x: 0, y: 1 }],
  [180, { x: -1, y: 0 }],
  [270, { x: 0, y: -1 }],
]);

/** Where `point` lies seen from `centre`, degrees clockwise from the x axis, over -180 up to 180; null at the centre. */
export function bearingOf(centre: Point, point: Point): number | null {
  const dx = point.x - centre.x;
  const dy = point.y - centre.y;
  return dx === 0 && dy === 0 ? null : (Math.atan2(dy, dx) * 180) / Math.PI;
}
