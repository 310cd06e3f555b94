import { expect, it } from "vitest";
import { romanNumber } from "@/features/share/model/roman.ts";

// Common practice, no source: subtractive figures before five and ten of each place.
it.each([
  [1, "I"],
  [4, "IV"],
  [9, "IX"],
  [14, "XIV"],
  [40, "XL"],
  [60, "LX"],
  [1994, "MCMXCIV"],
])("%i is %s", (value, figures) => {
  expect(romanNumber(value)).toBe(figures);
});

it.each([0, -3, 2.5, 4000, Number.NaN])("%d has no Roman figures", (value) => {
  expect(() => romanNumber(value)).toThrow(RangeError);
});
