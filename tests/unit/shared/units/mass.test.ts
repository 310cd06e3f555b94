import { expect, it } from "vitest";
import { formatMass, formatMassColumn, formatStatedMass } from "#shared/units/mass.ts";

it.each([
  { grams: 270, unit: "mm" as const, text: "0.27 kg" },
  { grams: 3440, unit: "mm" as const, text: "3.44 kg" },
  { grams: 10, unit: "mm" as const, text: "0.01 kg" },
  { grams: 9.96, unit: "mm" as const, text: "10 g" },
  { grams: 4.23, unit: "mm" as const, text: "4.2 g" },
  { grams: 0, unit: "mm" as const, text: "0 g" },
  { grams: 123_456, unit: "mm" as const, text: "123 kg" },
  { grams: 453.59237, unit: "in" as const, text: "1 lb" },
  { grams: 270, unit: "in" as const, text: "0.6 lb" },
  { grams: 4.25, unit: "in" as const, text: "0.15 oz" },
  { grams: Number.NaN, unit: "mm" as const, text: "–" },
])("$grams g read $text", ({ grams, unit, text }) => {
  expect(formatMass(grams, unit)).toBe(text);
});

it.each([
  { kg: 40, unit: "mm" as const, text: "40 kg" },
  { kg: 12.5, unit: "mm" as const, text: "12.5 kg" },
  { kg: 9.071847, unit: "in" as const, text: "20 lb" },
  { kg: Number.NaN, unit: "mm" as const, text: "–" },
])("$kg kg, as somebody stated it, read $text", ({ kg, unit, text }) => {
  expect(formatStatedMass(kg, unit)).toBe(text);
});

it.each([
  { grams: [1831, 283, 48], unit: "mm" as const, texts: ["1.83 kg", "0.28 kg", "0.05 kg"] },
  { grams: [2300, 4.23], unit: "mm" as const, texts: ["2.300 kg", "0.004 kg"] },
  { grams: [2300, 0.4, 0], unit: "mm" as const, texts: ["2.300 kg", "under 0.001 kg", "0.000 kg"] },
  { grams: [123_456, 0.01, Number.NaN], unit: "mm" as const, texts: ["123.456 kg", "under 0.001 kg", "–"] },
  { grams: [10, 0.6], unit: "mm" as const, texts: ["0.010 kg", "0.001 kg"] },
  { grams: [10], unit: "mm" as const, texts: ["0.01 kg"] },
  { grams: [0], unit: "mm" as const, texts: ["0.00 kg"] },
  { grams: [453.59237, 2.27], unit: "in" as const, texts: ["1.000 lb", "0.005 lb"] },
  { grams: [], unit: "mm" as const, texts: [] },
])("under one another $grams g read $texts", ({ grams, unit, texts }) => {
  expect(formatMassColumn(grams, unit)).toEqual(texts);
});
