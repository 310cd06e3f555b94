import { isShorter } from "../geometry/tolerance.ts";
import type { Slat, SlatLayout } from "./slat-layout.ts";

export type Sliver = { readonly slat: Slat; readonly lengthMm: number; readonly limitMm: number };

/**
 * Slats that are left shorter, from long point to long point, than one slat is wide, in laying order: hard to cut, to hold
 * and to glue (common practice).
 */
export function sliversOf({ slats, design }: Pick<SlatLayout, "slats" | "design">): Sliver[] {
  return slats
    .filter((slat) => isShorter(slat.trimmedLongPoint, design.slatWidth))
    .map((slat) => ({ slat, lengthMm: slat.trimmedLongPoint, limitMm: design.slatWidth }));
}
