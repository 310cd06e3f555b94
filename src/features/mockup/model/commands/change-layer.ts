import type { Layer, MockupDocument } from "#shared/mockup/document.ts";

/**
 * The document with one layer changed; the same document when `change` gives the same layer back, when there is none, and
 * when it is locked.
 */
export function changeLayer(document: MockupDocument, key: string, change: (layer: Layer) => Layer): MockupDocument {
  return changeLayers(document, (layer) => (layer.key === key ? change(layer) : layer));
}

/** The document with `change` done to every layer that is not locked; the same document when every layer stayed the same. */
export function changeLayers(document: MockupDocument, change: (layer: Layer) => Layer): MockupDocument {
  return changeEveryLayer(document, (layer) => (layer.locked ? layer : change(layer)));
}

/** As `changeLayers`, with the locked ones: for what is no change of the layer itself. */
export function changeEveryLayer(document: MockupDocument, change: (layer: Layer) => Layer): MockupDocument {
  const layers = document.layers.map(change);
  return layers.every((layer, index) => layer === document.layers[index]) ? document : { ...document, layers };
}
