import type { MockupDocument, PieceSource } from "./document.ts";

/** The artwork that pieces of a document go back to, each once, in the order in which it is met. */
export function artworkUsed(document: MockupDocument): string[] {
  return [...new Set(document.layers.flatMap(({ pieces }) => pieces.flatMap(({ source }) => artworkOf(source))))];
}

/** The artwork that one outline goes back to. */
export function artworkOf(source: PieceSource): readonly string[] {
  switch (source.kind) {
    case "artwork":
      return [source.artworkId];
    case "margin":
    case "worked":
      return source.artworkIds;
    case "plate":
    case "lettering":
      return [];
  }
}
