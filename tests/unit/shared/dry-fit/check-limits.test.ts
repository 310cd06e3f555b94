import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkLimits, limitOrders, ownLimits, readLimits } from "#shared/dry-fit/check-limits.ts";
import { describeLimit, limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import { defaultLimits, type Limits, limitsSchema } from "#shared/dry-fit/limits.ts";

const but = (changes: Partial<Record<keyof Limits, number | null>>) => ({ ...defaultLimits, ...changes });

describe("checking a set of limits", () => {
  it("finds nothing in the defaults", () => {
    expect(checkLimits(defaultLimits, "mm")).toEqual([]);
  });

  it.each([
    { key: "reachMm", value: null, unit: "mm", detail: "Fill this in." },
    { key: "reachMm", value: Number.NaN, unit: "mm", detail: "Write a number, like 2.5." },
    { key: "unsupportedCaution", value: 1.5, unit: "mm", detail: "From 0 % to 100 %." },
    { key: "unsupportedCaution", value: -0.01, unit: "mm", detail: "From 0 % to 100 %." },
    { key: "expansionPerK", value: 1, unit: "mm", detail: "From 0 µm per m and K to 1000 µm per m and K." },
    { key: "bedWidthMm", value: 0, unit: "mm", detail: "Over 0 mm, up to 10000 mm." },
    { key: "bedWidthMm", value: 20_000, unit: "in", detail: "Over 0″, up to 393 11/16″." },
    { key: "coverMm", value: -1, unit: "in", detail: "From 0.000″ to 393.701″." },
  ] as const)("says of $key at $value what it takes, in $unit", ({ key, value, unit, detail }) => {
    expect(checkLimits(but({ [key]: value }), unit)).toEqual([{ key, detail }]);
  });

  it("wants a caution no later than its stop, and says which that is", () => {
    expect(checkLimits(but({ unsupportedCaution: 0.3 }), "mm")).toEqual([]);
    expect(checkLimits(but({ unsupportedCaution: 0.31 }), "mm")).toEqual([
      { key: "unsupportedCaution", detail: "Not over 30 %, which is “Area off its support, for a stop”." },
    ]);
    expect(checkLimits(but({ colourCaution: 1.5 }), "mm")).toEqual([
      { key: "colourRemark", detail: "Not over 1.5 ΔE00, which is “Difference to the artwork, for a caution”." },
    ]);
  });

  it("reports every fault, and a pair only when both of it can be read", () => {
    const faults = checkLimits(but({ unsupportedCaution: 0.9, unsupportedStop: Number.NaN, coverMm: null }), "mm");
    expect(faults.map(({ key }) => key)).toEqual(["unsupportedStop", "coverMm"]);
  });

  it("agrees with the schema about every limit alone", () => {
    const figure = fc.oneof(fc.double(), fc.double({ min: -2, max: 2 }), fc.integer());
    fc.assert(
      fc.property(fc.constantFrom(...limitKeys), figure, (key, value) => {
        const inOrder = limitOrders.every((pair) => !pair.includes(key));
        const fine = checkLimits(but({ [key]: value }), "mm").length === 0;
        const taken = limitsSchema.safeParse({ [key]: value }).success;
        expect(fine).toBe(inOrder ? taken : taken && fine);
      }),
    );
  });
});

describe("reading the limits that a shop kept", () => {
  it("gives the defaults where nothing was kept", () => {
    expect(readLimits({})).toEqual(defaultLimits);
  });

  it("puts what was kept over the defaults", () => {
    expect(readLimits({ coverMm: 1.25, bedWidthMm: 1220 })).toEqual({
      ...defaultLimits,
      coverMm: 1.25,
      bedWidthMm: 1220,
    });
  });

  it("falls back to the default of what is no longer taken, and keeps the rest", () => {
    const kept = { coverMm: -3, placingErrorMm: "wide", reachMm: null, goneLimit: 7, bedHeightMm: 610 };
    expect(readLimits(kept)).toEqual({ ...defaultLimits, bedHeightMm: 610 });
  });

  it("falls back for both of a pair that crosses", () => {
    expect(readLimits({ unsupportedCaution: 0.6, coverMm: 2 })).toEqual({ ...defaultLimits, coverMm: 2 });
    expect(readLimits({ unsupportedCaution: 0.6, unsupportedStop: 0.7 })).toMatchObject({
      unsupportedCaution: 0.6,
      unsupportedStop: 0.7,
    });
  });

  it("never gives limits that would not be taken again, whatever was kept", () => {
    fc.assert(
      fc.property(fc.dictionary(fc.constantFrom(...limitKeys, "other"), fc.anything()), (kept) => {
        expect(checkLimits(readLimits(kept), "mm")).toEqual([]);
      }),
    );
  });

  it("gives back every set whose own part was kept", () => {
    const set = fc
      .record(
        Object.fromEntries(
          limitKeys.map((key) => {
            const { least, most } = describeLimit(key);
            return [key, fc.double({ min: least, max: most, noNaN: true })];
          }),
        ) as Record<keyof Limits, fc.Arbitrary<number>>,
      )
      .filter((limits) => checkLimits(limits, "mm").length === 0);
    fc.assert(
      fc.property(set, (limits) => {
        expect(readLimits(JSON.parse(JSON.stringify(ownLimits(limits))))).toEqual(JSON.parse(JSON.stringify(limits)));
      }),
      { numRuns: 50 },
    );
  });

  it("keeps only what differs from the defaults", () => {
    expect(ownLimits(defaultLimits)).toEqual({});
    expect(ownLimits({ ...defaultLimits, coverMm: 2, colourRemark: 2 })).toEqual({ coverMm: 2 });
  });
});
