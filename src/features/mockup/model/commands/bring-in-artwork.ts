import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { boxCentre, boxUnion } from "#shared/geometry/box.ts";
import { pathTransform, translateMatrix } from "#shared/geometry/transform.ts";
import type { Board, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { coordinateOf, mostLayers, mostPieces, roundMm } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { withoutOpenings } from "../without-openings.ts";
import { type NewLayer, newLayer } from "./new-layer.ts";

export type ColourChoice = NewLayer & {
  readonly colour: string;
  /** Which pieces, by their index in the artwork: all of the colour unless said otherwise. */
  readonly indices?: readonly number[];
  /** Cut the outer outlines only, so that other colours can be bonded on the plate instead of lying in its openings. */
  readonly solid: boolean;
};

/** Pieces that join a layer which is there. */
export type AddedPieces = { readonly key: string; readonly indices: readonly number[] };

export type ArtworkToBringIn = {
  readonly artworkId: string;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly pieces: readonly ArtworkPiece[];
};

/**
 * Adds a layer for each choice of pieces of an artwork, from the wall outward in the order given, with the next free keys,
 * and the pieces of `added` to layers that are there, on top of theirs. The artwork's pieces keep their places to one another, its
 * middle comes to the board's (see `moveToBoard`). Ids are made from `id`.
 * Colours that no piece has are passed over; more layers or pieces than a document takes are not added.
 */
export function bringInArtwork(
  document: MockupDocument,
  {
    artwork,
    choices,
    added = [],
    id,
    site,
  }: {
    artwork: ArtworkToBringIn;
    choices: readonly ColourChoice[];
    added?: readonly AddedPieces[];
    id: string;
    site: Site;
  },
): MockupDocument {
  const { dx, dy } = moveToBoard(artwork, document.board);
  const keys = nextFreeKeys(document, choices.length);
  const pieceHere = (piece: ArtworkPiece) => pieceOf(piece, { artworkId: artwork.artworkId, id, dx, dy });
  const layers = document.layers.map((layer) => {
    const more = added
      .filter(({ key }) => key === layer.key && !layer.locked)
      .flatMap(({ indices }) => chosenOf(artwork.pieces, indices))
      .map(pieceHere)
      .filter((piece) => piece !== null)
      .slice(0, Math.max(0, mostPieces - layer.pieces.length));
    return more.length === 0 ? layer : { ...layer, pieces: [...layer.pieces, ...more] };
  });
  for (const [order, choice] of choices.entries()) {
    const chosen = choice.indices
      ? chosenOf(artwork.pieces, choice.indices)
      : artwork.pieces.filter((piece) => piece.colour === choice.colour);
    const pieces = (choice.solid ? withoutOpenings(chosen) : chosen)
      .slice(0, mostPieces)
      .map(pieceHere)
      .filter((piece) => piece !== null);
    const key = keys[layers.length - document.layers.length];
    if (pieces.length === 0 || key === undefined || layers.length >= mostLayers) continue;
    layers.push(newLayer(choice, { key, pieces, id: `${id}-h${order + 1}`, document, site }));
  }
  const isSame = layers.length === document.layers.length && layers.every((one, at) => one === document.layers[at]);
  return isSame ? document : { ...document, layers };
}

/**
 * How far an artwork moves onto the board, mm: its page's middle comes to the board's, so that what was drawn as the whole sign lies as it
 * was drawn. Where pieces would fall off the board that way, as a mark in the corner of a page does, their own middle comes there.
 */
function moveToBoard(
  { widthMm, heightMm, pieces }: ArtworkToBringIn,
  { width, height }: Board,
): { dx: number; dy: number } {
  const byPage = { dx: width / 2 - widthMm / 2, dy: height / 2 - heightMm / 2 };
  const box = boxUnion(pieces.map((piece) => piece.box));
  if (box === null) return byPage;
  const fits = (from: number, size: number, room: number) => from >= 0 && from + size <= room;
  if (fits(box.x + byPage.dx, box.width, width) && fits(box.y + byPage.dy, box.height, height)) return byPage;
  const middle = boxCentre(box);
  return { dx: roundMm(width / 2 - middle.x), dy: roundMm(height / 2 - middle.y) };
}

function chosenOf(pieces: readonly ArtworkPiece[], indices: readonly number[]): ArtworkPiece[] {
  const chosen = new Set(indices);
  return pieces.filter(({ index }) => chosen.has(index));
}

function pieceOf(
  piece: ArtworkPiece,
  { artworkId, id, dx, dy }: { artworkId: string; id: string; dx: number; dy: number },
): Piece | null {
  const middle = boxCentre(piece.box);
  const origin = { x: roundMm(middle.x), y: roundMm(middle.y) };
  const x = coordinateOf(origin.x + dx);
  const y = coordinateOf(origin.y + dy);
  if (x === null || y === null) return null;
  return {
    id: `${id}-${piece.index + 1}`,
    name: "",
    source: { kind: "artwork", artworkId, index: piece.index, colour: piece.colour },
    path: pathTransform(piece.path, translateMatrix(-origin.x, -origin.y)).map(({ start, segments }) => ({
      start,
      segments: [...segments],
    })),
    placement: { x, y, turn: 0, scale: 1, mirrored: false },
    reads: "",
  };
}
