import { expect, it } from "vitest";
import { exactly } from "#shared/units/banded.ts";
import { formatBand } from "#shared/units/format-band.ts";

const band = { nominal: 33.5, least: 32.65, most: 34.35 };

it.each([
  { height: band, unit: "mm", wording: "nominal", text: "33.5" },
  { height: band, unit: "mm", wording: "with bands", text: "33.5 (32.65 to 34.35)" },
  // 32.65 / 25.4 = 1.2854, 34.35 / 25.4 = 1.3524 (calculated).
  { height: band, unit: "in", wording: "with bands", text: "1 5/16″ (1.285 to 1.352)" },
  { height: exactly(18), unit: "mm", wording: "with bands", text: "18" },
] as const)("$text", ({ height, unit, wording, text }) => {
  expect(formatBand(height, unit, wording)).toBe(text);
});
