import type { Box } from "#shared/geometry/path.ts";

export type Axis = "x" | "y";

/** What a box covers along one axis, mm. */
export type Span = { readonly from: number; readonly to: number };

export const otherAxis = (axis: Axis): Axis => (axis === "x" ? "y" : "x");

export function spanOf(box: Box, axis: Axis): Span {
  return axis === "x" ? { from: box.x, to: box.x + box.width } : { from: box.y, to: box.y + box.height };
}

export const spanMiddle = ({ from, to }: Span): number => (from + to) / 2;

/** How far two spans are apart; 0 when they touch or overlap. */
export const spansApart = (a: Span, b: Span): number => Math.max(0, a.from - b.to, b.from - a.to);

/** Whether two spans share more than a point. */
export const spansOverlap = (a: Span, b: Span): boolean => a.from < b.to && b.from < a.to;
