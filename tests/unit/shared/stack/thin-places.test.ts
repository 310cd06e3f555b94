import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import { thinGaps, thinnestWidth, thinPlaces } from "#shared/stack/thin-places.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const bar = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));
const joined = (...regions: Region[]): Region => kernel.union(regions.flat(), "nonzero");
/** Two blocks of 10 by 10 with a neck of that width and 8 long between them. */
const dumbbell = (neck: number): Region =>
  joined(bar(0, 0, 10, 10), bar(10, 5 - neck / 2, 8, neck), bar(18, 0, 10, 10));
/** An isosceles triangle with that angle at its tip, 40 long. */
const tip = (degrees: number): Region => {
  const half = 40 * Math.tan((degrees * Math.PI) / 360);
  return [
    [
      { x: 0, y: -half },
      { x: 40, y: 0 },
      { x: 0, y: half },
    ],
  ];
};

// Limits as measured in the project's study of the method: bars of 1.99 mm are found at 2 mm, necks of 1.98, corners
// from 45° never, tips of 30° and less always.
describe("a stroke of 2 mm", () => {
  it.each([
    { name: "a bar of 1.9", region: () => bar(0, 0, 40, 1.9), found: 1 },
    { name: "a bar of 1.98", region: () => bar(0, 0, 40, 1.98), found: 1 },
    { name: "a bar of 2", region: () => bar(0, 0, 40, 2), found: 0 },
    { name: "a neck of 1.95", region: () => dumbbell(1.95), found: 1 },
    { name: "a neck of 2.02", region: () => dumbbell(2.02), found: 0 },
    { name: "a square", region: () => bar(0, 0, 20, 20), found: 0 },
    { name: "a disc", region: () => flattenPath(circlePath({ x: 0, y: 0 }, 10)), found: 0 },
    { name: "a tip of 60°", region: () => tip(60), found: 0 },
    { name: "a tip of 20°", region: () => tip(20), found: 1 },
    {
      name: "a ring 1.5 wide",
      region: () => [...flattenPath(circlePath({ x: 0, y: 0 }, 20)), ...flattenPath(circlePath({ x: 0, y: 0 }, 18.5))],
      found: 1,
    },
    { name: "nothing", region: () => [], found: 0 },
  ])("is not reached by $name: $found places", ({ region, found }) => {
    expect(thinPlaces(region(), 2, kernel)).toHaveLength(found);
  });

  it("is missed at the neck, and the place says so", () => {
    const [place] = thinPlaces(dumbbell(1), 2, kernel);
    expect(place?.where.x).toBeCloseTo(14, 1);
    expect(place?.where.y).toBeCloseTo(5, 1);
  });

  it("of no width is never missed", () => {
    expect(thinPlaces(bar(0, 0, 1, 1), 0, kernel)).toEqual([]);
    expect(thinPlaces(bar(0, 0, 1, 1), Number.NaN, kernel)).toEqual([]);
  });
});

describe("a gap", () => {
  it.each([
    { gap: 1.4, found: 1 },
    { gap: 1.6, found: 0 },
  ])("of $gap mm between two bars is found $found times at 1.5 mm", ({ gap, found }) => {
    const bars = joined(bar(0, 0, 30, 10), bar(0, 10 + gap, 30, 10), bar(0, 0, 5, 20 + gap));
    expect(thinGaps(bars, 1.5, kernel)).toHaveLength(found);
  });

  it("is not found round a shape that stands alone", () => {
    expect(thinGaps(bar(0, 0, 30, 10), 1.5, kernel)).toEqual([]);
    expect(thinGaps([], 1.5, kernel)).toEqual([]);
  });
});

describe("the thinnest width", () => {
  it.each([0.5, 1.2, 1.8])("of a neck of %f mm is measured to 0.05 mm", (neck) => {
    const found = thinnestWidth(dumbbell(neck), 3, kernel);
    expect(Math.abs((found?.widthMm ?? 0) - neck)).toBeLessThanOrEqual(0.05);
    expect(found?.where.x).toBeCloseTo(14, 0);
  });

  it("is null over the limit, and 0 where the shape runs out", () => {
    expect(thinnestWidth(dumbbell(4), 3, kernel)).toBeNull();
    expect(thinnestWidth(tip(15), 2, kernel)?.widthMm).toBeLessThan(0.1);
  });
});
