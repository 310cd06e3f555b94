import { boxCentre, boxContains } from "#shared/geometry/box.ts";
import type { Hole, Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { freeLayerName } from "#shared/mockup/free-layer-name.ts";
import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import type { Copied } from "../copied.ts";
import { mostHoles, mostLayers, mostLettering, mostPieces } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { copiedWords, sourceOfCopy, withFitDiameters } from "./add-copies.ts";
import { changeLayer } from "./change-layer.ts";
import { type Motion, movedHole, placementAfter, shiftMotion } from "./piece-motion.ts";
import { boxOfPieces, withFixed } from "./pieces.ts";

export type Paste = {
  readonly copied: Copied;
  /** Key of the layer that takes the pieces; null for layers of their own, with the stock and the hold that they had. */
  readonly into: string | null;
  /** Ids of pieces, holes and lettering are made from it. */
  readonly id: string;
  readonly site: Site;
};

/** The ids of all pieces that a paste with this id brings. */
export function idsOfPaste({ copied, id }: Pick<Paste, "copied" | "id">): string[] {
  return piecesOf(copied).map((_, index) => `${id}-${index + 1}`);
}

/**
 * Adds what was copied, with new ids and keys and words of its own: where it was when that is on the board, else in the
 * board's middle. Holes come along into layers of their own and into a layer on standoffs. Nothing happens when it is more
 * than a document takes, or the layer is locked or not there.
 */
export function paste(document: MockupDocument, { copied, into, id, site }: Paste): MockupDocument {
  const motion = motionOnto(document, copied);
  const all = piecesOf(copied);
  const words = copiedWords(copied.document, new Set(all.map((piece) => piece.id)), `${id}-l`);
  const lettering = [...document.lettering, ...words.values()];
  const ids = new Map(all.map((piece, index) => [piece.id, `${id}-${index + 1}`]));
  const pasted = (piece: Piece): Piece[] => {
    const placement = placementAfter(piece.placement, motion);
    const pieceId = ids.get(piece.id);
    return placement && pieceId !== undefined
      ? [{ ...piece, id: pieceId, placement, source: sourceOfCopy(piece, words) }]
      : [];
  };
  const holesOf = (layer: Layer, index: number): Hole[] =>
    layer.hold.kind === "standoff"
      ? layer.hold.holes.map((hole, place) => ({ ...movedHole(hole, motion), id: `${id}-h${index + 1}-${place + 1}` }))
      : [];
  if (lettering.length > mostLettering) return document;

  if (into !== null) {
    const next = changeLayer(document, into, (layer) => {
      const pieces = [...layer.pieces, ...copied.document.layers.flatMap((one) => one.pieces).flatMap(pasted)];
      if (pieces.length > mostPieces) return layer;
      if (layer.hold.kind !== "standoff") return { ...layer, pieces };
      const added = copied.document.layers.flatMap(holesOf).map((hole) => ({ ...hole, fixed: false }));
      const holes = withFixed([...layer.hold.holes, ...added]);
      if (holes.length > mostHoles) return layer;
      return withFitDiameters({ ...layer, pieces, hold: { ...layer.hold, holes } }, layer, document, site);
    });
    return next === document ? document : { ...next, lettering };
  }

  const keys = nextFreeKeys(document, copied.document.layers.length);
  if (document.layers.length + copied.document.layers.length > mostLayers) return document;
  const layers = [...document.layers];
  for (const [index, layer] of copied.document.layers.entries()) {
    const isTaken = layers.some(({ name }) => name === layer.name);
    layers.push({
      ...layer,
      key: keys[index] ?? layer.key,
      name: isTaken ? freeLayerName({ ...document, layers }, layer.name) : layer.name,
      pieces: layer.pieces.flatMap(pasted),
      hold: layer.hold.kind === "standoff" ? { ...layer.hold, holes: holesOf(layer, index) } : layer.hold,
      hidden: false,
      locked: false,
    });
  }
  return { ...document, layers, lettering };
}

const piecesOf = ({ document }: Copied): Piece[] => document.layers.flatMap(({ pieces }) => pieces);

function motionOnto({ board }: MockupDocument, copied: Copied): Motion {
  const box = boxOfPieces(
    copied.document,
    piecesOf(copied).map(({ id }) => id),
  );
  const { width, height } = board;
  if (!box || boxContains({ x: 0, y: 0, width, height }, box)) return shiftMotion(0, 0);
  const { x, y } = boxCentre(box);
  return shiftMotion(width / 2 - x, height / 2 - y);
}
