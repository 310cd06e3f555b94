import { boxContains } from "#shared/geometry/box.ts";
import type { Box, Point } from "#shared/geometry/path.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import { nothingChosen, type Selection } from "./selection.ts";
import { boxShifted, type Shift } from "./shifts.ts";

/** The box between two corners, whichever way it was drawn. */
export function boxBetween(a: Point, b: Point): Box {
  return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(a.x - b.x), height: Math.abs(a.y - b.y) };
}

type Shown = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  /** What was moved since the figures were computed. */
  readonly shifts: ReadonlyMap<string, Shift>;
};

/** The pieces that lie wholly in a box, edges included, of layers that are neither hidden nor locked, each with its box. */
export function piecesWithin({ document, figures, shifts }: Shown, box: Box): { pieceId: string; box: Box }[] {
  const kept = new Set(document.layers.filter(({ hidden, locked }) => hidden || locked).map(({ key }) => key));
  return figures.pieces
    .filter(({ layerKey }) => !kept.has(layerKey))
    .map(({ pieceId, box: own }) => ({ pieceId, box: boxShifted(own, shifts.get(pieceId)) }))
    .filter((piece) => boxContains(box, piece.box));
}

/** The choice after a box was drawn round pieces: these alone, or with `more` these and what was chosen before. The row is that of the lowest of their layers. */
export function chooseWithin(
  document: MockupDocument,
  selection: Selection,
  { pieceIds, more }: { readonly pieceIds: readonly string[]; readonly more: boolean },
): Selection {
  if (pieceIds.length === 0) return more ? selection : nothingChosen;
  const had = more ? selection.pieceIds : [];
  const ids = [...had, ...pieceIds.filter((id) => !had.includes(id))];
  const wanted = new Set(ids);
  const row = document.layers.find(({ pieces }) => pieces.some(({ id }) => wanted.has(id)));
  return { layerKey: row?.key ?? null, pieceIds: ids, holeId: null };
}
