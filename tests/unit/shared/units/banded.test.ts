import fc from "fast-check";
import { expect, it } from "vitest";
import { type Banded, bandHighest, bandLowest, bandSum, exactly } from "#shared/units/banded.ts";

const band = fc
  .tuple(fc.integer({ min: -500, max: 500 }), fc.integer({ min: 0, max: 50 }), fc.integer({ min: 0, max: 50 }))
  .map(([nominal, less, more]): Banded => ({ nominal, least: nominal - less, most: nominal + more }));
const isOrdered = ({ least, nominal, most }: Banded) => least <= nominal && nominal <= most;

it("bands stay in order when they are added or compared", () => {
  fc.assert(
    fc.property(fc.array(band, { minLength: 1, maxLength: 6 }), (bands) => {
      expect(isOrdered(bandSum(...bands))).toBe(true);
      for (const found of [bandHighest(bands), bandLowest(bands)]) expect(found && isOrdered(found)).toBe(true);
    }),
  );
});

it("a sum takes least to least and most to most", () => {
  expect(bandSum({ nominal: 3, least: 2.3, most: 3.7 }, exactly(20))).toEqual({ nominal: 23, least: 22.3, most: 23.7 });
});

it("of two things side by side, what lies on them lies on whichever came out higher", () => {
  const thick = { nominal: 5, least: 4.1, most: 5.9 };
  const exact = { nominal: 4.8, least: 4.8, most: 4.8 };
  expect(bandHighest([thick, exact])).toEqual({ nominal: 5, least: 4.8, most: 5.9 });
});

it("of nothing there is no highest and no lowest", () => {
  expect(bandHighest([])).toBeNull();
  expect(bandLowest([])).toBeNull();
});
