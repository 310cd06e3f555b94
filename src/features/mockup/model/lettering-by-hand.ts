import { ownShift } from "#shared/lettering/common-movement.ts";
import { isSpace, lettersOfWords } from "#shared/lettering/letters-of-words.ts";
import { asOnBoard, copiesOnBoard, movementOfLetters } from "#shared/lettering/letters-on-board.ts";
import type { Lettering, MockupDocument } from "#shared/mockup/document.ts";

/** Lettering as it lies, and what the hand has done to its letters since they were set. */
export type LetteringByHand = {
  /** In mm as they are on the board. */
  readonly lettering: Lettering;
  /** Letters that were shifted, turned or resized alone. */
  readonly moved: number;
  /** Letters of the words of which there is no piece. */
  readonly out: number;
  /** The key of a layer that is locked and has letters of it. */
  readonly lockedLayer: string | null;
};

/** Null for lettering that is not there. Of doubled lettering the first copy is told of. */
export function letteringByHand(document: MockupDocument, letteringId: string): LetteringByHand | null {
  const lettering = document.lettering.find(({ id }) => id === letteringId);
  const copies = copiesOnBoard(document, letteringId);
  const [copy] = copies;
  const movement = copy && movementOfLetters(copy);
  if (!lettering || !copy || !movement) return null;
  const there = new Set(copy.map(({ source }) => source.letter));
  const moved = copy.filter(({ piece, source }) => {
    const { dx, dy, turn, scale, mirrored } = ownShift({ laid: source.laid, placement: piece.placement }, movement);
    return Math.hypot(dx, dy) > 0.05 || Math.abs(turn) > 0.05 || Math.abs(scale - 1) > 1e-3 || mirrored;
  });
  const cut = lettersOfWords(lettering.words).filter(({ text }) => !isSpace(text));
  return {
    lettering: asOnBoard(lettering, movement.scale),
    moved: moved.length,
    out: cut.filter(({ letter }) => !there.has(letter)).length,
    lockedLayer: copies.flat().find(({ layer }) => layer.locked)?.layer.key ?? null,
  };
}
