import { inchesToMm } from "../units/length.ts";
import { checked, distanceRange, type Outcome, type Range } from "../units/outcome.ts";

/** Bands of the table, by the baseline's height over the floor; inches. */
const bands = [
  { baselineUpTo: 70, from: 72, height: 0.625 },
  { baselineUpTo: 120, from: 180, height: 2 },
  { baselineUpTo: Number.POSITIVE_INFINITY, from: 252, height: 3 },
] as const;

/** Height added for each foot of distance beyond where a band's rise begins, inches. */
const addPerFoot = 0.125;
const inchesPerFoot = 12;

/** Baselines in mm: 40 in (703.5.6) up to 30 m. */
const baselineRange: Range = { least: inchesToMm(40), most: 30_000 };

/** A length just typed in from inches may miss a band's edge by its last digits. */
const hairMm = 1e-6;

/**
 * Least height in mm of a visual character, by the uppercase I: 2010 ADA Standards, table 703.5.5, from the baseline's
 * height over the floor and the horizontal viewing distance, both in mm. Between whole feet the height rises evenly,
 * which the table leaves open (our choice). An aid for the drawing, no statement that a sign complies.
 */
export function visualCharacterHeightMm(baseline: number, distance: number): Outcome<number> {
  return checked({ baseline: [baseline, baselineRange], distance: [distance, distanceRange] }, () => {
    const band = bands.find(({ baselineUpTo }) => baseline <= inchesToMm(baselineUpTo) + hairMm) ?? bands[2];
    const beyondFeet = Math.max(0, distance - inchesToMm(band.from)) / inchesToMm(inchesPerFoot);
    return inchesToMm(band.height + addPerFoot * beyondFeet);
  });
}
