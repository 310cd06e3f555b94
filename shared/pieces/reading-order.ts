import type { Box } from "../geometry/path.ts";

/**
 * Things in lines from the top, each from left to right: one belongs to the line whose middle lies within half its height.
 * What stands together is not told apart by its gaps.
 */
export function inReadingOrder<T>(things: readonly T[], boxOf: (thing: T) => Box): T[][] {
  const lines: { middle: number; height: number; things: T[] }[] = [];
  const fromTop = things.toSorted((a, b) => boxOf(a).y - boxOf(b).y || boxOf(a).x - boxOf(b).x);
  for (const thing of fromTop) {
    const { y, height } = boxOf(thing);
    const middle = y + height / 2;
    const line = lines.find((one) => Math.abs(one.middle - middle) <= Math.max(one.height, height) / 2);
    if (!line) lines.push({ middle, height, things: [thing] });
    else {
      line.things.push(thing);
      if (height > line.height) {
        line.height = height;
        line.middle = middle;
      }
    }
  }
  return lines.map((line) => line.things.toSorted((a, b) => boxOf(a).x - boxOf(b).x));
}
