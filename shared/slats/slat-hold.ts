import { isShorter } from "../geometry/tolerance.ts";
import type { Banded } from "../units/banded.ts";
import { checked, lengthRange, type Outcome, type Range, spanRange } from "../units/outcome.ts";

/** What a fixing goes through, mm. */
export type SlatsUnder = {
  readonly slat: number;
  readonly substrate: number;
  readonly sanding: number;
  readonly skin: number;
};

export type SlatHold = {
  /** How far the point comes past the slat into the substrate at the least; under 0 it ends in the slat. */
  readonly pastSlatMm: number;
  readonly neededMm: number;
  /** Whether only the slat holds it: a slat is held by glue alone, and a load pulls it off. */
  readonly onlySlat: boolean;
};

/** How far past the slat a fixing must go into the substrate, mm. Common practice. */
export const usualHoldMm = { screw: 6, brad: 5 } as const;

/**
 * Whether a fixing reaches through the slat far enough into the substrate. `point`: how deep its point comes below the
 * slats' face (screw-reach.ts). A slat that was not sanded takes the most of it, so sanding does not count.
 */
export function slatHold(
  point: Pick<Banded, "least">,
  { slat, substrate }: Pick<SlatsUnder, "slat" | "substrate">,
  needed: number = usualHoldMm.screw,
): Outcome<SlatHold> {
  const depth: Range = { least: -lengthRange.most, most: lengthRange.most };
  return checked(
    {
      point: [point.least, depth],
      slat: [slat, lengthRange],
      substrate: [substrate, lengthRange],
      needed: [needed, spanRange],
    },
    () => {
      const pastSlatMm = point.least - slat;
      return { pastSlatMm, neededMm: needed, onlySlat: isShorter(pastSlatMm, needed) };
    },
  );
}
