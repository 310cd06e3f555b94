import type { Box } from "#shared/geometry/path.ts";
import type { CatchGrounds } from "./catch-grounds.ts";
import { rowNeighbours, sameMm } from "./row-neighbours.ts";
import { type Axis, otherAxis, type Span, spanOf } from "./span.ts";

/** A distance along one axis, from a lesser place to a greater one, mm. */
export type Measure = Span & {
  readonly axis: Axis;
  readonly of: "board" | "piece";
  /** Where it is measured on the other axis: the box's edge, or the middle of what two neighbours share. */
  readonly level: number;
  /** Whether there is another one of the same length beside it. */
  readonly isEqual: boolean;
};

/** The distances that a hand wants to read: from a box to the board's edges and to its neighbours, equal ones told. Such as are nothing are left out. */
export function moveMeasures(box: Box, { board, resting }: Pick<CatchGrounds, "board" | "resting">): Measure[] {
  return (["x", "y"] as const).flatMap((axis) => [...toBoard(box, board, axis), ...toNeighbours(box, resting, axis)]);
}

function toBoard(box: Box, board: Box, axis: Axis): Measure[] {
  const [own, whole] = [spanOf(box, axis), spanOf(board, axis)];
  const isEqual = Math.abs(own.from - whole.from - (whole.to - own.to)) < sameMm;
  const level = spanOf(box, otherAxis(axis)).from;
  return [measured(whole.from, own.from), measured(own.to, whole.to)].flatMap((span) =>
    span === null ? [] : { axis, ...span, of: "board" as const, level, isEqual },
  );
}

function toNeighbours(box: Box, resting: readonly Box[], axis: Axis): Measure[] {
  const { before, secondBefore, after, secondAfter } = rowNeighbours(box, resting, axis);
  const row = [secondBefore, before, box, after, secondAfter];
  const gaps = row.slice(1).map((next, index) => gapBetween(row[index] ?? null, next, axis));
  const [outerBefore, toBefore, toAfter, outerAfter] = gaps;
  const isSame = (a: Gap | null | undefined, b: Gap | null | undefined) =>
    a != null && b != null && Math.abs(a.to - a.from - (b.to - b.from)) < sameMm;
  const isEven = isSame(toBefore, toAfter);
  const followsBefore = isSame(outerBefore, toBefore);
  const followsAfter = isSame(outerAfter, toAfter);
  const shown: readonly (readonly [Gap | null | undefined, boolean])[] = [
    [followsBefore ? outerBefore : null, true],
    [toBefore, isEven || followsBefore],
    [toAfter, isEven || followsAfter],
    [followsAfter ? outerAfter : null, true],
  ];
  return shown.flatMap(([gap, isEqual]) => (gap ? { axis, ...gap, of: "piece" as const, isEqual } : []));
}

type Gap = Span & { readonly level: number };

function gapBetween(one: Box | null, next: Box | null | undefined, axis: Axis): Gap | null {
  if (!one || !next) return null;
  const span = measured(spanOf(one, axis).to, spanOf(next, axis).from);
  const across = otherAxis(axis);
  const [a, b] = [spanOf(one, across), spanOf(next, across)];
  return span && { ...span, level: (Math.max(a.from, b.from) + Math.min(a.to, b.to)) / 2 };
}

function measured(one: number, other: number): Span | null {
  const [from, to] = [Math.min(one, other), Math.max(one, other)];
  return to - from < sameMm ? null : { from, to };
}
