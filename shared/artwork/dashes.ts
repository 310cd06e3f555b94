import type { StrokePoint } from "../geometry/stroke-parts.ts";
import type { ArtworkBudget } from "./budget.ts";

/** A dash without length still draws a round or square dot along the line: it gets this much of one. */
const dotLength = 1e-5;

/**
 * Cuts a line into its dashes (SVG 2, section 13.5.6): lengths of `pattern` alternate drawn and skipped, from `offset` into it.
 * All in one unit. A pattern that is empty, holds a negative number or sums to nothing leaves the line whole.
 */
export function dashLine(
  line: readonly StrokePoint[],
  options: { closed: boolean; pattern: readonly number[]; offset: number; budget: ArtworkBudget },
): StrokePoint[][] | null {
  const { closed, offset, budget } = options;
  const pattern = options.pattern.length % 2 === 1 ? [...options.pattern, ...options.pattern] : options.pattern;
  const period = pattern.reduce((sum, length) => sum + length, 0);
  if (!(period > 0) || !Number.isFinite(period) || pattern.some((length) => length < 0)) return null;
  const first = line[0];
  if (!first) return [];
  const points = closed ? [...line, first] : line;
  let total = 0;
  for (let i = 1; i < points.length; i++) total += distance(points[i - 1], points[i]);
  // Counted before the work is done, since the work is what the limit is for.
  budget.countDashes((total / period) * (pattern.length / 2));

  let place = ((offset % period) + period) % period;
  let step = 0;
  while (place >= (pattern[step] ?? 0) && place > 0) {
    place -= pattern[step] ?? 0;
    step = (step + 1) % pattern.length;
  }
  let left = (pattern[step] ?? 0) - place;
  const dashes: StrokePoint[][] = [];
  let dash: StrokePoint[] | null = step % 2 === 0 ? [first] : null;
  for (let i = 1; i < points.length; i++) {
    const from = points[i - 1] ?? first;
    const to = points[i] ?? first;
    const length = distance(from, to);
    let done = 0;
    while (length - done > left) {
      done += left;
      const at = between(from, to, done / length);
      if (dash) {
        dash.push(dash.length === 1 && left === 0 ? between(from, to, (done + dotLength) / length) : at);
        dashes.push(dash);
        dash = null;
      } else dash = [at];
      step = (step + 1) % pattern.length;
      left = pattern[step] ?? 0;
    }
    left -= length - done;
    dash?.push(to);
  }
  if (dash && dash.length > 1) dashes.push(dash);
  return dashes;
}

function distance(a: StrokePoint | undefined, b: StrokePoint | undefined): number {
  return a && b ? Math.hypot(b.x - a.x, b.y - a.y) : 0;
}

function between(from: StrokePoint, to: StrokePoint, t: number): StrokePoint {
  return { x: from.x + (to.x - from.x) * t, y: from.y + (to.y - from.y) * t };
}
