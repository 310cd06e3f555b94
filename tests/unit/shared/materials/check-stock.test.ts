import { describe, expect, it } from "vitest";
import { checkScrew } from "#shared/materials/check-screw.ts";
import { checkSheets, checkThicknesses } from "#shared/materials/check-sheets.ts";
import { standardScrews } from "#shared/materials/standard-stock.ts";
import type { Screw } from "#shared/mockup/document.ts";

const screw: Screw = {
  name: "No. 6 × 16, flat head",
  gauge: 6,
  head: "flat",
  diameter: 3.5,
  length: 16,
  headDiameter: 7,
  headHeight: 2,
};
const fields = (one: Screw) => checkScrew(one, "mm").map(({ path }) => path.join("."));

describe("screws", () => {
  it.each(standardScrews)("$name is one", (one) => expect(checkScrew(one, "mm")).toEqual([]));
  it.each([
    { what: "longer than any that holds a sign", one: { ...screw, length: 301 }, at: "length" },
    { what: "thicker than any", one: { ...screw, gauge: null, diameter: 21, headDiameter: 30 }, at: "diameter" },
    { what: "of a number that is another thickness", one: { ...screw, gauge: 8 }, at: "diameter" },
    { what: "whose head is no wider than its shank", one: { ...screw, headDiameter: 3.5 }, at: "headDiameter" },
    { what: "flat and all head", one: { ...screw, length: 2 }, at: "headHeight" },
  ])("none is $what", ({ one, at }) => expect(fields(one)).toEqual([at]));
  it("may be without a number, and short when the head stands above", () => {
    expect(fields({ ...screw, gauge: null, diameter: 4.2 })).toEqual([]);
    expect(fields({ ...screw, head: "pan", length: 2 })).toEqual([]);
  });
});

describe("thicknesses", () => {
  it.each([
    { mm: [], at: [""] },
    { mm: [3, 4.5, 6], at: [] },
    { mm: [0.3, 150], at: [] },
    { mm: [0.2, 6, 151], at: ["0", "2"] },
    { mm: [3, 4.5, 3.0001], at: ["2"] },
  ])("$mm: wrong at $at", ({ mm, at }) => {
    expect(checkThicknesses(mm, "mm").map(({ path }) => path.join("."))).toEqual(at);
  });
});

describe("sheets on hand", () => {
  const whole = { thicknessMm: 3, widthMm: 1220, heightMm: 610, quantity: 2 };
  it("are of a thickness that is listed", () => {
    expect(checkSheets([whole, { ...whole, thicknessMm: 5 }], [3, 4.5], "mm")).toEqual([
      { path: [1, "thicknessMm"], detail: "5 mm is not among the thicknesses above." },
    ]);
  });
  it("stand there once, whichever way they lie", () => {
    const turned = { ...whole, widthMm: 610, heightMm: 1220, quantity: null };
    expect(checkSheets([whole, turned], [3], "mm").map(({ path }) => path)).toEqual([[1, "widthMm"]]);
    expect(checkSheets([whole, { ...turned, thicknessMm: 4.5 }], [3, 4.5], "mm")).toEqual([]);
  });
});
