import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import type { MarginChoice, MarginPlate } from "#shared/shaping/margin-plate.ts";
import { lengthOf, mostPieces, nameOf } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { addLayer, type LayerPlace } from "./add-layer.ts";
import type { NewLayer } from "./new-layer.ts";
import { artworkOfPieces, keptOutline } from "./replace-pieces.ts";

/** Adds a layer of the plates that follow pieces at a margin. They bear the layer's name. */
export function addMargin(
  document: MockupDocument,
  {
    plates,
    pieceIds,
    choice: { marginMm, corners },
    ...layer
  }: NewLayer & {
    plates: MarginPlate["plates"];
    /** What they follow. */
    pieceIds: readonly string[];
    choice: Pick<MarginChoice, "marginMm" | "corners">;
    id: string;
    site: Site;
    place: LayerPlace;
  },
): MockupDocument {
  const margin = lengthOf(marginMm);
  if (margin === null || plates.length === 0 || plates.length > mostPieces) return document;
  const followed = new Set(pieceIds);
  const artworkIds = artworkOfPieces(
    document.layers.flatMap(({ pieces }) => pieces.filter(({ id }) => followed.has(id))),
  );
  const pieces = plates.map(
    (plate, index): Piece => ({
      id: `${layer.id}-${index + 1}`,
      name: nameOf(layer.name) ?? "Margin plate",
      source: { kind: "margin", margin, corners, artworkIds },
      ...keptOutline(plate),
      reads: "",
    }),
  );
  return addLayer(document, { ...layer, pieces });
}
