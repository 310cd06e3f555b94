import type { Point, Region } from "../geometry/path.ts";

/** A stretch of a line, by how far along it it begins and ends, mm. */
export type Stretch = { readonly start: number; readonly end: number };

/** The stretches of a line that lie in a region by the even-odd rule, in order. `along` has length 1. */
export function stretchesOnLine(region: Region, from: Point, along: Point): Stretch[] {
  const crossings: number[] = [];
  for (const ring of region) {
    let previous = ring.at(-1);
    for (const point of ring) {
      if (previous) {
        const [before, here] = [beside(previous, from, along), beside(point, from, along)];
        if (before > 0 !== here > 0) {
          const share = before / (before - here);
          const x = previous.x + share * (point.x - previous.x);
          const y = previous.y + share * (point.y - previous.y);
          crossings.push((x - from.x) * along.x + (y - from.y) * along.y);
        }
      }
      previous = point;
    }
  }
  const sorted = crossings.toSorted((a, b) => a - b);
  return sorted.flatMap((start, index) => {
    const end = sorted[index + 1];
    return index % 2 === 0 && end !== undefined ? [{ start, end }] : [];
  });
}

/** What is left of stretches when other stretches are taken out of them, in order. */
export function stretchesWithout(stretches: readonly Stretch[], taken: readonly Stretch[]): readonly Stretch[] {
  return taken.reduce<readonly Stretch[]>(
    (left, { start, end }) =>
      left.flatMap((stretch) =>
        [
          { start: stretch.start, end: Math.min(stretch.end, start) },
          { start: Math.max(stretch.start, end), end: stretch.end },
        ].filter((part) => part.end > part.start),
      ),
    stretches,
  );
}

const beside = ({ x, y }: Point, from: Point, along: Point): number => (x - from.x) * along.y - (y - from.y) * along.x;
