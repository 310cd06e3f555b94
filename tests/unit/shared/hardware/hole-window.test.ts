import fc from "fast-check";
import { expect, it } from "vitest";
import { fixedPoint, holeMovementMm } from "#shared/hardware/hole-movement.ts";
import { holeWindow } from "#shared/hardware/hole-window.ts";

// Arithmetic: lower = d + 2 (p + m), upper = (min(cap, barrel) + d)/2 − cover.
it.each([
  { passing: 5, cap: 15, barrel: 15, placingError: 0.5, movement: 0, cover: 1, lower: 6, upper: 9 },
  { passing: 5, cap: 18, barrel: 15, placingError: 0.5, movement: 0.75, cover: 1, lower: 7.5, upper: 9 },
  { passing: 6, cap: 19, barrel: 25, placingError: 0.5, movement: 2.5, cover: 1, lower: 12, upper: 11.5 },
  { passing: 5, cap: 15, barrel: 15, placingError: 0, movement: 0, cover: 0, lower: 5, upper: 10 },
])("a stud of $passing under a cap of $cap allows $lower to $upper mm", ({ lower, upper, ...options }) => {
  const window = holeWindow(options);
  expect(window.lower).toBeCloseTo(lower, 9);
  expect(window.upper).toBeCloseTo(upper, 9);
});

it("a hole of the upper limit, hard over to one side, is still covered by as much as was asked", () => {
  const diameter = fc.double({ min: 3, max: 30, noNaN: true });
  fc.assert(
    fc.property(diameter, diameter, fc.double({ min: 0, max: 2, noNaN: true }), (passing, more, cover) => {
      const cap = passing + more;
      const { upper } = holeWindow({ passing, cap, barrel: cap, placingError: 0.5, movement: 0, cover });
      // The stud touches the near side of the hole: the far side is the hole's width less the stud's half from the
      // cap's middle.
      const farSide = upper - passing / 2;
      expect(cap / 2 - farSide).toBeCloseTo(cover, 6);
    }),
  );
});

const conditions = { expansionPerK: 7e-5, temperatureK: 20, woodPerPoint: 0.00212, moisturePoints: 4, grainTurn: 0 };

// 200 mm: acrylic 200 · 7e-5 · 20 = 0.28 mm; eastern white pine across the grain 200 · 0.00212 · 4 = 1.696 mm (Wood
// Handbook, GTR-282, eq. 13-2).
it.each([
  { direction: "along the grain", hole: { x: 200, y: 0 }, moves: 0.28 },
  { direction: "across the grain", hole: { x: 0, y: 200 }, moves: 1.976 },
  { direction: "at 45°", hole: { x: 200 / Math.SQRT2, y: 200 / Math.SQRT2 }, moves: 0.28 + 0.848 },
  { direction: "nowhere", hole: { x: 0, y: 0 }, moves: 0 },
])("a hole 200 mm $direction from the fixed one moves $moves mm", ({ hole, moves }) => {
  expect(holeMovementMm({ x: 0, y: 0 }, hole, conditions)).toBeCloseTo(moves, 9);
});

it("a board whose grain stands upright moves the other way", () => {
  const upright = { ...conditions, grainTurn: 90 };
  expect(holeMovementMm({ x: 0, y: 0 }, { x: 0, y: 200 }, upright)).toBeCloseTo(0.28, 9);
  expect(holeMovementMm({ x: 0, y: 0 }, { x: 200, y: 0 }, upright)).toBeCloseTo(1.976, 9);
});

it("cooling and drying move as far as warming and swelling", () => {
  const cold = { ...conditions, temperatureK: -20, moisturePoints: -4 };
  expect(holeMovementMm({ x: 0, y: 0 }, { x: 50, y: 80 }, cold)).toBe(
    holeMovementMm({ x: 0, y: 0 }, { x: 50, y: 80 }, conditions),
  );
});

it.each([
  { holes: [], point: null },
  {
    holes: [
      { x: 10, y: 20, fixed: false },
      { x: 30, y: 60, fixed: true },
    ],
    point: { x: 30, y: 60 },
  },
  {
    holes: [
      { x: 10, y: 20, fixed: false },
      { x: 30, y: 60, fixed: false },
    ],
    point: { x: 20, y: 40 },
  },
])("of the holes $holes the panel moves about $point", ({ holes, point }) => {
  expect(fixedPoint(holes)).toEqual(point);
});
