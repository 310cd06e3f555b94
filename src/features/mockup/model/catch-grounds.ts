import { boxUnion } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import { boxShifted, type Shift } from "./shifts.ts";
import { type Axis, otherAxis, type Span, spanMiddle, spanOf } from "./span.ts";

/** Whose line it is, in the order in which lines are preferred. */
export type LineOf = "board" | "margin" | "layer" | "piece" | "grid";

/** A line at x = `at` or y = `at` of the board, in mm, and what the thing whose line it is covers along it. */
export type CatchLine = { readonly at: number; readonly of: LineOf; readonly along: Span };

/** Lines of one axis, each list sorted by place. Edges catch edges, middles catch middles. */
export type CatchLines = { readonly edges: readonly CatchLine[]; readonly middles: readonly CatchLine[] };

/** All that a moved box can catch, worked out once when a hand takes hold. */
export type CatchGrounds = {
  readonly board: Box;
  readonly x: CatchLines;
  readonly y: CatchLines;
  /** Boxes of the shown pieces that rest. */
  readonly resting: readonly Box[];
  /** Spacing of the lines that catch all over the board; null for none. */
  readonly gridMm: number | null;
};

type Resting = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  /** What was moved since the figures were computed. */
  readonly shifts: ReadonlyMap<string, Shift>;
  readonly movedIds: readonly string[];
  /** How far from the board's edges a line catches; null for none. */
  readonly marginMm: number | null;
  readonly gridMm: number | null;
};

/** What pieces that move can catch: the board, its margin, every shown layer without the pieces that move, and every piece of them. */
export function catchGroundsOf({ document, figures, shifts, movedIds, marginMm, gridMm }: Resting): CatchGrounds {
  const moved = new Set(movedIds);
  const hidden = new Set(document.layers.filter((layer) => layer.hidden).map(({ key }) => key));
  const pieces = figures.pieces
    .filter(({ layerKey, pieceId }) => !moved.has(pieceId) && !hidden.has(layerKey))
    .map(({ layerKey, pieceId, box }) => ({ layerKey, box: boxShifted(box, shifts.get(pieceId)) }));
  const byLayer = new Map<string, Box[]>();
  for (const { layerKey, box } of pieces) {
    const boxes = byLayer.get(layerKey);
    if (boxes) boxes.push(box);
    else byLayer.set(layerKey, [box]);
  }
  const layers = [...byLayer.values()].filter((boxes) => boxes.length > 1).flatMap((boxes) => boxUnion(boxes) ?? []);
  const resting = pieces.map(({ box }) => box);
  const board = { x: 0, y: 0, width: document.board.width, height: document.board.height };
  const linesOf = (axis: Axis): CatchLines => ({
    edges: [
      ...edgesOf(board, "board", axis),
      ...(marginMm === null ? [] : marginsOf(board, marginMm, axis)),
      ...layers.flatMap((box) => edgesOf(box, "layer", axis)),
      ...resting.flatMap((box) => edgesOf(box, "piece", axis)),
    ].sort(byPlace),
    middles: [
      middleOf(board, "board", axis),
      ...layers.map((box) => middleOf(box, "layer", axis)),
      ...resting.map((box) => middleOf(box, "piece", axis)),
    ].sort(byPlace),
  });
  return { board, x: linesOf("x"), y: linesOf("y"), resting, gridMm };
}

const byPlace = (a: CatchLine, b: CatchLine) => a.at - b.at;

function edgesOf(box: Box, of: LineOf, axis: Axis): CatchLine[] {
  const { from, to } = spanOf(box, axis);
  const along = spanOf(box, otherAxis(axis));
  return [
    { at: from, of, along },
    { at: to, of, along },
  ];
}

function middleOf(box: Box, of: LineOf, axis: Axis): CatchLine {
  return { at: spanMiddle(spanOf(box, axis)), of, along: spanOf(box, otherAxis(axis)) };
}

/** None where a margin would leave nothing of the board. */
function marginsOf(board: Box, marginMm: number, axis: Axis): CatchLine[] {
  const { from, to } = spanOf(board, axis);
  const along = spanOf(board, otherAxis(axis));
  if (marginMm <= 0 || 2 * marginMm >= to - from) return [];
  return [
    { at: from + marginMm, of: "margin", along },
    { at: to - marginMm, of: "margin", along },
  ];
}
