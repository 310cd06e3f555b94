import type { Placement } from "../geometry/path.ts";
import type { Layer, Lettering, MockupDocument, Piece, PieceSource } from "../mockup/document.ts";
import { commonMovement } from "./common-movement.ts";

/** A piece that is a letter, with the layer it lies in. */
export type LetterPiece = {
  readonly layer: Layer;
  readonly piece: Piece;
  readonly source: Extract<PieceSource, { kind: "lettering" }>;
};

/** The letters of a lettering in the order of its words. Of letters that were doubled the first comes first. */
export function lettersOnBoard({ layers }: Pick<MockupDocument, "layers">, letteringId: string): LetterPiece[] {
  return layers
    .flatMap((layer) => layer.pieces.map((piece) => ({ layer, piece })))
    .flatMap(({ layer, piece }) => {
      const { source } = piece;
      return source.kind === "lettering" && source.letteringId === letteringId ? [{ layer, piece, source }] : [];
    })
    .toSorted((a, b) => a.source.letter - b.source.letter);
}

/** The letters of a lettering copy by copy, as `copiesOf` parts them. */
export function copiesOnBoard(document: Pick<MockupDocument, "layers">, letteringId: string): LetterPiece[][] {
  return copiesOf(lettersOnBoard(document, letteringId));
}

/**
 * Letters of one lettering parted copy by copy: doubled lettering lies on the board more than once, and each time has its own
 * place. The first piece of every letter makes one copy, the second the next.
 */
export function copiesOf<T extends Pick<LetterPiece, "source">>(letters: readonly T[]): T[][] {
  const copies: T[][] = [];
  const seen = new Map<number, number>();
  for (const letter of letters) {
    const copy = seen.get(letter.source.letter) ?? 0;
    seen.set(letter.source.letter, copy + 1);
    const own = copies[copy];
    if (own) own.push(letter);
    else copies.push([letter]);
  }
  return copies;
}

/** Where the plane of some letters of one lettering lies on the board. Null for no letters. */
export function movementOfLetters(letters: readonly Pick<LetterPiece, "piece" | "source">[]): Placement | null {
  return commonMovement(letters.map(({ piece, source }) => ({ laid: source.laid, placement: piece.placement })));
}

/** A lettering in mm as they are on the board, whatever size the hand has given it since. */
export function asOnBoard(lettering: Lettering, scale: number): Lettering {
  if (Math.abs(scale - 1) < 1e-9) return lettering;
  const { along } = lettering;
  const sized = (mm: number) => Math.round(mm * scale * 1000) / 1000;
  return {
    ...lettering,
    capHeight: sized(lettering.capHeight),
    letterSpacing: sized(lettering.letterSpacing),
    lineSpacing: sized(lettering.lineSpacing),
    along: along.kind === "arc" ? { ...along, radius: sized(along.radius) } : along,
  };
}
