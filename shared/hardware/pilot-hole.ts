import { inchesToMm, type LengthUnit } from "../units/length.ts";
import { checked, lengthRange, type Outcome } from "../units/outcome.ts";

/** Share of the thread's root diameter (Wood Handbook, GTR-282, chapter 8; National Design Specification before 1962). */
const shareOfRoot = { softwood: 0.7, hardwood: 0.9 } as const;

/**
 * Diameter in mm of the hole drilled ahead of a wood screw in withdrawal: 70 % of its root diameter in softwood, 90 % in
 * hardwood (Wood Handbook, GTR-282, chapter 8). Charts of shops differ from it by up to 1/32 in.
 */
export function pilotHoleMm(rootDiameter: number, hardness: "softwood" | "hardwood"): Outcome<number> {
  return checked({ rootDiameter: [rootDiameter, lengthRange] }, () => shareOfRoot[hardness] * rootDiameter);
}

/**
 * The drill in mm that comes nearest to a diameter in mm: whole 64ths of an inch, or tenths of a mm. One step at least.
 */
export function nearestDrillMm(diameter: number, unit: LengthUnit): Outcome<number> {
  return checked({ diameter: [diameter, lengthRange] }, () => {
    const step = unit === "in" ? inchesToMm(1 / 64) : 0.1;
    const steps = Math.max(1, Math.round(diameter / step));
    // Tenths are divided by ten, not multiplied by a tenth, so that 2.3 comes out as 2.3.
    return unit === "in" ? inchesToMm(steps / 64) : steps / 10;
  });
}
