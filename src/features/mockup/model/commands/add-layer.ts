import type { Lettering, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { freeLayerName } from "#shared/mockup/free-layer-name.ts";
import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { mostLayers } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { type NewLayer, newLayer } from "./new-layer.ts";

/** Where a new layer comes among the others: nearest the wall, nearest the viewer, or right under one of them. */
export type LayerPlace = "wall" | "viewer" | { readonly under: string };

/** As many entries of lettering as a document takes. */
const mostLettering = 200;

/**
 * Adds a layer with the next free key, of `pieces` if there are any yet. Nothing happens when there are as many layers as a
 * document takes, or the one that it shall lie under is not there.
 */
export function addLayer(
  document: MockupDocument,
  {
    id,
    site,
    place = "viewer",
    pieces = [],
    ...fields
  }: NewLayer & { id: string; site: Site; place?: LayerPlace; pieces?: readonly Piece[] },
): MockupDocument {
  const [key] = nextFreeKeys(document, 1);
  const at = indexOfPlace(document, place);
  if (!key || at < 0 || document.layers.length >= mostLayers) return document;
  const layer = newLayer(fields, { key, pieces: [...pieces], id: `${id}-h`, document, site });
  return { ...document, layers: document.layers.toSpliced(at, 0, layer) };
}

function indexOfPlace({ layers }: MockupDocument, place: LayerPlace): number {
  if (place === "wall") return 0;
  if (place === "viewer") return layers.length;
  return layers.findIndex(({ key }) => key === place.under);
}

/**
 * Puts a layer's double right over it, with the next free key, a name with the next number, and ids made from `id`. Words
 * set in it are doubled with it, so that either can be set anew alone. The double of a locked layer is not locked.
 */
export function doubleLayer(document: MockupDocument, { key, id }: { key: string; id: string }): MockupDocument {
  const at = document.layers.findIndex((layer) => layer.key === key);
  const layer = document.layers[at];
  const [newKey] = nextFreeKeys(document, 1);
  if (!layer || !newKey || document.layers.length >= mostLayers) return document;
  const words = doubledLettering(document, layer.pieces, id);
  if (document.lettering.length + words.size > mostLettering) return document;
  const double = {
    ...layer,
    key: newKey,
    name: freeLayerName(document, layer.name),
    locked: false,
    pieces: layer.pieces.map((piece, index) => ({
      ...piece,
      id: `${id}-${index + 1}`,
      source:
        piece.source.kind === "lettering"
          ? { ...piece.source, letteringId: words.get(piece.source.letteringId)?.id ?? piece.source.letteringId }
          : piece.source,
    })),
    hold:
      layer.hold.kind === "standoff"
        ? { ...layer.hold, holes: layer.hold.holes.map((hole, index) => ({ ...hole, id: `${id}-h${index + 1}` })) }
        : layer.hold,
  };
  return {
    ...document,
    layers: document.layers.toSpliced(at + 1, 0, double),
    ...(words.size > 0 && { lettering: [...document.lettering, ...words.values()] }),
  };
}

/** A double of each entry that one of the pieces is of, by the id of the first. */
function doubledLettering({ lettering }: MockupDocument, pieces: readonly Piece[], id: string): Map<string, Lettering> {
  const used = new Set(pieces.flatMap(({ source }) => (source.kind === "lettering" ? [source.letteringId] : [])));
  return new Map(
    lettering
      .filter((entry) => used.has(entry.id))
      .map((entry, index) => [entry.id, { ...entry, id: `${id}-l${index + 1}` }]),
  );
}
