import { isShorter } from "../geometry/tolerance.ts";
import type { Banded } from "../units/banded.ts";
import { checked, lengthRange, type Outcome, spanRange } from "../units/outcome.ts";

/** How far a pocket's depth may be off, mm (common practice for routed and engraved pockets). */
export const pocketDepthToleranceMm = 0.2;

/** Least share of the nominal thickness that must be left under a pocket (common practice). */
export const leastFloorShare = 1 / 3;

export type PocketFloor = {
  /** What is left under the deepest cut in the thinnest sheet, mm; less than nothing when it comes through. */
  readonly floorMm: number;
  readonly neededMm: number;
  readonly holds: boolean;
};

/**
 * The floor under a pocket: thinnest sheet − deepest cut ≥ a third of the nominal thickness of what is cut. Arithmetic;
 * the third is common practice.
 */
export function pocketFloor(
  cut: Banded,
  depth: number,
  options: { readonly tolerance?: number; readonly share?: number } = {},
): Outcome<PocketFloor> {
  const { tolerance = pocketDepthToleranceMm, share = leastFloorShare } = options;
  return checked(
    {
      thickness: [cut.nominal, lengthRange],
      thinnest: [cut.least, spanRange],
      depth: [depth, lengthRange],
      tolerance: [tolerance, spanRange],
      share: [share, { least: 0, most: 1 }],
    },
    () => {
      const floorMm = cut.least - (depth + tolerance);
      const neededMm = share * cut.nominal;
      return { floorMm, neededMm, holds: !isShorter(floorMm, neededMm) };
    },
  );
}
