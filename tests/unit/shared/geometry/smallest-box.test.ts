import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { boxOfRegion } from "#shared/geometry/box.ts";
import type { Point, Region } from "#shared/geometry/path.ts";
import { convexHull, smallestBox } from "#shared/geometry/smallest-box.ts";
import { regionTransform, rotateMatrix } from "#shared/geometry/transform.ts";

const ring = (...points: [number, number][]): Region => [points.map(([x, y]) => ({ x, y }))];
const tile: Region = ring([10, 20], [110, 20], [110, 60], [10, 60]);

describe("the smallest box", () => {
  it.each([0, 15, 30, 90, 137, 179])("of a tile turned by %d° is the tile", (degrees) => {
    const box = smallestBox(regionTransform(tile, rotateMatrix(degrees)));
    expect(box?.length).toBeCloseTo(100, 9);
    expect(box?.width).toBeCloseTo(40, 9);
    // A direction and its opposite are the same.
    expect(Math.abs(Math.sin((((box?.turn ?? 0) - degrees) * Math.PI) / 180))).toBeLessThan(1e-9);
    const back = regionTransform([[box?.centre ?? { x: 0, y: 0 }]], rotateMatrix(-degrees))[0]?.[0];
    expect(back?.x).toBeCloseTo(60, 9);
    expect(back?.y).toBeCloseTo(40, 9);
  });

  it.each([
    { name: "nothing", region: [], box: null },
    { name: "a point", region: ring([3, 4]), box: { centre: { x: 3, y: 4 }, length: 0, width: 0, turn: 0 } },
    {
      name: "a point three times",
      region: ring([3, 4], [3, 4], [3, 4]),
      box: { centre: { x: 3, y: 4 }, length: 0, width: 0, turn: 0 },
    },
    {
      name: "a line",
      region: ring([0, 0], [10, 0], [5, 0]),
      box: { centre: { x: 5, y: 0 }, length: 10, width: 0, turn: 0 },
    },
  ])("of $name is $box", ({ region, box }) => {
    expect(smallestBox(region)).toEqual(box);
  });

  const point = fc.record({ x: fc.integer({ min: -500, max: 500 }), y: fc.integer({ min: -500, max: 500 }) });
  const points = fc.array(point, { minLength: 3, maxLength: 40 });

  it("is no larger than any of 180 boxes and holds every point", () => {
    fc.assert(
      fc.property(points, (cloud) => {
        const box = smallestBox([cloud]);
        if (!box) throw new Error("Points have a box.");
        for (let degrees = 0; degrees < 180; degrees++) {
          const other = boxOfRegion(regionTransform([cloud], rotateMatrix(degrees)));
          expect(box.length * box.width).toBeLessThanOrEqual((other?.width ?? 0) * (other?.height ?? 0) + 1e-6);
        }
        const home = regionTransform([cloud], rotateMatrix(-box.turn))[0] ?? [];
        const [centre] = regionTransform([[box.centre]], rotateMatrix(-box.turn))[0] ?? [];
        for (const { x, y } of home) {
          expect(Math.abs(x - (centre?.x ?? 0))).toBeLessThanOrEqual(box.length / 2 + 1e-6);
          expect(Math.abs(y - (centre?.y ?? 0))).toBeLessThanOrEqual(box.width / 2 + 1e-6);
        }
      }),
    );
  });

  it("does not change when the points are turned", () => {
    fc.assert(
      fc.property(points, fc.double({ min: 0, max: 360, noNaN: true }), (cloud, degrees) => {
        const area = (list: readonly Point[]) => {
          const box = smallestBox([list]);
          return (box?.length ?? 0) * (box?.width ?? 0);
        };
        expect(area(regionTransform([cloud], rotateMatrix(degrees))[0] ?? [])).toBeCloseTo(area(cloud), 4);
      }),
    );
  });

  it("a convex hull turns one way all round and leaves no point out", () => {
    fc.assert(
      fc.property(points, (cloud) => {
        const hull = convexHull(cloud);
        for (const [index, a] of hull.entries()) {
          const b = hull[(index + 1) % hull.length] ?? a;
          for (const { x, y } of cloud) {
            expect((b.x - a.x) * (y - a.y) - (b.y - a.y) * (x - a.x)).toBeGreaterThanOrEqual(0);
          }
        }
      }),
    );
  });
});
