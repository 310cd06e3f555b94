import type { MockupDocument } from "#shared/mockup/document.ts";
import { withoutUnusedLettering } from "#shared/mockup/without-unused-lettering.ts";

/** Changes places with the next layer towards the viewer or the wall; nothing happens at either end. Keys stay. A locked layer can be ordered: nothing of it changes. */
export function moveLayer(
  document: MockupDocument,
  { key, towards }: { key: string; towards: "viewer" | "wall" },
): MockupDocument {
  const from = document.layers.findIndex((layer) => layer.key === key);
  const to = from + (towards === "viewer" ? 1 : -1);
  const layer = document.layers[from];
  const other = document.layers[to];
  if (!layer || !other) return document;
  const layers = [...document.layers];
  layers[from] = other;
  layers[to] = layer;
  return { ...document, layers };
}

/** Takes a layer off with all its pieces and holes; a locked one stays. */
export function removeLayer(document: MockupDocument, { key }: { key: string }): MockupDocument {
  const layers = document.layers.filter((layer) => layer.key !== key || layer.locked);
  return layers.length === document.layers.length ? document : withoutUnusedLettering({ ...document, layers });
}
