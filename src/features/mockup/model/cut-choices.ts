import type { Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import type { Named } from "#shared/shaping/join-outlines.ts";
import type { Outline } from "#shared/shaping/shaped.ts";
import { counted } from "@/lib/format.ts";
import { whyIdle } from "./chosen-words.ts";
import { mostLayers } from "./limits.ts";
import { nameOfPiece } from "./piece-name.ts";
import type { Selection } from "./selection.ts";

/** What is chosen of one layer that can be changed. */
export type ChosenOfLayer = { readonly layer: Layer; readonly pieces: readonly Piece[] };

/** The chosen pieces by layer, those of locked layers left out. */
export function chosenByLayer({ layers }: MockupDocument, { pieceIds }: Selection): ChosenOfLayer[] {
  const chosen = new Set(pieceIds);
  return layers
    .filter(({ locked }) => !locked)
    .map((layer) => ({ layer, pieces: layer.pieces.filter(({ id }) => chosen.has(id)) }))
    .filter(({ pieces }) => pieces.length > 0);
}

/** Every chosen piece, locked or not, from the wall outward. */
export function chosenPieces({ layers }: MockupDocument, { pieceIds }: Selection): Piece[] {
  const chosen = new Set(pieceIds);
  return layers.flatMap(({ pieces }) => pieces.filter(({ id }) => chosen.has(id)));
}

/** Why the tool can't be used now, in words; null when it can. */
export type CutReasons = {
  readonly margin: string | null;
  readonly join: string | null;
  readonly cutAway: string | null;
  readonly looseBits: string | null;
  readonly split: string | null;
};

export function cutReasons(document: MockupDocument, selection: Selection): CutReasons {
  const idle = whyIdle(document, selection);
  const chosen = chosenByLayer(document, selection);
  const pieces = document.layers.reduce((sum, layer) => sum + layer.pieces.length, 0);
  return {
    margin: whyNoMargin(document, selection),
    join: idle ?? whyNotJoined(chosen),
    cutAway: idle ?? (pieces < 2 ? "There is nothing else on the board to cut it with." : null),
    looseBits: idle,
    split: idle,
  };
}

/** A margin plate changes nothing of what it follows, so that may be locked. */
function whyNoMargin(document: MockupDocument, selection: Selection): string | null {
  if (chosenPieces(document, selection).length === 0) return "Choose a layer or pieces first.";
  return document.layers.length >= mostLayers ? `There are ${mostLayers} layers, as many as a sign takes.` : null;
}

function whyNotJoined(chosen: readonly ChosenOfLayer[]): string | null {
  if (chosen.length > 1) return "Choose pieces of one layer: only what is cut from the same sheet can be joined.";
  return (chosen[0]?.pieces.length ?? 0) < 2 ? "Choose two or more pieces of a layer." : null;
}

/** What to cut out of, or with: its name in a list and the pieces it is. */
export type CutGroup = { readonly id: string; readonly title: string; readonly pieceIds: readonly string[] };

/** A list of single pieces longer than this is of no help. */
const mostListed = 40;

/**
 * What can be cut out of: the first chosen piece and each other one where there are several, and all that is chosen of each layer. Best first:
 * with several chosen pieces the first is cut by the others.
 */
export function cutTargets(document: MockupDocument, selection: Selection): CutGroup[] {
  const byLayer = chosenByLayer(document, selection);
  const all = byLayer.map(({ layer, pieces }) => ({
    id: `layer ${layer.key}`,
    title:
      pieces.length === layer.pieces.length
        ? `all of ${layer.key}, ${layer.name}`
        : `${counted(pieces.length, "chosen piece")} of ${layer.key}`,
    pieceIds: pieces.map(({ id }) => id),
  }));
  const single = byLayer
    .flatMap(({ layer, pieces }) =>
      pieces.map((piece) => ({
        id: piece.id,
        title: `${nameOfPiece(piece, layer.pieces.indexOf(piece))} of ${layer.key}`,
        pieceIds: [piece.id],
      })),
    )
    .toSorted((a, b) => selection.pieceIds.indexOf(a.id) - selection.pieceIds.indexOf(b.id));
  if (single.length < 2 || single.length > mostListed) return all;
  const isLayer = byLayer.length === 1 && byLayer[0]?.pieces.length === byLayer[0]?.layer.pieces.length;
  return isLayer ? [...all, ...single] : [...single, ...all];
}

/** What can be cut with: the other chosen pieces, and each other layer, told by whether it lies over or under the cut one. */
export function cutTools(document: MockupDocument, selection: Selection, target: CutGroup): CutGroup[] {
  const cut = new Set(target.pieceIds);
  const others = chosenPieces(document, selection).filter(({ id }) => !cut.has(id));
  const at = document.layers.findIndex(({ pieces }) => pieces.some(({ id }) => cut.has(id)));
  const layers = document.layers
    .map((layer, index) => ({ layer, from: index - at }))
    .filter(({ layer, from }) => from !== 0 && layer.pieces.length > 0)
    // The nearest first, and of two as near the one over it, which is what mostly lies on or in a piece.
    .toSorted((a, b) => Math.abs(a.from) - Math.abs(b.from) || b.from - a.from);
  return [
    ...(others.length > 0
      ? [{ id: "others", title: "the other chosen pieces", pieceIds: others.map(({ id }) => id) }]
      : []),
    ...layers.map(({ layer, from }) => ({
      id: `layer ${layer.key}`,
      title: `all of ${layer.key}, ${layer.name}, ${from > 0 ? "over it" : "under it"}`,
      pieceIds: layer.pieces.map(({ id }) => id),
    })),
  ];
}

/** Pieces by their ids, in document order. */
export function piecesById({ layers }: MockupDocument, ids: readonly string[]): Piece[] {
  const wanted = new Set(ids);
  return layers.flatMap(({ pieces }) => pieces.filter(({ id }) => wanted.has(id)));
}

/** A piece's outline by its id, as it is shaped beside the page. */
export const namedOutline = ({ id, path, placement }: Piece): Named<Outline> => ({ id, path, placement });
