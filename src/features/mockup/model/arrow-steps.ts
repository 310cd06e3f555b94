import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";

/** By how much an arrow key can move what is chosen, mm; with Shift it is ten times as much. */
export function arrowSteps(unit: LengthUnit): readonly number[] {
  return unit === "mm" ? [0.1, 0.5, 1, 5, 10] : [1 / 64, 1 / 32, 1 / 16, 1 / 8, 1 / 4, 1 / 2, 1].map(inchesToMm);
}

export const usualArrowStep = (unit: LengthUnit): number => (unit === "mm" ? 1 : inchesToMm(1 / 16));

export const shiftTimes = 10;
