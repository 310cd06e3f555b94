import type { Point } from "../geometry/path.ts";
import type { Homography } from "./homography.ts";

export type Vector = readonly [number, number, number];

/** A camera without lens faults: square pixels, looking straight through the middle of its picture. */
export type Camera = {
  /** Px. */
  readonly focal: number;
  /** Px. */
  readonly middle: Point;
  /** Directions of the wall's x, its y and into the wall, each as the camera sees it: x right, y down, z away from it. */
  readonly axes: readonly [Vector, Vector, Vector];
  /** Where the wall's origin is from the camera, mm. */
  readonly origin: Vector;
};

/**
 * The map from the plane that stands `heightMm` off the wall, in mm of the wall, to px of the photo. Columns of K·[r1 r2 t],
 * t moved along the wall's normal: Hartley and Zisserman, Multiple View Geometry (2nd ed.), section 8.1.1.
 */
export function planeToPhoto({ focal, middle, axes, origin }: Camera, heightMm: number): Homography {
  const seen = ([x, y, z]: Vector): Vector => [focal * x + middle.x * z, focal * y + middle.y * z, z];
  const [along, down, into] = axes;
  const [a, b, c] = [seen(along), seen(down), seen(plus(origin, times(into, -heightMm)))];
  return [a[0], b[0], c[0], a[1], b[1], c[1], a[2], b[2], c[2]];
}

export const cross = ([a, b, c]: Vector, [d, e, f]: Vector): Vector => [b * f - c * e, c * d - a * f, a * e - b * d];
export const dot = ([a, b, c]: Vector, [d, e, f]: Vector): number => a * d + b * e + c * f;
export const times = ([a, b, c]: Vector, by: number): Vector => [a * by, b * by, c * by];
export const plus = ([a, b, c]: Vector, [d, e, f]: Vector): Vector => [a + d, b + e, c + f];
export const lengthOf = (vector: Vector): number => Math.sqrt(dot(vector, vector));

/** Each vector turned about `by`, whose length is the angle in radians (Rodrigues). */
export function turned(vector: Vector, by: Vector): Vector {
  const angle = lengthOf(by);
  if (angle === 0) return vector;
  const axis = times(by, 1 / angle);
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return plus(plus(times(vector, cos), times(cross(axis, vector), sin)), times(axis, dot(axis, vector) * (1 - cos)));
}
