import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { measureSupport, unsupportedPart } from "#shared/bonds/support.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const box = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));

describe("a piece of 100 by 20", () => {
  const piece = box(0, 0, 100, 20);

  it("that lies on its support all over hangs over nowhere", () => {
    expect(measureSupport(piece, box(-10, -10, 200, 200), kernel)).toEqual({
      overlapMm2: 2000,
      unsupportedShare: 0,
      reachMm: 0,
      where: null,
      unsupported: [],
    });
  });

  it("that hangs a quarter over reaches 25 mm", () => {
    const { overlapMm2, unsupportedShare, reachMm, where } = measureSupport(piece, box(0, 0, 75, 20), kernel);
    expect(overlapMm2).toBeCloseTo(1500, 6);
    expect(unsupportedShare).toBeCloseTo(0.25, 6);
    expect(Math.abs((reachMm ?? 0) - 25)).toBeLessThanOrEqual(0.06);
    expect(where?.x).toBeGreaterThan(99);
  });

  it("that almost meets a second support reaches no less for it", () => {
    const { reachMm } = measureSupport(piece, [...box(0, 0, 75, 20), ...box(101, 0, 75, 20)], kernel);
    expect(Math.abs((reachMm ?? 0) - 25)).toBeLessThanOrEqual(0.06);
  });

  it("that bridges two supports reaches to the middle of the bridge", () => {
    const ends = [...box(0, 0, 20, 20), ...box(80, 0, 20, 20)];
    const { unsupportedShare, reachMm, where } = measureSupport(piece, ends, kernel);
    expect(unsupportedShare).toBeCloseTo(0.6, 6);
    expect(Math.abs((reachMm ?? 0) - 30)).toBeLessThanOrEqual(0.06);
    expect(where?.x).toBeCloseTo(50, 0);
  });

  it("that lies on nothing has no reach, and all of it hangs", () => {
    const support = measureSupport(piece, [], kernel);
    expect(support).toMatchObject({ overlapMm2: 0, unsupportedShare: 1, reachMm: null });
    expect(support.where?.x).toBeCloseTo(50, 6);
  });

  it("is carried when it hangs over by a hair only", () => {
    expect(unsupportedPart(piece, box(0, 0, 99.95, 20), kernel)).toEqual([]);
    expect(unsupportedPart(piece, box(0, 0, 99.9, 20), kernel)).toHaveLength(1);
  });
});

it("nothing lies on nothing without a figure that is no number", () => {
  expect(measureSupport([], [], kernel)).toEqual({
    overlapMm2: 0,
    unsupportedShare: 0,
    reachMm: null,
    where: null,
    unsupported: [],
  });
});

it("a disc on a strip of half its width reaches a quarter of its diameter over", () => {
  const disc = flattenPath(circlePath({ x: 0, y: 0 }, 20));
  const { reachMm } = measureSupport(disc, box(-10, -50, 20, 100), kernel);
  expect(Math.abs((reachMm ?? 0) - 10)).toBeLessThanOrEqual(0.08);
});

it("what lies on and what hangs over make up the piece", () => {
  const at = fc.integer({ min: -120, max: 120 });
  const side = fc.integer({ min: 1, max: 120 });
  fc.assert(
    fc.property(at, at, side, side, (x, y, width, height) => {
      const { overlapMm2, unsupportedShare, reachMm } = measureSupport(
        box(0, 0, 100, 20),
        box(x, y, width, height),
        kernel,
      );
      expect(overlapMm2 / 2000 + unsupportedShare).toBeCloseTo(1, 6);
      // No point of the piece is farther from what carries it than its diagonal.
      if (reachMm !== null) expect(reachMm).toBeLessThanOrEqual(Math.hypot(100, 20));
    }),
    { numRuns: 60 },
  );
});
