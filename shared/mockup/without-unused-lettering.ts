import type { MockupDocument } from "./document.ts";

/** The document without the words of which no piece is left; the same document when every entry has one. */
export function withoutUnusedLettering(document: MockupDocument): MockupDocument {
  if (document.lettering.length === 0) return document;
  const used = new Set(
    document.layers.flatMap(({ pieces }) =>
      pieces.flatMap(({ source }) => (source.kind === "lettering" ? [source.letteringId] : [])),
    ),
  );
  const lettering = document.lettering.filter(({ id }) => used.has(id));
  return lettering.length === document.lettering.length ? document : { ...document, lettering };
}
