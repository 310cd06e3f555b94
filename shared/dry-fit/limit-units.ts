import { formatFine, formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";

/** Figures that are no lengths: what stands after them, and how many of it make one of what is stored. */
export const figureUnits = {
  percent: { suffix: "%", perStored: 100 },
  expansion: { suffix: "µm per m and K", perStored: 1e6 },
  kelvin: { suffix: "K", perStored: 1 },
  points: { suffix: "points", perStored: 1 },
  diameters: { suffix: "diameters", perStored: 1 },
  thicknesses: { suffix: "thicknesses", perStored: 1 },
  "colour difference": { suffix: "ΔE00", perStored: 1 },
  degrees: { suffix: "°", perStored: 1 },
  newtons: { suffix: "N", perStored: 1 },
  kilograms: { suffix: "kg", perStored: 1 },
  "to one": { suffix: ": 1", perStored: 1 },
  number: { suffix: "", perStored: 1 },
} as const;

export type FigureUnit = keyof typeof figureUnits;
/** Lengths are in mm; a small one is shown finer than a sixteenth of an inch. */
export type LimitUnit = "length" | "small length" | FigureUnit;

export const isLength = (unit: LimitUnit): unit is "length" | "small length" =>
  unit === "length" || unit === "small length";

/** A stored limit as the figure that people read and write: 0.1 as 10 when it is shown in percent. */
export const shownFigure = (stored: number, unit: FigureUnit): number => tidy(stored * figureUnits[unit].perStored);

/** What `shownFigure` shows, back. */
export const storedFigure = (shown: number, unit: FigureUnit): number => tidy(shown / figureUnits[unit].perStored);

/** A limit with its unit, as 10 %, 0.5 mm or 0.020″. */
export function formatLimit(stored: number, unit: LimitUnit, lengthUnit: LengthUnit): string {
  if (unit === "length") return formatLengthWithUnit(stored, lengthUnit);
  if (unit === "small length") return formatFine(stored, lengthUnit);
  const { suffix } = figureUnits[unit];
  const joined = suffix === "°" ? suffix : ` ${suffix}`;
  return `${shownFigure(stored, unit)}${suffix === "" ? "" : joined}`;
}

/** Without what binary adds in the sixteenth digit: 0.07 · 100 is 7, and 48 inches are 1219.2 mm. */
export function tidy(value: number): number {
  return Number(value.toPrecision(12));
}
