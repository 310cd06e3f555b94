import { describe, expect, it } from "vitest";
import { checkSaws, ownSaws, readSaws, sawFields } from "#shared/cut-plan/saw-fields.ts";
import { shopSawsSchema, usualSaws } from "#shared/cut-plan/shop-saws.ts";

describe("how a shop cuts, field by field", () => {
  it("has every figure once", () => {
    expect(sawFields.map(({ key }) => key).toSorted()).toEqual(Object.keys(shopSawsSchema.shape).toSorted());
  });

  it("finds nothing wrong with the defaults", () => {
    expect(checkSaws(usualSaws, "mm")).toEqual([]);
  });

  it("says what would be right, in the shop's unit", () => {
    const written = { ...usualSaws, sheetMarginMm: null, sawKerfMm: Number.NaN, rejectShare: 0.95, barLengthMm: 0 };
    expect(checkSaws(written, "mm")).toEqual([
      { key: "sheetMarginMm", detail: "Fill this in." },
      { key: "barLengthMm", detail: "Over 0 mm, up to 10000 mm." },
      { key: "sawKerfMm", detail: "Write a number, like 2.5." },
      { key: "rejectShare", detail: "From 0 % to 90 %." },
    ]);
    expect(checkSaws({ ...usualSaws, sheetMarginMm: 254 }, "in")).toEqual([
      { key: "sheetMarginMm", detail: "From 0″ to 3 15/16″." },
    ]);
  });

  it("keeps only what differs, and lets what is no longer taken fall back by itself", () => {
    expect(ownSaws({ ...usualSaws, squaringMm: 14 })).toEqual({ squaringMm: 14 });
    expect(readSaws({ squaringMm: 14, sawKerfMm: -3, luck: 7 })).toEqual({ ...usualSaws, squaringMm: 14 });
  });
});
