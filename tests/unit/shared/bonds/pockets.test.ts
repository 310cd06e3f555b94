import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { movementMismatchMm } from "#shared/bonds/movement-mismatch.ts";
import { bindingCorners, pocketGapMm } from "#shared/bonds/pocket-fit.ts";
import { pocketFloor } from "#shared/bonds/pocket-floor.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";
import { sheetBand } from "#shared/materials/sheet-tolerance.ts";
import { exactly } from "#shared/units/banded.ts";
import { resultOf } from "../../../support/reference-data.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

// Arithmetic: 6 mm cast may be 5 mm thin (ISO 7823-1), a cut of 2 may be 2.2 deep, a third of 6 is 2.
describe("the floor of a pocket", () => {
  it.each([
    { cut: sheetBand("cast", 6), depth: 2, floor: 2.8, needed: 2, holds: true },
    { cut: sheetBand("cast", 6), depth: 2.8, floor: 2, needed: 2, holds: true },
    { cut: sheetBand("cast", 6), depth: 2.9, floor: 1.9, needed: 2, holds: false },
    { cut: exactly(18), depth: 11.8, floor: 6, needed: 6, holds: true },
    { cut: exactly(18), depth: 20, floor: -2.2, needed: 6, holds: false },
  ])("under $depth mm leaves $floor of $needed: $holds", ({ cut, depth, floor, needed, holds }) => {
    const got = resultOf(pocketFloor(cut, depth));
    expect(got.floorMm).toBeCloseTo(floor, 9);
    expect(got.neededMm).toBeCloseTo(needed, 9);
    expect(got.holds).toBe(holds);
  });
});

describe("the gap round a piece in its pocket", () => {
  it.each([
    { clearance: 0.1, pieceKerf: 0.2, pocketKerf: 0, gap: 0.2, verdict: "fits" },
    { clearance: 0, pieceKerf: 0.1, pocketKerf: 0, gap: 0.05, verdict: "fits" },
    { clearance: 0, pieceKerf: 0.08, pocketKerf: 0, gap: 0.04, verdict: "tight" },
    { clearance: 0.15, pieceKerf: 0.2, pocketKerf: 0, gap: 0.25, verdict: "fits" },
    { clearance: 0.15, pieceKerf: 0.2, pocketKerf: 0.2, gap: 0.35, verdict: "loose" },
  ])("$clearance with kerfs $pieceKerf and $pocketKerf is $gap: $verdict", ({ gap, verdict, ...fit }) => {
    const got = resultOf(pocketGapMm(fit));
    expect(got.gapMm).toBeCloseTo(gap, 9);
    expect(got.verdict).toBe(verdict);
  });
});

describe("corners that a round bit does not reach", () => {
  const square: Region = flattenPath(rectanglePath({ x: 0, y: 0, width: 40, height: 30 }));
  it("are the four of a rectangle, at the corners", () => {
    const corners = bindingCorners(square, 0.1, 1.5, kernel);
    expect(corners).toHaveLength(4);
    for (const { x, y } of corners) {
      expect(Math.min(Math.abs(x), Math.abs(x - 40))).toBeLessThan(0.5);
      expect(Math.min(Math.abs(y), Math.abs(y - 30))).toBeLessThan(0.5);
    }
  });

  it.each([
    {
      name: "rounded by the bit's radius",
      piece: flattenPath(roundedRectanglePath({ x: 0, y: 0, width: 40, height: 30 }, 1.5)),
      count: 0,
    },
    {
      name: "rounded by less",
      piece: flattenPath(roundedRectanglePath({ x: 0, y: 0, width: 40, height: 30 }, 0.5)),
      count: 4,
    },
    { name: "of a disc", piece: flattenPath(circlePath({ x: 0, y: 0 }, 10)), count: 0 },
    { name: "of nothing", piece: [], count: 0 },
    { name: "of a disc smaller than the bit", piece: flattenPath(circlePath({ x: 0, y: 0 }, 1)), count: 1 },
  ])("$name are $count", ({ piece, count }) => {
    expect(bindingCorners(piece, 0.1, 1.5, kernel)).toHaveLength(count);
  });

  it("go away with a gap that makes up for them: (√2 − 1) r at a right angle", () => {
    // A right angle's corner stands r (√2 − 1) = 0.414 off a 1 mm bit's arc, less √2 of the gap on its sides.
    expect(bindingCorners(square, 0.1, 1, kernel)).toHaveLength(4);
    expect(bindingCorners(square, 0.8, 1, kernel)).toHaveLength(0);
    expect(bindingCorners(square, 0.1, 0, kernel)).toHaveLength(0);
  });
});

describe("two materials that move differently", () => {
  const acrylic = { perK: 7e-5, perPoint: 0 };
  const pine = { perK: 0, perPoint: 0.00212 };
  it("part by their difference over half the bond", () => {
    // 150 mm · (7e-5 · 20 + 0.00212 · 4) = 1.482.
    const bond = { longest: 300, one: acrylic, other: pine, temperatureK: 20, moisturePoints: 4 };
    expect(resultOf(movementMismatchMm(bond))).toBeCloseTo(1.482, 9);
    expect(resultOf(movementMismatchMm({ ...bond, moisturePoints: 0 }))).toBeCloseTo(0.21, 9);
  });

  it("never part when they are equal, and part the same in both orders and for warmth and cold", () => {
    const perK = fc.double({ min: 0, max: 1e-4, noNaN: true });
    const perPoint = fc.double({ min: 0, max: 0.005, noNaN: true });
    const movement = fc.record({ perK, perPoint });
    fc.assert(
      fc.property(movement, movement, fc.double({ min: -40, max: 40, noNaN: true }), (one, other, temperatureK) => {
        const bond = { longest: 500, temperatureK, moisturePoints: 3 };
        expect(resultOf(movementMismatchMm({ ...bond, one, other: one }))).toBe(0);
        const there = resultOf(movementMismatchMm({ ...bond, one, other }));
        expect(resultOf(movementMismatchMm({ ...bond, one: other, other: one }))).toBe(there);
        expect(resultOf(movementMismatchMm({ ...bond, one, other, temperatureK: -temperatureK }))).toBe(there);
        expect(there).toBeGreaterThanOrEqual(0);
      }),
    );
  });
});
