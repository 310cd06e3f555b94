import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { flatHeadMm, woodScrewDiameterMm } from "#shared/materials/wood-screws.ts";
import { checkReference } from "../support/check-reference.ts";

// ANSI/ASME B18.6.1: basic diameter 0.060 + 0.013 n in; flat 82° head, largest diameter.
const screws = readFileSync(new URL("../fixtures/reference/wood-screws-asme.csv", import.meta.url), "utf8")
  .split("\n")
  .filter((line) => line && !line.startsWith("#"))
  .slice(1)
  .map((line) => {
    const [gauge = 0, , diameterMm = 0, , headInches = 0] = line.split(",").map(Number);
    return { gauge, diameterMm, headMm: headInches * 25.4 };
  });

it("the table has gauges 4 to 14", () => {
  expect(screws.map(({ gauge }) => gauge)).toEqual([4, 5, 6, 7, 8, 9, 10, 12, 14]);
});

it.each(screws)("No. $gauge is $diameterMm mm thick with a head of $headMm mm", ({ gauge, diameterMm, headMm }) => {
  const source = "ASME B18.6.1";
  const got = woodScrewDiameterMm(gauge);
  checkReference({ what: `No. ${gauge}, diameter, mm`, source, expected: diameterMm, got, within: 5e-5 });
  const head = flatHeadMm(gauge)?.diameter ?? Number.NaN;
  checkReference({ what: `No. ${gauge}, flat head, mm`, source, expected: headMm, got: head, within: 1e-9 });
});

// (7.0866 − 3.5052) / (2 tan 41°) = 2.06, calculated.
it("the head of a No. 6 is 2.06 mm high", () => {
  expect(flatHeadMm(6)?.height).toBeCloseTo(2.06, 2);
});

it("a gauge that the standard does not list has no head", () => {
  expect(flatHeadMm(3)).toBeNull();
});
