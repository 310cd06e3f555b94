import fc from "fast-check";
import { expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { spreadOfRegion, spreadsAreWithin } from "#shared/pieces/outline-spread.ts";
import { centred, isWithin } from "#shared/pieces/same-outline.ts";

const side = (half: number) => [
  [
    { x: -half, y: -half },
    { x: half, y: -half },
    { x: half, y: half },
    { x: -half, y: half },
  ],
];

it("a square reaches half its side along x and y, and √2 of it between them", () => {
  const spread = spreadOfRegion(side(10));
  expect(spread).toHaveLength(24);
  expect(spread[0]).toBeCloseTo(10, 9);
  expect(spread[6]).toBeCloseTo(10, 9);
  expect(spread[3]).toBeCloseTo(14.142, 3);
});

it.each([
  { half: 10.9, within: true },
  { half: 11.1, within: false },
])("squares of 10 and $half are within √2 of a corner: $within", ({ half, within }) => {
  expect(spreadsAreWithin(spreadOfRegion(side(10)), spreadOfRegion(side(half)), Math.SQRT2)).toBe(within);
});

it("a triangle is within nothing of the one that points the other way only when that is turned", () => {
  const triangle = [
    { x: -10, y: -8 },
    { x: 10, y: -8 },
    { x: 0, y: 8 },
  ];
  const up = spreadOfRegion([triangle]);
  const down = spreadOfRegion([triangle.map(({ x, y }) => ({ x: -x, y: -y }))]);
  expect(spreadsAreWithin(up, down, 0.001, true)).toBe(true);
  expect(spreadsAreWithin(up, down, 3)).toBe(false);
  expect(spreadsAreWithin(up, up, 3, true)).toBe(false);
});

it("outlines that lie within a distance of each other never differ more in their spread, turned or not", async () => {
  const kernel = await loadKernel();
  const corner = fc.record({ x: fc.integer({ min: -30, max: 30 }), y: fc.integer({ min: -30, max: 30 }) });
  const ring = fc.array(corner, { minLength: 3, maxLength: 7 });
  fc.assert(
    fc.property(ring, fc.double({ min: -2, max: 2, noNaN: true }), fc.boolean(), (points, grow, turned) => {
      const one = centred(kernel.union([points], "nonzero"));
      const other = centred(kernel.offset(one, grow, "round"));
      fc.pre(one.length > 0 && other.length > 0);
      const compared = turned ? centred(other, 180) : other;
      for (const within of [0.5, 1, 2.5]) {
        if (!isWithin(one, compared, within, kernel)) continue;
        expect(spreadsAreWithin(spreadOfRegion(one), spreadOfRegion(other), within + 0.03, turned)).toBe(true);
      }
    }),
    { numRuns: 300 },
  );
});
