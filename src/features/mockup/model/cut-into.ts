import type { MockupDocument } from "#shared/mockup/document.ts";
import { backerThicknessMm } from "#shared/stack/backer.ts";
import type { Figures } from "#shared/stack/figures.ts";

/** How thick what a layer's pockets are cut into is, mm: the thinnest where they are cut into several; null where it is not known. */
export function thicknessUnder({ backer, layers }: MockupDocument, figures: Figures, key: string): number | null {
  const under = new Set(
    figures.pieces.filter(({ layerKey }) => layerKey === key).flatMap(({ restsOn }) => restsOn.slice(0, 1)),
  );
  const thicknesses = [...under].flatMap((support) =>
    support === "A" ? backerThicknessMm(backer) : (layers.find((layer) => layer.key === support)?.thickness ?? []),
  );
  return thicknesses.length === 0 ? null : Math.min(...thicknesses);
}
