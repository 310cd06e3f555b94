import type { Box } from "#shared/geometry/path.ts";
import { type Axis, otherAxis, spanOf, spansOverlap } from "./span.ts";

/** What lies beside a box along one axis: the nearest box before it and the one before that, the same behind it. */
export type RowNeighbours = {
  readonly before: Box | null;
  readonly secondBefore: Box | null;
  readonly after: Box | null;
  readonly secondAfter: Box | null;
};

/** Lengths in mm nearer than this are one: a twentieth, which no figure on the desk shows. */
export const sameMm = 0.05;

/** The neighbours of a box among boxes that share some of its height (along x) or width (along y) and do not overlap it by more than `reachMm`. */
export function rowNeighbours(box: Box, boxes: readonly Box[], axis: Axis, reachMm = sameMm): RowNeighbours {
  const before = nearest(box, boxes, axis, "before", reachMm);
  const after = nearest(box, boxes, axis, "after", reachMm);
  return {
    before,
    secondBefore: before && nearest(before, boxes, axis, "before", sameMm),
    after,
    secondAfter: after && nearest(after, boxes, axis, "after", sameMm),
  };
}

function nearest(box: Box, boxes: readonly Box[], axis: Axis, side: "before" | "after", reachMm: number): Box | null {
  const across = otherAxis(axis);
  const [own, ownAcross] = [spanOf(box, axis), spanOf(box, across)];
  let found: { readonly box: Box; readonly gap: number } | null = null;
  for (const other of boxes) {
    if (other === box || !spansOverlap(spanOf(other, across), ownAcross)) continue;
    const { from, to } = spanOf(other, axis);
    const gap = side === "before" ? own.from - to : from - own.to;
    if (gap >= -reachMm && (found === null || gap < found.gap)) found = { box: other, gap };
  }
  return found?.box ?? null;
}
