import { boxOfPath } from "../geometry/box.ts";
import type { Layer, Piece } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { RuleInput } from "./rule.ts";
import { layersWithFigures } from "./words.ts";

/** A piece that reads as something. */
export type Letter = { readonly layer: Layer; readonly piece: Piece; readonly figures: PieceFigures };

/** Every piece that reads, in document order; what covers nothing reads as nothing. */
export function lettersOf(input: Pick<RuleInput, "document" | "figures">): Letter[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }) =>
    pieces.flatMap(({ piece, figures }) =>
      piece.reads !== "" && figures.areaMm2 > 0 ? [{ layer, piece, figures }] : [],
    ),
  );
}

/** Letters as tall as capitals: capitals, figures, and small ones with an ascender. */
const tall = /[\p{Lu}\p{Nd}bdfhklt&]/u;
/** What goes below the line makes the box taller than the letter. */
const below = /[gjpqyQ,;ç]/u;

/**
 * The height in mm that the letters of a layer are read by: the least of its pieces that are as tall as a capital, or of
 * all when none is. An upright piece's own box; a turned one's smallest box.
 */
export function letterHeightMm(
  letters: readonly Letter[],
): { readonly heightMm: number; readonly letter: Letter } | null {
  const clear = letters.filter(({ piece }) => tall.test(piece.reads) && !below.test(piece.reads));
  let least: { heightMm: number; letter: Letter } | null = null;
  for (const letter of clear.length > 0 ? clear : letters) {
    const heightMm = heightOf(letter);
    if (heightMm > 0 && (!least || heightMm < least.heightMm)) least = { heightMm, letter };
  }
  return least;
}

function heightOf({ piece, figures }: Letter): number {
  // The outline of a letter that was set stands upright in its own plane, however it is turned on the board.
  if (piece.source.kind === "lettering") return (boxOfPath(piece.path)?.height ?? 0) * piece.placement.scale;
  const upright = Math.abs(piece.placement.turn % 180) < 1;
  if (upright) return figures.box.height;
  const { smallestBox } = figures;
  return smallestBox ? Math.max(smallestBox.width, smallestBox.length) : figures.box.height;
}
