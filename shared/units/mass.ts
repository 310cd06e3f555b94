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

/** Decimals of kg or lb in a column: no more are known of a mass that is worked out, and fewer hide a letter. */
const columnPlaces = { fewest: 2, most: 3 } as const;

/**
 * Masses in words that stand under one another: all in kg, or in lb for shops that work in inches, with two decimals, or three where the
 * lightest of them needs the third: 2300 g and 4.23 g read "2.300 kg" and "0.004 kg". What would still read as nothing is "under
 * 0.001 kg"; something that is no number is an en dash.
 */
export function formatMassColumn(grams: readonly number[], unit: LengthUnit): string[] {
  const [perUnit, name] = unit === "in" ? [gramsPerPound, "lb"] : [1000, "kg"];
  const isLight = grams.some((mass) => mass > 0 && mass / perUnit < 10 ** -columnPlaces.fewest);
  const places = isLight ? columnPlaces.most : columnPlaces.fewest;
  const least = 10 ** -places;
  return grams.map((mass) => {
    if (!Number.isFinite(mass)) return "–";
    const written = (mass / perUnit).toFixed(places);
    return mass > 0 && Number(written) === 0 ? `under ${least.toFixed(places)} ${name}` : `${written} ${name}`;
  });
}

/** A mass that somebody stated in kilograms, with no more decimals than it has: "40 kg", "12.5 kg"; "88.18 lb" for shops that work in inches. */
export function formatStatedMass(kg: number, unit: LengthUnit): string {
  return unit === "mm" && Number.isFinite(kg) ? `${decimals(kg, 2)} kg` : formatMass(kg * 1000, unit);
}

function decimals(value: number, count: number): string {
  const rounded = Number(value.toFixed(count));
  return String(rounded === 0 ? 0 : rounded);
}
