import { type LengthUnit, mmToInches } from "./length.ts";

/** Under this it is told in mm². */
const smallMm2 = 100;

/** An area as a sentence says it: mm² when small, else cm² with one decimal, or square inches. */
export function formatArea(mm2: number, unit: LengthUnit): string {
  if (unit === "in") return `${trimmed(mmToInches(mmToInches(mm2)), 2)} in²`;
  return mm2 < smallMm2 ? `${trimmed(mm2, 1)} mm²` : `${trimmed(mm2 / 100, 1)} cm²`;
}

const trimmed = (value: number, decimals: number): string => String(Number(value.toFixed(decimals)));
