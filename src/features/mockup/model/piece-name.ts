import type { Piece } from "#shared/mockup/document.ts";

/** What a piece is called in lists: its own name, else its place in the layer. */
export function nameOfPiece({ name }: Piece, index: number): string {
  return name === "" ? `Piece ${index + 1}` : name;
}
