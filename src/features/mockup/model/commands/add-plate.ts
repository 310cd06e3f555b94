import type { Path } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { lengthOf, mostLayers, nameOf, roundMm } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { type NewLayer, newLayer } from "./new-layer.ts";

export type PlateShape =
  | { readonly kind: "rectangle"; readonly width: number; readonly height: number }
  | { readonly kind: "circle"; readonly diameter: number };

/** Nearest the wall, so that the other layers come to lie on it, or nearest the viewer. */
export type PlateOrder = "wall" | "viewer";

/** Adds a layer of one plate in the middle of the board. The plate bears the layer's name. Impossible sizes add nothing. */
export function addPlate(
  document: MockupDocument,
  {
    shape,
    id,
    site,
    nearest = "viewer",
    ...fields
  }: NewLayer & { shape: PlateShape; id: string; site: Site; nearest?: PlateOrder },
): MockupDocument {
  const path = pathOf(shape);
  const [key] = nextFreeKeys(document, 1);
  if (!path || !key || document.layers.length >= mostLayers) return document;
  const piece: Piece = {
    id,
    name: nameOf(fields.name) ?? "Plate",
    source: { kind: "plate" },
    path: path.map(({ start, segments }) => ({ start, segments: [...segments] })),
    placement: {
      x: roundMm(document.board.width / 2),
      y: roundMm(document.board.height / 2),
      turn: 0,
      scale: 1,
      mirrored: false,
    },
    reads: "",
  };
  const layer = newLayer(fields, { key, pieces: [piece], id: `${id}-h`, document, site });
  return { ...document, layers: nearest === "wall" ? [layer, ...document.layers] : [...document.layers, layer] };
}

function pathOf(shape: PlateShape): Path | null {
  if (shape.kind === "circle") {
    const diameter = lengthOf(shape.diameter);
    return diameter === null ? null : circlePath({ x: 0, y: 0 }, diameter / 2);
  }
  const width = lengthOf(shape.width);
  const height = lengthOf(shape.height);
  return width === null || height === null ? null : rectanglePath({ x: -width / 2, y: -height / 2, width, height });
}
