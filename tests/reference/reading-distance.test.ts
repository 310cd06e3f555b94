import { expect, it } from "vitest";
import { easeRatio, limitRatio, readingDistance } from "#shared/legibility/reading-distance.ts";
import { checkReference } from "../support/check-reference.ts";
import { referenceCsv, resultOf } from "../support/reference-data.ts";

const rows = referenceCsv("letter-height-distance.csv");
const ratioOf = (rule: string) => Number(rows.find((row) => row.rule === rule)?.ratio);

it("the limit is the MUTCD's of 2009, 1 in for 30 ft", () => {
  checkReference({
    what: "distance over height at the limit",
    source: "MUTCD 2009, 2A.13",
    expected: ratioOf("roadway word messages, minimum letter height"),
    got: limitRatio,
    within: 0,
  });
  const { limitMm } = resultOf(readingDistance(25.4));
  checkReference({
    what: "an inch at the limit, ft",
    source: "MUTCD 2009, 2A.13",
    expected: 30,
    got: limitMm / 304.8,
    within: 1e-9,
  });
});

it("ease is 1 in for 10 ft", () => {
  checkReference({
    what: "distance over height with ease",
    source: "common practice",
    expected: ratioOf("best impact"),
    got: easeRatio,
    within: 0,
  });
});

// Geometry: 20/20 sight resolves letters of 5 minutes of arc.
it("the limit lies inside what 20/20 sight can resolve and beyond 20/40", () => {
  const ratioFor = (minutes: number) => 1 / Math.tan((minutes / 60) * (Math.PI / 180));
  expect(limitRatio).toBeLessThan(ratioFor(5));
  expect(limitRatio).toBeGreaterThan(ratioFor(10));
});
