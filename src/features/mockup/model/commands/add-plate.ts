import type { Path } from "#shared/geometry/path.ts";
import { circlePath, ellipsePath, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { lengthOf, mostPieces, nameOf, roundMm } from "../limits.ts";
import type { Site } from "../propose-holes.ts";
import { addLayer } from "./add-layer.ts";
import { changeLayer } from "./change-layer.ts";
import type { NewLayer } from "./new-layer.ts";

export type PlateShape =
  | { readonly kind: "rectangle"; readonly width: number; readonly height: number }
  /** The radius is held to half the shorter side. */
  | { readonly kind: "rounded"; readonly width: number; readonly height: number; readonly radius: number }
  | { readonly kind: "ellipse"; readonly width: number; readonly height: number }
  | { readonly kind: "circle"; readonly diameter: number };

/** Nearest the wall, so that the other layers come to lie on it, or nearest the viewer. */
export type PlateOrder = "wall" | "viewer";

/** Adds a layer of one plate in the middle of the board. The plate bears the layer's name. Impossible sizes add nothing. */
export function addPlate(
  document: MockupDocument,
  {
    shape,
    nearest = "viewer",
    ...layer
  }: NewLayer & { shape: PlateShape; id: string; site: Site; nearest?: PlateOrder },
): MockupDocument {
  const piece = plateInMiddle(document, { shape, id: layer.id, name: layer.name });
  return piece ? addLayer(document, { ...layer, place: nearest, pieces: [piece] }) : document;
}

/** Adds a plate in the middle of the board to a layer that is there. Standoffs get no holes by it. */
export function addPlateToLayer(
  document: MockupDocument,
  { key, ...plate }: { key: string; shape: PlateShape; id: string; name: string },
): MockupDocument {
  const piece = plateInMiddle(document, plate);
  if (!piece) return document;
  return changeLayer(document, key, (layer) =>
    layer.pieces.length >= mostPieces ? layer : { ...layer, pieces: [...layer.pieces, piece] },
  );
}

function plateInMiddle(
  { board }: MockupDocument,
  { shape, id, name }: { shape: PlateShape; id: string; name: string },
): Piece | null {
  const path = pathOf(shape);
  if (!path) return null;
  return {
    id,
    name: nameOf(name) ?? "Plate",
    source: { kind: "plate" },
    path: path.map(({ start, segments }) => ({ start, segments: [...segments] })),
    placement: { x: roundMm(board.width / 2), y: roundMm(board.height / 2), turn: 0, scale: 1, mirrored: false },
    reads: "",
  };
}

/** The plate about its middle; null for a size that is none. */
function pathOf(shape: PlateShape): Path | null {
  if (shape.kind === "circle") {
    const diameter = lengthOf(shape.diameter);
    return diameter === null ? null : circlePath({ x: 0, y: 0 }, diameter / 2);
  }
  const width = lengthOf(shape.width);
  const height = lengthOf(shape.height);
  if (width === null || height === null) return null;
  const box = { x: -width / 2, y: -height / 2, width, height };
  switch (shape.kind) {
    case "rectangle":
      return rectanglePath(box);
    case "rounded": {
      const radius = lengthOf(shape.radius);
      return radius === null ? null : roundedRectanglePath(box, radius);
    }
    case "ellipse":
      return ellipsePath({ x: 0, y: 0 }, width / 2, height / 2);
  }
}
