import fc from "fast-check";
import { expect, it } from "vitest";
import { balloonOffsets, balloonRadiusPx } from "@/features/notes/model/balloon-offsets.ts";

const room = { width: 760, height: 560 };

const balloonsOf = (spots: { x: number; y: number }[], space = room) =>
  balloonOffsets(spots, space).map(({ dx, dy }, index) => ({
    x: (spots[index]?.x ?? 0) + dx,
    y: (spots[index]?.y ?? 0) + dy,
  }));

it("no spots, no balloons", () => {
  expect(balloonOffsets([], room)).toEqual([]);
});

it("a lone balloon stands outward of its spot", () => {
  const [offset] = balloonOffsets([{ x: 600, y: 280 }], room);
  expect(offset?.dx).toBeCloseTo(46, 6);
  expect(offset?.dy).toBeCloseTo(0, 6);
});

it("a spot at the very edge has its balloon turned inward", () => {
  const [balloon] = balloonsOf([{ x: 759, y: 280 }]);
  expect(balloon?.x).toBeLessThan(760 - balloonRadiusPx);
});

it("eight notes on one spot stand apart from each other", () => {
  const balloons = balloonsOf(Array.from({ length: 8 }, () => ({ x: 380, y: 250 })));
  for (const [index, one] of balloons.entries()) {
    for (const other of balloons.slice(index + 1)) {
      expect(Math.hypot(one.x - other.x, one.y - other.y)).toBeGreaterThanOrEqual(2 * balloonRadiusPx);
    }
  }
});

it("up to twelve balloons always lie inside the window and never on each other", () => {
  const place = fc.record({ x: fc.integer({ min: 0, max: 760 }), y: fc.integer({ min: 0, max: 560 }) });
  fc.assert(
    fc.property(fc.array(place, { minLength: 1, maxLength: 12 }), (spots) => {
      const balloons = balloonsOf(spots);
      for (const [index, one] of balloons.entries()) {
        expect(one.x).toBeGreaterThanOrEqual(balloonRadiusPx);
        expect(one.x).toBeLessThanOrEqual(760 - balloonRadiusPx);
        expect(one.y).toBeGreaterThanOrEqual(balloonRadiusPx);
        expect(one.y).toBeLessThanOrEqual(560 - balloonRadiusPx);
        for (const other of balloons.slice(index + 1)) {
          expect(Math.hypot(one.x - other.x, one.y - other.y)).toBeGreaterThanOrEqual(2 * balloonRadiusPx);
        }
      }
    }),
    { numRuns: 200, seed: 4600 },
  );
});
