import { expect, it } from "vitest";
import { formatFigure } from "@/features/calculations/model/format-figure.ts";

it.each([
  { value: 6.5, text: "6.5" },
  { value: 312.5 / 75, text: "4.167" },
  { value: 17_432.4, text: "17432" },
  { value: -79.7751, text: "−79.78" },
  { value: 0.15000000000000002, text: "0.15" },
  { value: 0.00267, text: "0.00267" },
  { value: 0.00007, text: "7 · 10⁻⁵" },
  { value: -0.0000123456, text: "−1.235 · 10⁻⁵" },
  { value: 0, text: "0" },
  { value: -0, text: "0" },
  { value: 3e-15, text: "0" },
  { value: 999.96, text: "1000" },
  { value: "100 × 40", text: "100 × 40" },
])("prints $value as $text", ({ value, text }) => {
  expect(formatFigure(value)).toBe(text);
});
