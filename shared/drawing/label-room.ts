import { boxOfRegion } from "../geometry/box.ts";
import type { Point, Region } from "../geometry/path.ts";

/** Heights at which room is looked for, evenly over a shape. */
const levels = 15;

/** Room beyond this share of the text's width makes a place no better; the one nearer to the middle is taken. */
const ample = 1.5;

/**
 * The middle of a roomy place in a region for a line of text `width` by `height`; null when there is none. Looked for at
 * 15 heights, along the upper edge of the text, its middle and its lower edge.
 */
export function labelRoom(region: Region, width: number, height: number): Point | null {
  const box = boxOfRegion(region);
  if (!box) return null;
  let best: { readonly room: number; readonly off: number; readonly middle: Point } | null = null;
  for (let level = 1; level <= levels; level++) {
    const y = box.y + (box.height * level) / (levels + 1);
    const off = Math.abs(y - box.y - box.height / 2);
    for (const [left, right] of [y, y + height / 2].reduce(
      (shared, at) => overlaps(shared, chords(region, at)),
      chords(region, y - height / 2),
    )) {
      const room = Math.min(right - left, ample * width);
      if (room < width) continue;
      if (!best || room > best.room + 1e-9 || (room > best.room - 1e-9 && off < best.off))
        best = { room, off, middle: { x: (left + right) / 2, y } };
    }
  }
  return best?.middle ?? null;
}

type Chord = readonly [from: number, to: number];

function overlaps(some: readonly Chord[], others: readonly Chord[]): Chord[] {
  return some.flatMap(([from, to]) =>
    others.flatMap(([start, end]): Chord[] => {
      const [left, right] = [Math.max(from, start), Math.min(to, end)];
      return left < right ? [[left, right]] : [];
    }),
  );
}

/** Where a horizontal line runs through a region. */
function chords(region: Region, y: number): Chord[] {
  const crossings: number[] = [];
  for (const ring of region) {
    let previous = ring.at(-1);
    for (const point of ring) {
      if (previous && previous.y <= y !== point.y <= y)
        crossings.push(previous.x + ((point.x - previous.x) * (y - previous.y)) / (point.y - previous.y));
      previous = point;
    }
  }
  crossings.sort((a, b) => a - b);
  return crossings.flatMap((start, index) => {
    const end = crossings[index + 1];
    return index % 2 === 0 && end !== undefined ? [[start, end] as const] : [];
  });
}
