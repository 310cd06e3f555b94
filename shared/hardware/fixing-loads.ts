import type { Point } from "../geometry/path.ts";
import { checked, forceRange, lengthRange, type Outcome, spanRange } from "../units/outcome.ts";

/** Standard gravity in m/s² (NIST SP 811). */
const standardGravity = 9.80665;

/** Weight in N of a mass in grams. */
export const weightN = (massG: number): number => (massG / 1000) * standardGravity;

export type FixingRows = {
  readonly fixings: number;
  /** Fixings in the uppermost row, which the panel pulls at. */
  readonly upper: number;
  /** From the uppermost row down to the lowest fixing, mm; half the barrel's diameter when there is but one row. */
  readonly apart: number;
};

/**
 * How fixings stand above each other; null for none. What lies within half a barrel of the uppermost one counts as its
 * row (our choice).
 */
export function fixingRows(places: readonly Point[], barrelDiameter: number): FixingRows | null {
  if (places.length === 0) return null;
  const top = places.reduce((least, { y }) => Math.min(least, y), Number.POSITIVE_INFINITY);
  const bottom = places.reduce((most, { y }) => Math.max(most, y), Number.NEGATIVE_INFINITY);
  const upper = places.filter(({ y }) => y - top <= barrelDiameter / 2).length;
  // In one row the panel turns about the barrels' lower edge.
  const apart = Math.max(bottom - top, barrelDiameter / 2);
  return { fixings: places.length, upper, apart };
}

export type FixingLoads = {
  /** Across each screw, N. */
  readonly shearN: number;
  /** Along each screw of the upper row, N. */
  readonly withdrawalN: number;
};

/**
 * What a hanging panel asks of its fixings: shear W/n on each; withdrawal W·e/(h·n upper) on each of the upper row, with
 * the centroid e mm off the backer's face and the rows h mm apart. Statics of a panel that turns about its lowest row;
 * the rows between are left out, which is on the safe side.
 */
export function fixingLoads(panel: {
  readonly weightN: number;
  /** From the backer's face to the panel's centroid, mm. */
  readonly centroidOff: number;
  readonly rows: FixingRows;
}): Outcome<FixingLoads> {
  const { weightN, centroidOff, rows } = panel;
  return checked(
    {
      weightN: [weightN, forceRange],
      centroidOff: [centroidOff, spanRange],
      fixings: [rows.fixings, { least: 1, most: 1000 }],
      upper: [rows.upper, { least: 1, most: rows.fixings }],
      apart: [rows.apart, lengthRange],
    },
    () => ({
      shearN: weightN / rows.fixings,
      withdrawalN: (weightN * centroidOff) / (rows.apart * rows.upper),
    }),
  );
}

/** Share of what a fixing may carry that a load takes up, both in N; more than 1 is too much. */
export function usedShare(loadN: number, allowableN: number): Outcome<number> {
  return checked(
    { loadN: [loadN, { least: 0, most: 1e9 }], allowableN: [allowableN, { least: 1e-3, most: 1e9 }] },
    () => loadN / allowableN,
  );
}
