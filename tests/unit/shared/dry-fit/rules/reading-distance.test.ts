import { expect, it } from "vitest";
import { readingDistance } from "#shared/dry-fit/rules/reading-distance.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const seenFrom = (letterMm: number, distance: number, reads = "H"): MockupDocument => {
  const sign = buildSign([buildLayer("B", [plate("l", 20, letterMm, [300, 200], { reads })])]);
  return { ...sign, presentation: { ...sign.presentation, viewingDistance: distance } };
};

// 120 : 1 is ease (common practice), 360 : 1 the limit (MUTCD 2009, section 2A.13: 1 in for 30 ft).
it.each([
  { letterMm: 25.4, distance: 3048, severity: null, what: "1 in from 10 ft" },
  { letterMm: 25.4, distance: 3050, severity: "remark", what: "1 in from a little more" },
  { letterMm: 25.4, distance: 9144, severity: "remark", what: "1 in from 30 ft" },
  { letterMm: 25.4, distance: 9146, severity: "caution", what: "1 in from more than 30 ft" },
])("$what: $severity", async ({ letterMm, distance, severity }) => {
  const findings = await findingsOf(readingDistance, seenFrom(letterMm, distance));
  expect(findings.map((finding) => finding.severity)).toEqual(severity === null ? [] : [severity]);
});

it("says what would do, and where the letter is", async () => {
  const [finding] = await findingsOf(readingDistance, seenFrom(20, 12_000));
  expect(finding).toMatchObject({
    rule: 24,
    layerKey: "B",
    pieceIds: ["l"],
    where: { x: 300, y: 200 },
    value: 20,
    unit: "mm",
  });
  expect(finding?.limit).toBeCloseTo(12_000 / 360, 9);
  const [inches] = await findingsOf(readingDistance, seenFrom(20, 12_192), { context: { unit: "in" } });
  expect(inches?.text).toContain("from 40 ft");
});

it("small letters without an ascender do not count beside capitals, nor do commas", async () => {
  const sign = buildSign([
    buildLayer("B", [
      plate("H", 20, 30, [100, 200], { reads: "H" }),
      plate("a", 20, 15, [140, 200], { reads: "a" }),
      plate(",", 5, 6, [160, 215], { reads: "," }),
    ]),
  ]);
  expect(await findingsOf(readingDistance, sign)).toEqual([]);
});

it("what reads nothing has no letter height", async () => {
  expect(await findingsOf(readingDistance, seenFrom(2, 100_000, ""))).toEqual([]);
});

it("a letter on its side is as tall as it is long", async () => {
  const sign = seenFrom(25.4, 3000);
  const [layer] = sign.layers;
  const [piece] = layer?.pieces ?? [];
  if (!layer || !piece) throw new Error("There is no letter.");
  const turned = { ...piece, placement: { ...piece.placement, turn: 90 } };
  expect(await findingsOf(readingDistance, { ...sign, layers: [{ ...layer, pieces: [turned] }] })).toEqual([]);
});
