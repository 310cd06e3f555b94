import fc from "fast-check";
import { expect, it } from "vitest";
import { largestScale, preferredScales } from "#shared/units/scales.ts";

// ISO 5455:1979: 50:1 20:1 10:1 5:1 2:1, 1:1, and 1:2 1:5 1:10 and their tenfolds. From memory. 1:4 and 1:8: common
// practice in inches.
it("the preferred scales are those of ISO 5455, with 1:4 and 1:8 for inches", () => {
  const names = (unit: "mm" | "in") => preferredScales(unit).map(({ name }) => name);
  expect(names("mm").slice(0, 9)).toEqual(["50:1", "20:1", "10:1", "5:1", "2:1", "1:1", "1:2", "1:5", "1:10"]);
  expect(names("in").slice(5, 11)).toEqual(["1:1", "1:2", "1:4", "1:5", "1:8", "1:10"]);
});

const space = { widthMm: 390, heightMm: 200 };
it.each([
  { thing: { widthMm: 600, heightMm: 400 }, unit: "mm" as const, name: "1:2" },
  { thing: { widthMm: 780, heightMm: 400 }, unit: "mm" as const, name: "1:2" },
  { thing: { widthMm: 780.1, heightMm: 400 }, unit: "mm" as const, name: "1:5" },
  { thing: { widthMm: 780.1, heightMm: 400 }, unit: "in" as const, name: "1:4" },
  { thing: { widthMm: 200, heightMm: 400.1 }, unit: "mm" as const, name: "1:5" },
  { thing: { widthMm: 60, heightMm: 30 }, unit: "mm" as const, name: "5:1" },
  { thing: { widthMm: 10_000, heightMm: 10_000 }, unit: "mm" as const, name: "1:50" },
])("$thing on 390 by 200 mm is drawn at $name in $unit", ({ thing, unit, name }) => {
  expect(largestScale(thing, space, { unit })?.name).toBe(name);
});

it("a cap keeps a small sign at full size", () => {
  expect(largestScale({ widthMm: 60, heightMm: 30 }, space, { unit: "mm", largest: 1 })?.name).toBe("1:1");
});

it("nothing, and what is too large for 1:1000, has no scale", () => {
  expect(largestScale({ widthMm: 0, heightMm: 30 }, space, { unit: "mm" })).toBeNull();
  expect(largestScale({ widthMm: Number.NaN, heightMm: 30 }, space, { unit: "mm" })).toBeNull();
  expect(largestScale({ widthMm: 400_000, heightMm: 30 }, space, { unit: "mm" })).toBeNull();
});

it("the scale that is found fits, and the next larger one does not", () => {
  const side = fc.integer({ min: 1, max: 10_000 });
  fc.assert(
    fc.property(side, side, (widthMm, heightMm) => {
      const scales = preferredScales("mm");
      const found = largestScale({ widthMm, heightMm }, space, { unit: "mm" });
      const index = scales.findIndex(({ name }) => name === found?.name);
      const fits = (factor: number) => widthMm * factor <= 390 + 1e-6 && heightMm * factor <= 200 + 1e-6;
      expect(fits(found?.factor ?? 0)).toBe(true);
      const larger = scales[index - 1];
      if (larger) expect(fits(larger.factor)).toBe(false);
    }),
  );
});
