import type { MockupDocument } from "#shared/mockup/document.ts";
import { counted } from "@/lib/format.ts";
import { nameOfPiece } from "./piece-name.ts";
import { chooseHole, type Selection } from "./selection.ts";

/** What is chosen, in words: a hole, a layer, a piece by its name, or how many of which layers; null for nothing. */
export function chosenWords(document: MockupDocument, selection: Selection): string | null {
  if (selection.holeId !== null) {
    const key = chooseHole(document, selection.holeId).layerKey;
    return key === null ? null : `A hole of ${key}`;
  }
  const chosen = new Set(selection.pieceIds);
  const layers = document.layers
    .map((layer) => ({ layer, pieces: layer.pieces.filter(({ id }) => chosen.has(id)) }))
    .filter(({ pieces }) => pieces.length > 0);
  const [only] = layers;
  if (!only) return null;
  if (layers.length > 1)
    return `${counted(chosen.size, "piece")} of ${layers.map(({ layer }) => layer.key).join(", ")}`;
  const { layer, pieces } = only;
  const [piece] = pieces;
  if (pieces.length === layer.pieces.length) return `${layer.key}, ${layer.name}`;
  return pieces.length === 1 && piece
    ? `${nameOfPiece(piece, layer.pieces.indexOf(piece))} of ${layer.key}`
    : `${counted(pieces.length, "piece")} of ${layer.key}`;
}

/** Why the chosen hole stays where it is; null when it can be moved. */
export function whyHoleStays(document: MockupDocument, holeId: string): string | null {
  const { layerKey } = chooseHole(document, holeId);
  const layer = document.layers.find(({ key }) => key === layerKey);
  return layer?.locked ? `${layer.key} is locked. Unlock it first.` : null;
}

/** Why nothing can be set out, in words; null when there are pieces that can be moved. */
export function whyIdle({ layers }: MockupDocument, { pieceIds }: Selection): string | null {
  const chosen = new Set(pieceIds);
  const touched = layers.filter(({ pieces }) => pieces.some(({ id }) => chosen.has(id)));
  if (touched.length === 0) return "Choose a layer or pieces first.";
  if (touched.some(({ locked }) => !locked)) return null;
  const keys = touched.map(({ key }) => key).join(", ");
  return touched.length === 1 ? `${keys} is locked. Unlock it first.` : `${keys} are locked. Unlock them first.`;
}
