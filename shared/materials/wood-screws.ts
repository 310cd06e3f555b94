import { inchesToMm, mmToInches } from "../units/length.ts";

/** Largest flat-head diameter in inches by gauge, measured at the sharp edge, 82° head (ASME B18.6.1). */
const flatHeadInches: ReadonlyMap<number, number> = new Map([
  [4, 0.225],
  [5, 0.252],
  [6, 0.279],
  [7, 0.305],
  [8, 0.332],
  [9, 0.358],
  [10, 0.385],
  [12, 0.438],
  [14, 0.491],
]);

/** Basic diameter in mm of a wood screw of that gauge: 0.060 + 0.013 n inches (ASME B18.6.1). */
export function woodScrewDiameterMm(gauge: number): number {
  return inchesToMm(0.06 + 0.013 * gauge);
}

/** The gauge whose screw comes nearest to a diameter in mm, for screws that are not made by number; 0 at the least. */
export function nearestGauge(diameterMm: number): number {
  return Math.max(0, Math.round((mmToInches(diameterMm) - 0.06) / 0.013));
}

/**
 * Largest head diameter and the head's height in mm of a flat-head screw; null for a gauge that the table does not
 * list.
 */
export function flatHeadMm(gauge: number): { readonly diameter: number; readonly height: number } | null {
  const inches = flatHeadInches.get(gauge);
  if (inches === undefined) return null;
  const diameter = inchesToMm(inches);
  // The head is a cone of 82°: its height is what the diameter grows by over twice the tangent of half the angle.
  const height = (diameter - woodScrewDiameterMm(gauge)) / (2 * Math.tan((41 * Math.PI) / 180));
  return { diameter, height };
}
