import type { Box, Placement } from "#shared/geometry/path.ts";
import { movedLetter } from "#shared/lettering/common-movement.ts";
import type { LaidLetter } from "#shared/lettering/lay-words.ts";
import { numberOfLetter } from "#shared/lettering/letters-of-words.ts";
import type { Lettering, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { exactCoordinateOf, exactScaleOf, mostLayers, mostLettering, mostPieces, turnOf } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { changeLayer } from "./change-layer.ts";
import { type NewLayer, newLayer } from "./new-layer.ts";
import { boxOfPieces } from "./pieces.ts";

/** The layer that letters go into: a new one nearest the viewer, or one that is there. */
export type LetteringLayer =
  | { readonly kind: "new"; readonly layer: NewLayer; readonly site: Site }
  | { readonly kind: "existing"; readonly key: string };

/** Words with their letters as the face lays them. */
export type SetWords = {
  readonly lettering: Lettering;
  readonly letters: readonly LaidLetter[];
  /** Round all letters about the lettering's origin. */
  readonly box: Box;
};

/**
 * Adds words letter by letter, their box in the middle of the board, or under the words that are there where there is room. Ids of pieces are made from `id`. The same document when
 * there are no letters, when the layer is locked or is not there, and when it has as many as it takes.
 */
export function addLettering(
  document: MockupDocument,
  { set, id, into }: { set: SetWords; id: string; into: LetteringLayer },
): MockupDocument {
  const { lettering, letters, box } = set;
  if (document.lettering.length >= mostLettering || document.lettering.some((one) => one.id === lettering.id))
    return document;
  const movement: Placement = {
    x: document.board.width / 2 - box.x - box.width / 2,
    y: topOfNext(document, set) - box.y,
    turn: 0,
    scale: 1,
    mirrored: false,
  };
  const pieces = letters.map((letter) =>
    pieceOfLetter(letter, { id, lettering, placement: movedLetter({ laid: letter.laid, movement }) }),
  );
  if (pieces.length === 0 || !pieces.every((piece) => piece !== null)) return document;
  const added = withPieces(document, { pieces, id, into });
  return added === document ? document : { ...added, lettering: [...document.lettering, lettering] };
}

/** Of lines one under the other, as a share of the capitals' height: what is left between them (our choice). */
const gapShare = 0.75;

/** Where the upper edge of new words comes to, mm: under the lowest of those that are there, else in the middle. */
function topOfNext(document: MockupDocument, { lettering, box }: SetWords): number {
  const middle = document.board.height / 2 - box.height / 2;
  const words = document.layers.flatMap(({ pieces }) =>
    pieces.filter(({ source }) => source.kind === "lettering").map((piece) => piece.id),
  );
  const there = boxOfPieces(document, words);
  if (!there) return middle;
  const under = there.y + there.height + gapShare * lettering.capHeight;
  return under + box.height <= document.board.height ? under : middle;
}

function withPieces(
  document: MockupDocument,
  { pieces, id, into }: { pieces: Piece[]; id: string; into: LetteringLayer },
): MockupDocument {
  if (into.kind === "existing")
    return changeLayer(document, into.key, (layer) =>
      layer.pieces.length + pieces.length > mostPieces ? layer : { ...layer, pieces: [...layer.pieces, ...pieces] },
    );
  const [key] = nextFreeKeys(document, 1);
  if (key === undefined || document.layers.length >= mostLayers || pieces.length > mostPieces) return document;
  const { site, layer } = into;
  return { ...document, layers: [...document.layers, newLayer(layer, { key, pieces, id: `${id}-h`, document, site })] };
}

/** A letter of a lettering as a piece; null where it would lie beyond what a document holds. */
export function pieceOfLetter(
  { letter, reads, path, laid }: LaidLetter,
  { id, lettering, placement }: { id: string; lettering: Lettering; placement: Placement },
): Piece | null {
  const held = heldPlacement(placement);
  if (!held) return null;
  return {
    id: `${id}-${letter + 1}`,
    name: nameOfLetterPiece(lettering.words, { letter, reads }),
    source: { kind: "lettering", letteringId: lettering.id, letter, laid },
    path: path.map(({ start, segments }) => ({ start, segments: [...segments] })),
    placement: held,
    reads,
  };
}

/** What a letter is called in lists until somebody gives it a name. */
export const nameOfLetterPiece = (words: string, { letter, reads }: Pick<LaidLetter, "letter" | "reads">): string =>
  `Letter ${numberOfLetter(words, letter)}: ${reads}`;

/** A placement as documents keep it; null for one that they can't hold. */
export function heldPlacement({ mirrored, ...to }: Placement): Placement | null {
  const x = exactCoordinateOf(to.x);
  const y = exactCoordinateOf(to.y);
  const turn = turnOf(to.turn);
  const scale = exactScaleOf(to.scale);
  return x === null || y === null || turn === null || scale === null ? null : { x, y, turn, scale, mirrored };
}
