import type { Point } from "../geometry/path.ts";
import { longestSpanMm } from "./longest-span.ts";

/** How points hold a sheet: as the corners of a rectangle, or by their longest span. Lengths in mm. */
export type HoldingPattern = { readonly middle: Point; readonly longer: number } & (
  | { readonly kind: "four points"; readonly shorter: number }
  | { readonly kind: "span" }
);

/**
 * How points hold a sheet; null when fewer than two of them are apart. Four count as a rectangle's corners, however it
 * is turned, when its sides and its diagonals are alike within `tolerance` mm.
 */
export function holdingPattern(points: readonly Point[], tolerance: number): HoldingPattern | null {
  const span = longestSpanMm(points);
  if (!(span > 0)) return null;
  const middle = {
    x: points.reduce((sum, { x }) => sum + x, 0) / points.length,
    y: points.reduce((sum, { y }) => sum + y, 0) / points.length,
  };
  const sides = rectangleSides(points, middle, tolerance);
  return sides ? { kind: "four points", middle, ...sides } : { kind: "span", middle, longer: span };
}

function rectangleSides(points: readonly Point[], middle: Point, tolerance: number) {
  const around = points.toSorted((a, b) => turnAbout(middle, a) - turnAbout(middle, b));
  const [a, b, c, d] = around;
  if (points.length !== 4 || !a || !b || !c || !d) return null;
  const alike = (one: number, other: number): boolean => Math.abs(one - other) <= tolerance;
  const [ab, bc, cd, da] = [apart(a, b), apart(b, c), apart(c, d), apart(d, a)];
  if (!alike(ab, cd) || !alike(bc, da) || !alike(apart(a, c), apart(b, d))) return null;
  const longer = Math.max(ab, bc, cd, da);
  const shorter = Math.max(Math.min(ab, bc), Math.min(cd, da));
  return shorter > tolerance ? { longer, shorter } : null;
}

const turnAbout = (middle: Point, point: Point): number => Math.atan2(point.y - middle.y, point.x - middle.x);
const apart = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);
