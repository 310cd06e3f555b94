import type { MockupDocument } from "#shared/mockup/document.ts";
import { withFields } from "../same.ts";
import { changeLayers } from "./change-layer.ts";

const mostCharacters = 120;

/** Sets what pieces read, by their ids; a text is cut to what the document takes. */
export function setReads(document: MockupDocument, reads: ReadonlyMap<string, string>): MockupDocument {
  return changeLayers(document, (layer) => {
    if (!layer.pieces.some(({ id }) => reads.has(id))) return layer;
    const pieces = layer.pieces.map((piece) =>
      withFields(piece, { reads: (reads.get(piece.id) ?? piece.reads).trim().slice(0, mostCharacters).trim() }),
    );
    return withFields(layer, { pieces });
  });
}

/**
 * What each of `pieceIds`, in reading order, says of `text`: a character each, spaces left out. Null when there are not as
 * many characters as pieces.
 */
export function spreadWords(pieceIds: readonly string[], text: string): ReadonlyMap<string, string> | null {
  const characters = [...text.normalize("NFC").replace(/\s+/gu, "")];
  if (characters.length !== pieceIds.length) return null;
  return new Map(pieceIds.map((id, index) => [id, characters[index] ?? ""]));
}
