import type { Point } from "../geometry/path.ts";
import type { Quad } from "./quad.ts";

/** A projective map of the plane, row by row: (x, y, 1) becomes (u·w, v·w, w). w is above 0 for what is in sight. */
export type Homography = readonly [number, number, number, number, number, number, number, number, number];

/**
 * The map that takes four points to four others, each four convex and running the same way round. Null when three of either lie in a line.
 * Closed form by way of the unit square: Heckbert, Fundamentals of Texture Mapping and Image Warping (1989), section 2.2.3.
 */
export function homographyBetween(from: Quad, to: Quad): Homography | null {
  const [here, there] = [squareTo(from), squareTo(to)];
  const back = here && inverse(here);
  return back && there ? product(there, back) : null;
}

/** The map that takes the corners (0,0), (1,0), (1,1), (0,1) to the four given. */
function squareTo([a, b, c, d]: Quad): Homography | null {
  const [dx1, dy1, dx2, dy2] = [b.x - c.x, b.y - c.y, d.x - c.x, d.y - c.y];
  const [sx, sy] = [a.x - b.x + c.x - d.x, a.y - b.y + c.y - d.y];
  const area = dx1 * dy2 - dx2 * dy1;
  if (area === 0) return null;
  const g = (sx * dy2 - dx2 * sy) / area;
  const h = (dx1 * sy - sx * dy1) / area;
  return [b.x - a.x + g * b.x, d.x - a.x + h * d.x, a.x, b.y - a.y + g * b.y, d.y - a.y + h * d.y, a.y, g, h, 1];
}

/** `first`, then `then`. */
export function product(then: Homography, first: Homography): Homography {
  const [a, b, c, d, e, f, g, h, i] = then;
  const [j, k, l, m, n, o, p, q, r] = first;
  return [
    a * j + b * m + c * p,
    a * k + b * n + c * q,
    a * l + b * o + c * r,
    d * j + e * m + f * p,
    d * k + e * n + f * q,
    d * l + e * o + f * r,
    g * j + h * m + i * p,
    g * k + h * n + i * q,
    g * l + h * o + i * r,
  ];
}

/** The map back; null when there is none. */
export function inverse([a, b, c, d, e, f, g, h, i]: Homography): Homography | null {
  const determinant = a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
  if (determinant === 0 || !Number.isFinite(determinant)) return null;
  return [
    (e * i - f * h) / determinant,
    (c * h - b * i) / determinant,
    (b * f - c * e) / determinant,
    (f * g - d * i) / determinant,
    (a * i - c * g) / determinant,
    (c * d - a * f) / determinant,
    (d * h - e * g) / determinant,
    (b * g - a * h) / determinant,
    (a * e - b * d) / determinant,
  ];
}

/** Moves by (x, y). */
export const shiftBy = (x: number, y: number): Homography => [1, 0, x, 0, 1, y, 0, 0, 1];

/** Scales about the origin. */
export const scaleBy = (by: number): Homography => [by, 0, 0, 0, by, 0, 0, 0, 1];

/** Where a point comes to lie; null on and beyond the line that the map sends to infinity, as for what is behind a camera. */
export function mapPoint(map: Homography, { x, y }: Point): Point | null {
  const [a, b, c, d, e, f, g, h, i] = map;
  const w = g * x + h * y + i;
  if (w <= 0) return null;
  return { x: (a * x + b * y + c) / w, y: (d * x + e * y + f) / w };
}

/** How many times longer lengths about a point become, as the root of how many times larger areas do; null as for mapPoint. */
export function localScale(map: Homography, { x, y }: Point): number | null {
  const [a, b, c, d, e, f, g, h, i] = map;
  const w = g * x + h * y + i;
  if (w <= 0) return null;
  const determinant = a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g);
  return Math.sqrt(Math.abs(determinant / (w * w * w)));
}
