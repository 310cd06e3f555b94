import { lengthsEqual } from "../geometry/tolerance.ts";
import type { CapStud } from "../mockup/document.ts";

/** Whether bore and floor make up the barrel's length: otherwise one of its numbers is wrong. */
export function barrelAddsUp({ boreDepth, floorThickness, barrelLength }: CapStud): boolean {
  return lengthsEqual(boreDepth + floorThickness, barrelLength, 0.05);
}

/** The barrel whose length comes nearest to an offset in mm, the shorter of two equally near; null for none. */
export function nearestBarrel<T extends Pick<CapStud, "barrelLength">>(
  offset: number,
  barrels: readonly T[],
): T | null {
  return barrels.reduce<T | null>((nearest, barrel) => {
    if (!nearest) return barrel;
    const gain = Math.abs(nearest.barrelLength - offset) - Math.abs(barrel.barrelLength - offset);
    if (gain > 0) return barrel;
    return gain === 0 && barrel.barrelLength < nearest.barrelLength ? barrel : nearest;
  }, null);
}
