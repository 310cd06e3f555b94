import { boxOfPoints } from "../../geometry/box.ts";
import type { Box, Point } from "../../geometry/path.ts";
import { type Matrix, pointTransform } from "../../geometry/transform.ts";

/** How many numbers follow each step of a path as pdf.js packs it, and SVG's letter for the step. */
const steps = [
  { letter: "M", count: 2 },
  { letter: "L", count: 2 },
  { letter: "C", count: 6 },
  { letter: "Q", count: 4 },
  { letter: "Z", count: 0 },
] as const;

/** A packed path as SVG path data; null when it holds a number that is not finite or a step that is unknown. */
export function pathData(packed: ArrayLike<number>, decimals = 5): string | null {
  let text = "";
  let at = 0;
  while (at < packed.length) {
    const step = steps[packed[at] ?? -1];
    if (!step || at + step.count >= packed.length) return null;
    text += step.letter;
    for (let index = 1; index <= step.count; index++) {
      const value = packed[at + index] ?? Number.NaN;
      if (!Number.isFinite(value)) return null;
      text += `${index > 1 ? " " : ""}${Number(value.toFixed(decimals))}`;
    }
    at += step.count + 1;
  }
  return text;
}

/** The box a packed path fills when it is an upright rectangle after `matrix`; null for every other path. */
export function rectangleOf(packed: ArrayLike<number>, matrix: Matrix): Box | null {
  const points: Point[] = [];
  for (let at = 0; at < packed.length; at += 3) {
    const step = packed[at];
    if (step === 4 && at === packed.length - 1) break;
    if (step !== (at === 0 ? 0 : 1)) return null;
    points.push(pointTransform({ x: packed[at + 1] ?? Number.NaN, y: packed[at + 2] ?? Number.NaN }, matrix));
  }
  const [first, last] = [points[0], points.at(-1)];
  if (points.length === 5 && first && last && isSame(first.x, last.x) && isSame(first.y, last.y)) points.pop();
  if (points.length !== 4) return null;
  const isUpright = points.every((point, index) => {
    const next = points[(index + 1) % 4];
    const afterNext = points[(index + 2) % 4];
    if (!next || !afterNext) return false;
    const across = isSame(point.y, next.y) && isSame(next.x, afterNext.x);
    return across || (isSame(point.x, next.x) && isSame(next.y, afterNext.y));
  });
  return isUpright ? boxOfPoints(points) : null;
}

/** Packed paths hold single precision: a page of 14,400 points is known to a thousandth of one. */
function isSame(a: number, b: number): boolean {
  return Math.abs(a - b) < 0.002;
}
