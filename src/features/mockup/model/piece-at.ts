import { boxGrow } from "#shared/geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import type { Point } from "#shared/geometry/path.ts";
import { seenDiameterMm } from "#shared/hardware/standoff-parts.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";

/**
 * The piece that a finger at `point` of the board touches: the one nearest the viewer whose outline holds the point; where
 * none does, the nearest outline within `reachMm`, so that thin strokes can be taken hold of. Hidden layers are passed over.
 */
export function pieceAt(
  { document, figures, reachMm }: { document: MockupDocument; figures: Figures; reachMm: number },
  point: Point,
): string | null {
  const hidden = new Set(document.layers.filter((layer) => layer.hidden).map(({ key }) => key));
  const near = figures.pieces.filter(
    ({ layerKey, box }) => !hidden.has(layerKey) && holds(boxGrow(box, reachMm), point),
  );
  const highestFirst = near.toSorted((a, b) => b.top.nominal - a.top.nominal);
  const inside = highestFirst.find(({ region }) => regionContains(region, point));
  if (inside) return inside.pieceId;
  let nearest: { pieceId: string; distance: number } | null = null;
  for (const { pieceId, region } of highestFirst) {
    const distance = distanceToRegionEdgeMm(region, point);
    if (distance <= reachMm && (!nearest || distance < nearest.distance)) nearest = { pieceId, distance };
  }
  return nearest?.pieceId ?? null;
}

/** The hole of one layer whose cap lies under a finger; null when the layer is hidden, has none or is not there. */
export function holeAt(document: MockupDocument, layerKey: string | null, point: Point): string | null {
  const layer = document.layers.find(({ key }) => key === layerKey);
  if (!layer || layer.hidden || layer.hold.kind !== "standoff") return null;
  const { hardware, holes } = layer.hold;
  const reach = Math.max(seenDiameterMm(hardware), hardware.barrelDiameter) / 2;
  return holes.find(({ x, y }) => Math.hypot(x - point.x, y - point.y) <= reach)?.id ?? null;
}

function holds(box: { x: number; y: number; width: number; height: number }, { x, y }: Point): boolean {
  return x >= box.x && x <= box.x + box.width && y >= box.y && y <= box.y + box.height;
}
