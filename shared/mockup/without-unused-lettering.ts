import type { MockupDocument } from "./document.ts";

/** The document without lettering of which no piece is left; the same document when every one has a piece. */
export function withoutUnusedLettering(document: MockupDocument): MockupDocument {
  if (document.lettering.length === 0) return document;
  const used = new Set<string>();
  for (const { pieces } of document.layers)
    for (const { source } of pieces) if (source.kind === "lettering") used.add(source.letteringId);
  const lettering = document.lettering.filter(({ id }) => used.has(id));
  return lettering.length === document.lettering.length ? document : { ...document, lettering };
}
