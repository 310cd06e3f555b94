import { checked, forceRange, lengthRange, type Outcome } from "../units/outcome.ts";
import { type Deflection, deflectionOf, sheetRanges } from "./deflection.ts";
import { rigidityNmm, type Sheet } from "./rigidity.ts";

/** A push by hand that a hanging panel should stand, N (our choice; the shop's to set). */
export const usualPushN = 100;

/** On four corner points: of a square (calculated by the Ritz method), and of a long strip (1/48 / (1 − ν²), ν 0.37). */
const squareFactor = 0.0391;
const stripFactor = 0.0242;

/**
 * How far a panel on four points gives way in mm when it is pushed in its middle with `force` N:
 * (P a²/D) · max(0.0391, 0.0242 a/b), with a the longer and b the shorter spacing in mm. Factors calculated; an upper
 * estimate between the square and the long strip.
 */
export function pushDeflection(
  sheet: Sheet,
  spacing: { readonly width: number; readonly height: number },
  force: number,
): Outcome<Deflection> {
  const { width, height } = spacing;
  return checked(
    {
      ...sheetRanges(sheet),
      width: [width, lengthRange],
      height: [height, lengthRange],
      force: [force, forceRange],
    },
    () => {
      const longer = Math.max(width, height);
      const shorter = Math.min(width, height);
      const factor = Math.max(squareFactor, (stripFactor * longer) / shorter);
      const mm = (factor * force * longer ** 2) / rigidityNmm(sheet);
      return deflectionOf(mm, sheet.thickness, width !== height);
    },
  );
}
