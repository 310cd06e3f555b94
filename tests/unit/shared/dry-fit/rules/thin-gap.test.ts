import { describe, expect, it } from "vitest";
import { thinGap } from "#shared/dry-fit/rules/thin-gap.ts";
import type { Path } from "#shared/geometry/path.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { buildLayer, buildPiece, buildSign, disc, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const polygon = (...[first, ...rest]: [number, number][]): Path => {
  const [x, y] = first ?? [0, 0];
  return [{ start: { x, y }, segments: rest.map(([toX, toY]) => ({ kind: "line", to: { x: toX, y: toY } })) }];
};
/** A square of 40 mm with a slot of that width, 25 mm deep, from the middle of its upper side down. */
const slotted = (width: number): Path =>
  polygon(
    [-20, -20],
    [-width / 2, -20],
    [-width / 2, 5],
    [width / 2, 5],
    [width / 2, -20],
    [20, -20],
    [20, 20],
    [-20, 20],
  );
/** The same with a notch that comes to a point, as wide as stated at the upper side. */
const notched = (width: number, depth: number): Path =>
  polygon([-20, -20], [-width / 2, -20], [0, -20 + depth], [width / 2, -20], [20, -20], [20, 20], [-20, 20]);
const signOf = (...paths: Path[]) =>
  buildSign([
    buildLayer(
      "B",
      paths.map((path, index) => buildPiece(`p${index}`, path, { at: [100 + 60 * index, 200], name: `P${index}` })),
    ),
  ]);

it.each([
  { width: 1.3, count: 1 },
  { width: 1.5, count: 0 },
  { width: 1.7, count: 0 },
])("a slot of $width mm: $count", async ({ width, count }) => {
  const findings = await findingsOf(thinGap, signOf(slotted(width)));
  expect(findings).toHaveLength(count);
  for (const { value, ...finding } of findings) {
    expect(finding).toMatchObject({ rule: 4, severity: "caution", layerKey: "B", pieceIds: ["p0"], limit: 1.5 });
    expect(Math.abs((value ?? 0) - width)).toBeLessThanOrEqual(0.03);
    expect(finding.where?.x).toBeCloseTo(100, 1);
  }
});

describe("a notch that comes to a point", () => {
  it("is a corner when it opens soon: 20° are under 1.5 mm for 4.3 mm", async () => {
    expect(await findingsOf(thinGap, signOf(notched(4, 11.34)))).toEqual([]);
  });

  it("is a corner at 30° too, where the mitre takes most of it", async () => {
    expect(await findingsOf(thinGap, signOf(notched(8, 14.93)))).toEqual([]);
  });

  it("is a gap when it is a short slit", async () => {
    expect(await findingsOf(thinGap, signOf(slotted(0.2)))).toHaveLength(1);
    const slit = rectanglePath({ x: -20, y: -20, width: 40, height: 40 });
    const inside = rectanglePath({ x: -2, y: 0, width: 4, height: 0.3 });
    expect(await findingsOf(thinGap, signOf([...slit, ...inside]))).toHaveLength(1);
  });

  it("is a gap when it does not: 6° are under 1.5 mm for 14.3 mm", async () => {
    expect(await findingsOf(thinGap, signOf(notched(2, 19.08)))).toMatchObject([{ severity: "caution" }]);
  });

  it("does not hide the slot beside it", async () => {
    const both = polygon(
      [-20, -20],
      [-12, -20],
      [-10, -8.66],
      [-8, -20],
      [4, -20],
      [4, 5],
      [5, 5],
      [5, -20],
      [20, -20],
      [20, 20],
      [-20, 20],
    );
    const [finding] = await findingsOf(thinGap, signOf(both));
    expect(finding?.value).toBeGreaterThan(0.96);
    expect(finding?.value).toBeLessThan(1.02);
    expect(finding?.where?.x).toBeCloseTo(104.5, 1);
  });
});

it("pieces of one layer are one finding, by the narrowest of their gaps", async () => {
  const findings = await findingsOf(thinGap, signOf(slotted(1.2), slotted(0.8), slotted(3), slotted(1)));
  expect(findings).toMatchObject([{ pieceIds: ["p1", "p3", "p0"], layerKey: "B" }]);
  expect(findings[0]?.value).toBeCloseTo(0.8, 1);
  expect(findings[0]?.text).toMatch(
    /^3 pieces of B, Layer B \(P1, P3, P0\) have gaps; the narrowest is 0\.\d+ mm wide/,
  );
});

it("the gap between two parts of one piece counts, that between two pieces does not", async () => {
  const parts = [
    ...rectanglePath({ x: -20, y: -10, width: 20, height: 20 }),
    ...rectanglePath({ x: 0.8, y: -10, width: 20, height: 20 }),
  ];
  expect(await findingsOf(thinGap, signOf(parts))).toMatchObject([{ pieceIds: ["p0"] }]);
  const two = [plate("a", 20, 20, [100, 200]), plate("b", 20, 20, [120.8, 200])];
  expect(await findingsOf(thinGap, buildSign([buildLayer("B", two)]))).toEqual([]);
});

it("the shop's own limit counts; a disc, a piece of nothing and a crossed outline are taken as they come", async () => {
  expect(await findingsOf(thinGap, signOf(slotted(2)), { limits: { gapMm: 2.5 } })).toMatchObject([{ limit: 2.5 }]);
  expect(await findingsOf(thinGap, signOf(slotted(1)), { limits: { gapMm: 0 } })).toEqual([]);
  const odd = [
    disc("d", 10, [50, 50]),
    buildPiece("none", [], { at: [100, 50] }),
    buildPiece("crossed", polygon([-10, -10], [10, 10], [10, -10], [-10, 10]), { at: [150, 50] }),
  ];
  expect(await findingsOf(thinGap, buildSign([buildLayer("B", odd)]))).toEqual([]);
});
