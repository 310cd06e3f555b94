import { lettersOnBoard } from "#shared/lettering/letters-on-board.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";

/** What is chosen: a layer's row, the pieces a move would take along, and a hole when one is picked out. */
export type Selection = {
  readonly layerKey: string | null;
  readonly pieceIds: readonly string[];
  readonly holeId: string | null;
};

export const nothingChosen: Selection = { layerKey: null, pieceIds: [], holeId: null };

/** A layer with all its pieces. */
export function chooseLayer(document: MockupDocument, key: string): Selection {
  const layer = document.layers.find((candidate) => candidate.key === key);
  return layer ? { layerKey: key, pieceIds: layer.pieces.map(({ id }) => id), holeId: null } : nothingChosen;
}

/** All letters of a lettering, wherever they lie; the layer of the first of them. */
export function chooseLettering(document: MockupDocument, letteringId: string): Selection {
  const letters = lettersOnBoard(document, letteringId);
  const [first] = letters;
  if (!first) return nothingChosen;
  return { layerKey: first.layer.key, pieceIds: letters.map(({ piece }) => piece.id), holeId: null };
}

/** One piece out of its layer. */
export function choosePiece(document: MockupDocument, pieceId: string): Selection {
  const layer = layerOfPiece(document, pieceId);
  return layer ? { layerKey: layer.key, pieceIds: [pieceId], holeId: null } : nothingChosen;
}

/** One hole, with its layer. */
export function chooseHole(document: MockupDocument, holeId: string): Selection {
  const layer = document.layers.find(
    ({ hold }) => hold.kind === "standoff" && hold.holes.some(({ id }) => id === holeId),
  );
  return layer ? { layerKey: layer.key, pieceIds: [], holeId } : nothingChosen;
}

/** Adds a layer's pieces to what is chosen, or takes them out when they were in. */
export function chooseAlso(document: MockupDocument, selection: Selection, key: string): Selection {
  const more = chooseLayer(document, key).pieceIds;
  const had = more.some((id) => selection.pieceIds.includes(id));
  const pieceIds = had ? selection.pieceIds.filter((id) => !more.includes(id)) : [...selection.pieceIds, ...more];
  if (pieceIds.length === 0) return nothingChosen;
  const left = selection.layerKey === key ? layerOfPiece(document, pieceIds.at(-1) ?? "")?.key : selection.layerKey;
  return { layerKey: had ? (left ?? null) : key, pieceIds, holeId: null };
}

/** Adds a piece to the chosen ones of its layer, or takes it out; when another layer or the whole of its own is chosen, it alone is. */
export function choosePieceAlso(document: MockupDocument, selection: Selection, pieceId: string): Selection {
  const layer = layerOfPiece(document, pieceId);
  if (!layer) return selection;
  // In the order chosen: the first is what others are lined up with.
  const had = selection.pieceIds.filter((id) => layer.pieces.some((piece) => piece.id === id));
  if (selection.layerKey !== layer.key || had.length === layer.pieces.length) return choosePiece(document, pieceId);
  const pieceIds = had.includes(pieceId) ? had.filter((id) => id !== pieceId) : [...had, pieceId];
  return { layerKey: layer.key, pieceIds, holeId: null };
}

/** Every piece that is shown and not locked. */
export function chooseAllPieces({ layers }: MockupDocument): Selection {
  const open = layers.filter(({ hidden, locked, pieces }) => !hidden && !locked && pieces.length > 0);
  const pieceIds = open.flatMap(({ pieces }) => pieces.map(({ id }) => id));
  return { layerKey: open[0]?.key ?? null, pieceIds, holeId: null };
}

/** What of the choice is still there after the document changed; the same selection when all of it is. */
export function keepChosen(document: MockupDocument, selection: Selection): Selection {
  const ids = new Set(document.layers.flatMap((layer) => layer.pieces.map(({ id }) => id)));
  const pieceIds = selection.pieceIds.filter((id) => ids.has(id));
  const layerKey = document.layers.some(({ key }) => key === selection.layerKey) ? selection.layerKey : null;
  const holeId =
    selection.holeId !== null && chooseHole(document, selection.holeId).holeId !== null ? selection.holeId : null;
  const unchanged =
    pieceIds.length === selection.pieceIds.length && layerKey === selection.layerKey && holeId === selection.holeId;
  return unchanged ? selection : { layerKey, pieceIds, holeId };
}

export function layerOfPiece(document: MockupDocument, pieceId: string) {
  return document.layers.find((layer) => layer.pieces.some(({ id }) => id === pieceId));
}
