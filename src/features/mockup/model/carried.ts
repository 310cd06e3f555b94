import { boxesOverlap } from "#shared/geometry/box.ts";
import type { Figures } from "#shared/stack/figures.ts";

/**
 * Pieces together with all that stands on them, and on those again: what a hand takes along that lifts them. What rests on
 * a layer is known by the layer; which of its pieces carries it, by where they lie.
 */
export function withCarried(figures: Figures, pieceIds: readonly string[]): string[] {
  const taken = new Set(pieceIds);
  let carriers = figures.pieces.filter(({ pieceId }) => taken.has(pieceId));
  while (carriers.length > 0) {
    const next = figures.pieces.filter(
      ({ pieceId, restsOn, box }) =>
        !taken.has(pieceId) &&
        carriers.some((carrier) => restsOn[0] === carrier.layerKey && boxesOverlap(box, carrier.box)),
    );
    for (const { pieceId } of next) taken.add(pieceId);
    carriers = next;
  }
  return figures.pieces.map(({ pieceId }) => pieceId).filter((id) => taken.has(id));
}
