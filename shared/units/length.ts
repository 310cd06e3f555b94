/** The unit a person reads lengths in. Everything is stored and computed in mm. */
export type LengthUnit = "mm" | "in";

/** Exactly, by the international agreement of 1959 (NIST SP 811). */
export const mmPerInch = 25.4;
/** Points of PDF's default user space (ISO 32000-1, 8.3.2.3). */
export const pointsPerInch = 72;

export const mmToInches = (mm: number): number => mm / mmPerInch;
export const inchesToMm = (inches: number): number => inches * mmPerInch;
export const mmToPt = (mm: number): number => (mm / mmPerInch) * pointsPerInch;
export const ptToMm = (points: number): number => (points / pointsPerInch) * mmPerInch;
