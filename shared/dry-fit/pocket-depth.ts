import { pocketDepthToleranceMm } from "../bonds/pocket-floor.ts";
import { sheetBand } from "../materials/sheet-tolerance.ts";
import type { Layer, MockupDocument } from "../mockup/document.ts";
import { backerThicknessMm } from "../stack/backer.ts";
import { type Banded, exactly } from "../units/banded.ts";
import { type Joint, joinedLayers } from "./joints.ts";
import type { Limits } from "./limits.ts";
import type { RuleInput } from "./rule.ts";

/** How thick what a pocket is cut into may be, mm: a layer by its sheet's tolerance, the backer as it is. */
export function cutBand(under: Layer | null, { backer }: Pick<MockupDocument, "backer">): Banded {
  return under ? sheetBand(under.stock.process, under.thickness) : exactly(backerThicknessMm(backer));
}

/**
 * The deepest cut, mm in whole tenths, that leaves the floor of everything a layer is let into: its thinnest, less the error
 * in depth and the share of its thickness that must be left (rule 19). Under 0 where nothing can be cut.
 */
export function deepestPocketMm(
  joints: readonly Joint[],
  { document, limits }: { readonly document: MockupDocument; readonly limits: Pick<Limits, "pocketFloorShare"> },
): number {
  const depths = joints.map(({ under }) => {
    const { least, nominal } = cutBand(under, document);
    return least - pocketDepthToleranceMm - limits.pocketFloorShare * nominal;
  });
  // A hair more, so that 1.1 that binary holds as a little less stays 1.1.
  return Math.floor(Math.min(...depths) * 10 + 1e-6) / 10;
}

/** The same for one layer by its key; null where it lies on nothing that is known. */
export function deepestPocketOf(
  input: Pick<RuleInput, "document" | "figures" | "limits">,
  layerKey: string,
): number | null {
  const found = joinedLayers(input).find(({ layer }) => layer.key === layerKey);
  return found ? deepestPocketMm(found.joints, input) : null;
}
