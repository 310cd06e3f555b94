import { regionContains } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { placeRegion } from "../geometry/placement.ts";
import type { Adhesive, Hold, Hole, Layer, MockupDocument, Piece } from "./document.ts";
import { freeLayerName } from "./free-layer-name.ts";
import { nextFreeKeys } from "./layer-key.ts";

/** As many layers as a document takes. */
export const mostLayers = 60;

/** Pieces to take out of their layer; `adhesive` bonds them, without one they stay held as they were. */
export type LayerSplit = {
  readonly layerKey: string;
  readonly pieceIds: readonly string[];
  readonly adhesive?: Adhesive;
};

/**
 * Takes pieces out of their layer into a new one next to it, of the same stock, with the standoff holes that lie in them. The
 * same document when no piece or every piece is named, when the layer is locked, or when there are as many as a document takes.
 */
export function splitLayer(document: MockupDocument, { layerKey, pieceIds, adhesive }: LayerSplit): MockupDocument {
  const layer = document.layers.find(({ key }) => key === layerKey);
  const [key] = nextFreeKeys(document, 1);
  const chosen = new Set(pieceIds);
  const taken = layer?.pieces.filter(({ id }) => chosen.has(id)) ?? [];
  if (!layer || layer.locked || !key || document.layers.length >= mostLayers) return document;
  if (taken.length === 0 || taken.length === layer.pieces.length) return document;
  const [holdOfTaken, holdOfRest] = splitHold(layer.hold, taken);
  const rest = { ...layer, hold: holdOfRest, pieces: layer.pieces.filter(({ id }) => !chosen.has(id)) };
  const same: Layer = { ...layer, key, name: freeLayerName(document, layer.name), hold: holdOfTaken, pieces: taken };
  const split = adhesive ? bonded(same, adhesive) : same;
  return { ...document, layers: document.layers.flatMap((one) => (one === layer ? [rest, split] : [one])) };
}

/** Bonded down, a piece is no longer found by its holes or its pocket. */
function bonded(layer: Layer, adhesive: Adhesive): Layer {
  const locate = layer.locate === "hole pattern" || layer.locate === "pocket" ? "none" : layer.locate;
  return { ...layer, hold: { kind: "bond", adhesive, tack: null }, locate };
}

function splitHold(hold: Hold, taken: readonly Piece[]): readonly [Hold, Hold] {
  if (hold.kind !== "standoff") return [hold, hold];
  const regions = taken.map(({ path, placement }) => placeRegion(flattenPath(path), placement));
  const goes = (hole: Hole) => regions.some((region) => regionContains(region, hole));
  return [
    { ...hold, holes: withFixed(hold.holes.filter(goes)) },
    { ...hold, holes: withFixed(hold.holes.filter((hole) => !goes(hole))) },
  ];
}

/** A part without the fixed hole takes its first for it. */
const withFixed = (holes: Hole[]): Hole[] =>
  holes.some(({ fixed }) => fixed) ? holes : holes.map((hole, index) => ({ ...hole, fixed: index === 0 }));
