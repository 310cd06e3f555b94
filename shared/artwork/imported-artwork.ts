import type { Box, Path } from "../geometry/path.ts";

/** A closed piece of the artwork: one connected visible area of one colour, holes by the even-odd rule. */
export type ArtworkPiece = {
  readonly index: number;
  readonly colour: string;
  readonly path: Path;
  readonly box: Box;
  readonly areaMm2: number;
};

/** Something of the file that the pieces do not show as drawn. Never silent. */
export type ArtworkWarning = { readonly code: string; readonly text: string };

/**
 * What an artwork file became: pieces in mm with the drawing's upper left corner at 0, 0,
 * y down, each with its place in the drawing, ordered by colour and then by place.
 */
export type ImportedArtwork = {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly colours: readonly { readonly colour: string; readonly pieces: number; readonly areaMm2: number }[];
  readonly pieces: readonly ArtworkPiece[];
  readonly warnings: readonly ArtworkWarning[];
};

/** Why a file can't be taken, in words for the person who brought it, with what to do instead. */
export type ArtworkRefusal = { readonly code: string; readonly text: string };

export type ImportOutcome =
  | { readonly ok: true; readonly artwork: ImportedArtwork }
  | { readonly ok: false; readonly refusal: ArtworkRefusal };
