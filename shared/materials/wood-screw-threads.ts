import { inchesToMm } from "../units/length.ts";

/** Root diameter in inches by gauge (ANSI/AWC National Design Specification, appendix L, table L3; from memory). */
const rootInches: ReadonlyMap<number, number> = new Map([
  [6, 0.113],
  [7, 0.122],
  [8, 0.131],
  [9, 0.142],
  [10, 0.152],
  [12, 0.171],
  [14, 0.196],
]);

/** Root diameter in mm of a wood screw's thread; null for a gauge that the table does not list. */
export function rootDiameterMm(gauge: number): number | null {
  const inches = rootInches.get(gauge);
  return inches === undefined ? null : inchesToMm(inches);
}

/** How much of a wood screw's length carries thread (common practice, assumed by the National Design Specification). */
export const threadedShare = 2 / 3;
