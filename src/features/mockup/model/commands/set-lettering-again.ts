import type { Placement } from "#shared/geometry/path.ts";
import { placePoint, unplacePoint } from "#shared/geometry/placement.ts";
import { movedLetter, ownShift } from "#shared/lettering/common-movement.ts";
import type { LaidLetter } from "#shared/lettering/lay-words.ts";
import { copiesOnBoard, type LetterPiece, movementOfLetters } from "#shared/lettering/letters-on-board.ts";
import { matchLetters } from "#shared/lettering/match-letters.ts";
import type { Layer, Lettering, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { mostPieces } from "../limits.ts";
import { isSame } from "../same.ts";
import { heldPlacement, nameOfLetterPiece, pieceOfLetter } from "./add-lettering.ts";
import { holesWithin, layerAfter, type Motion } from "./piece-motion.ts";
import { withFixed } from "./pieces.ts";

export type SetAgain = {
  /** As it is to be from now on, in mm as they are on the board. Its id says which one is set again. */
  readonly lettering: Lettering;
  readonly letters: readonly LaidLetter[];
  /** Ids of letters that are new are made from it. */
  readonly id: string;
  /** Brings back letters that were taken out by hand; without it they stay out as long as the words have them. */
  readonly putBack?: boolean;
};

/**
 * Sets lettering anew where it lies: with the place, the turn and the mirroring that all its letters have been given together,
 * and each letter that is still the same with what was done to it alone. Size that was given by hand is now in the measures.
 * Holes go along with their letters and are taken out with them. Doubled lettering is set again in each of its places. The same
 * document when one of its layers is locked, when there would be no letter, and when something would not fit into a document.
 */
export function setLetteringAgain(
  document: MockupDocument,
  { lettering, letters, id, putBack = false }: SetAgain,
): MockupDocument {
  const before = document.lettering.find((one) => one.id === lettering.id);
  const copies = copiesOnBoard(document, lettering.id);
  if (!before || letters.length === 0 || copies.flat().some(({ layer }) => layer.locked)) return document;
  const match = matchLetters(before.words, lettering.words);
  let { layers } = document;
  for (const [index, copy] of copies.entries()) {
    const plan = planOf(copy, { before, lettering, letters, match, putBack, id: index === 0 ? id : `${id}-${index}` });
    if (plan === null) return document;
    layers = layers.map((layer) => layerSetAgain(layer, plan));
  }
  const isWithin = layers.every(({ pieces }) => pieces.length <= mostPieces);
  const hasLetters = copiesOnBoard({ layers }, lettering.id).length > 0;
  if (!isWithin || !hasLetters || (isSame(before, lettering) && isSame(layers, document.layers))) return document;
  return { ...document, layers, lettering: document.lettering.map((one) => (one === before ? lettering : one)) };
}

/** What becomes of the letters of one copy. */
type Plan = {
  readonly kept: ReadonlyMap<string, { readonly motion: Motion; readonly after: (piece: Piece) => Piece }>;
  readonly gone: ReadonlySet<string>;
  /** New letters, each in the layer of the letter that it follows. */
  readonly added: readonly { readonly piece: Piece; readonly layerKey: string; readonly follows: string | null }[];
};

function planOf(
  copy: readonly LetterPiece[],
  {
    before,
    lettering,
    letters,
    match,
    putBack,
    id,
  }: Required<SetAgain> & { before: Lettering; match: readonly (number | null)[] },
): Plan | null {
  const movement = movementOfLetters(copy);
  const [first] = copy;
  if (!movement || !first) return null;
  const here: Placement = { ...movement, scale: 1 };
  const byLetter = new Map(copy.map((one) => [one.source.letter, one]));
  const kept = new Map<string, { motion: Motion; after: (piece: Piece) => Piece }>();
  const added: { piece: Piece; layerKey: string; follows: string | null }[] = [];
  let last: { readonly id: string | null; readonly layerKey: string } = { id: null, layerKey: first.layer.key };
  for (const letter of letters) {
    const was = match[letter.letter] ?? null;
    const old = was === null ? undefined : byLetter.get(was);
    if (old) {
      const to = placementAgain(old, letter, { movement, here });
      if (!to) return null;
      kept.set(old.piece.id, {
        motion: motionBetween(old.piece.placement, to),
        after: withLetter(old, letter, [before.words, lettering.words]),
      });
      last = { id: old.piece.id, layerKey: old.layer.key };
    } else if (was === null || putBack) {
      const placement = movedLetter({ laid: letter.laid, movement: here });
      const piece = pieceOfLetter(letter, { id, lettering, placement });
      if (!piece) return null;
      added.push({ piece, layerKey: last.layerKey, follows: last.id });
      last = { id: piece.id, layerKey: last.layerKey };
    }
  }
  return { kept, added, gone: new Set(copy.map(({ piece }) => piece.id).filter((one) => !kept.has(one))) };
}

function placementAgain(
  { piece, source }: LetterPiece,
  { laid }: LaidLetter,
  { movement, here }: { movement: Placement; here: Placement },
): Placement | null {
  const shift = ownShift({ laid: source.laid, placement: piece.placement }, movement);
  const own = { ...shift, dx: shift.dx * movement.scale, dy: shift.dy * movement.scale };
  return heldPlacement(movedLetter({ laid, movement: here, shift: own }));
}

/** The letter's own fields; what it is called and what it is said to read stay when they were changed. */
function withLetter(
  { source: was }: LetterPiece,
  { letter, reads, path, laid }: LaidLetter,
  [before, after]: readonly [string, string],
): (piece: Piece) => Piece {
  const usual = nameOfLetterPiece(before, { letter: was.letter, reads });
  return (piece) => ({
    ...piece,
    name: piece.name === usual ? nameOfLetterPiece(after, { letter, reads }) : piece.name,
    source: { ...was, letter, laid },
    path: path.map(({ start, segments }) => ({ start, segments: [...segments] })),
  });
}

const motionBetween = (from: Placement, to: Placement): Motion => ({
  point: (point) => placePoint(unplacePoint(point, from), to),
  placement: () => to,
});

function layerSetAgain(layer: Layer, { kept, gone, added }: Plan): Layer {
  const left = withoutPieces(layer, gone);
  const moved = layerAfter(left, new Map([...kept].map(([pieceId, { motion }]) => [pieceId, motion])));
  const pieces = moved.pieces.map((piece) => kept.get(piece.id)?.after(piece) ?? piece);
  for (const one of added) {
    if (one.layerKey !== layer.key) continue;
    const after = pieces.findIndex((piece) => piece.id === one.follows);
    if (after >= 0) pieces.splice(after + 1, 0, one.piece);
    else pieces.unshift(one.piece);
  }
  return { ...moved, pieces };
}

/** A layer without some pieces and the holes in them; of the holes that are left one is the fixed one. */
function withoutPieces(layer: Layer, gone: ReadonlySet<string>): Layer {
  const pieces = layer.pieces.filter((piece) => !gone.has(piece.id));
  if (pieces.length === layer.pieces.length || layer.hold.kind !== "standoff") return { ...layer, pieces };
  const within = holesWithin(layer, gone);
  const holes = withFixed(layer.hold.holes.filter((hole) => !within.has(hole.id)));
  return { ...layer, pieces, hold: { ...layer.hold, holes } };
}
