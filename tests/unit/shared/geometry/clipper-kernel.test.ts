import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { joinAbutting } from "#shared/geometry/join-abutting.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Polygon } from "#shared/geometry/path.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const square = (x: number, y: number, side: number): Polygon => [
  { x, y },
  { x: x + side, y },
  { x: x + side, y: y + side },
  { x, y: y + side },
];
const polygons = fc.array(
  fc.array(fc.record({ x: fc.integer({ min: -50, max: 50 }), y: fc.integer({ min: -50, max: 50 }) }), {
    minLength: 3,
    maxLength: 9,
  }),
  { minLength: 1, maxLength: 3 },
);

describe("the geometry kernel", () => {
  it("gives nothing for nothing", () => {
    expect(kernel.union([], "nonzero")).toEqual([]);
    expect(kernel.intersect([], [square(0, 0, 5)])).toEqual([]);
    expect(kernel.difference([], [square(0, 0, 5)])).toEqual([]);
    expect(kernel.offset([], 2, "round")).toEqual([]);
    expect(
      kernel.union(
        [
          [
            { x: 0, y: 0 },
            { x: 5, y: 5 },
          ],
        ],
        "nonzero",
      ),
    ).toEqual([]);
  });

  it("leaves a region alone when nothing is taken from it, and all of it when all is", () => {
    expect(regionAreaMm2(kernel.difference([square(0, 0, 7)], []))).toBe(49);
    expect(kernel.difference([square(0, 0, 7)], [square(-1, -1, 9)])).toEqual([]);
  });

  it("rounds to the grid of 0.001 mm", () => {
    const [ring] = kernel.union([square(0.00049, 0.0004, 3.0002)], "nonzero");
    expect(ring?.map(({ x, y }) => [x, y]).sort()).toEqual([
      [0, 0],
      [0, 3.001],
      [3.001, 0],
      [3.001, 3.001],
    ]);
  });

  it("throws for coordinates that are not finite or too far, rather than answer wrongly", () => {
    for (const far of [Number.NaN, Number.POSITIVE_INFINITY, 2_000_000]) {
      expect(() =>
        kernel.union(
          [
            [
              { x: far, y: 0 },
              { x: 1, y: 1 },
              { x: 0, y: 1 },
            ],
          ],
          "nonzero",
        ),
      ).toThrow(RangeError);
    }
    // And works on after it.
    expect(regionAreaMm2(kernel.union([square(0, 0, 2)], "nonzero"))).toBe(4);
  });

  it("an offset by nothing is the region itself", () => {
    expect(regionAreaMm2(kernel.offset([square(0, 0, 4)], 0, "round"))).toBe(16);
  });

  it("a ring that runs back along a level spike keeps all its corners", () => {
    const spiked: Polygon = [
      { x: 0, y: 0 },
      { x: 10, y: 0 },
      { x: 10, y: 5 },
      { x: 12, y: 5 },
      { x: 10, y: 5 },
      { x: 10, y: 10 },
      { x: 0, y: 10 },
    ];
    expect(regionAreaMm2(kernel.union([spiked], "nonzero"))).toBe(100);
  });

  it("intersection and difference make up the whole", () => {
    fc.assert(
      fc.property(polygons, polygons, (first, second) => {
        const a = kernel.union(first, "evenodd");
        const b = kernel.union(second, "evenodd");
        const shared = regionAreaMm2(kernel.intersect(a, b));
        const rest = regionAreaMm2(kernel.difference(a, b));
        // Each crossing may move by half a grid step along edges of up to 150 mm.
        expect(Math.abs(shared + rest - regionAreaMm2(a))).toBeLessThan(2);
        const joined = regionAreaMm2(joinAbutting(kernel, [kernel.difference(a, b), b]));
        expect(Math.abs(joined - rest - regionAreaMm2(b))).toBeLessThan(2);
      }),
      { numRuns: 150, seed: 7 },
    );
  });
});
