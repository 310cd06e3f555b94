import type { LengthUnit } from "./length.ts";

/** Exactly (NIST SP 811). */
export const gramsPerPound = 453.59237;

/**
 * A mass in words: "4.2 g" under 10 g, then "0.27 kg", from 100 kg without decimals; for shops that work in inches
 * "0.15 oz" under 10 g, then "0.6 lb". Something that is no number is an en dash.
 */
export function formatMass(grams: number, unit: LengthUnit): string {
  if (!Number.isFinite(grams)) return "–";
  const small = Math.abs(grams) < 10;
  if (unit === "in") {
    const pounds = grams / gramsPerPound;
    return small ? `${decimals(pounds * 16, 2)} oz` : `${decimals(pounds, Math.abs(pounds) < 100 ? 2 : 0)} lb`;
  }
  if (small) return `${decimals(grams, 1)} g`;
  return `${(grams / 1000).toFixed(Math.abs(grams) < 100_000 ? 2 : 0)} kg`;
}

/** A column says no mass finer than a tenth of a gram. */
const mostColumnPlaces = 4;

/**
 * Masses in words that stand under one another: all in kg, or in lb for shops that work in inches, with two decimals and more where
 * the smallest of them needs more to be seen: 2300 g and 4.23 g read "2.300 kg" and "0.004 kg". Something that is no number is an en dash.
 */
export function formatMassColumn(grams: readonly number[], unit: LengthUnit): string[] {
  const [perUnit, name] = unit === "in" ? [gramsPerPound, "lb"] : [1000, "kg"];
  const smallest = Math.min(...grams.filter((mass) => mass > 0)) / perUnit;
  const needed = Number.isFinite(smallest) ? Math.ceil(-Math.log10(smallest)) : 0;
  const places = Math.min(mostColumnPlaces, Math.max(2, needed));
  return grams.map((mass) => (Number.isFinite(mass) ? `${(mass / perUnit).toFixed(places)} ${name}` : "–"));
}

/** A mass that somebody stated in kilograms, with no more decimals than it has: "40 kg", "12.5 kg"; "88.18 lb" for shops that work in inches. */
export function formatStatedMass(kg: number, unit: LengthUnit): string {
  return unit === "mm" && Number.isFinite(kg) ? `${decimals(kg, 2)} kg` : formatMass(kg * 1000, unit);
}

function decimals(value: number, count: number): string {
  const rounded = Number(value.toFixed(count));
  return String(rounded === 0 ? 0 : rounded);
}
