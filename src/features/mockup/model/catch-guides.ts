import type { Box } from "#shared/geometry/path.ts";

/** A line that a moved box caught: at x = `at` or y = `at` of the board, in mm. */
export type Guide = { readonly axis: "x" | "y"; readonly at: number };

export type Caught = { readonly dx: number; readonly dy: number; readonly guides: readonly Guide[] };

/**
 * A move of `box` by dx, dy, caught by the nearest line within `reachMm` on each axis: middles and edges of the boxes it
 * is lined up with. On each axis the middle is tried with middles, edges with edges.
 */
export function catchGuides(
  { box, dx, dy, reachMm }: { box: Box; dx: number; dy: number; reachMm: number },
  others: readonly Box[],
): Caught {
  const across = nearestOf(
    others.flatMap((other) => gaps(box.x + dx, box.width, other.x, other.width)),
    reachMm,
  );
  const down = nearestOf(
    others.flatMap((other) => gaps(box.y + dy, box.height, other.y, other.height)),
    reachMm,
  );
  return {
    dx: dx + (across?.by ?? 0),
    dy: dy + (down?.by ?? 0),
    guides: [
      ...(across ? [{ axis: "x" as const, at: across.at }] : []),
      ...(down ? [{ axis: "y" as const, at: down.at }] : []),
    ],
  };
}

type Gap = { readonly by: number; readonly at: number };

function gaps(start: number, length: number, otherStart: number, otherLength: number): Gap[] {
  const ends = (from: number, size: number) => [from, from + size];
  const middle = otherStart + otherLength / 2;
  return [
    { by: middle - (start + length / 2), at: middle },
    ...ends(otherStart, otherLength).flatMap((at) => ends(start, length).map((end) => ({ by: at - end, at }))),
  ];
}

function nearestOf(candidates: readonly Gap[], reachMm: number): Gap | null {
  let nearest: Gap | null = null;
  for (const gap of candidates)
    if (Math.abs(gap.by) <= reachMm && (!nearest || Math.abs(gap.by) < Math.abs(nearest.by))) nearest = gap;
  return nearest;
}
