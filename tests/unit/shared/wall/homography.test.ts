import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Point } from "#shared/geometry/path.ts";
import {
  homographyBetween,
  inverse,
  localScale,
  mapPoint,
  product,
  scaleBy,
  shiftBy,
} from "#shared/wall/homography.ts";
import type { Quad } from "#shared/wall/quad.ts";

const unitSquare: Quad = [
  { x: 0, y: 0 },
  { x: 1, y: 0 },
  { x: 1, y: 1 },
  { x: 0, y: 1 },
];
/** (x, y) to (x, y) / (1 + x/2), worked out by hand. */
const leaning: Quad = [
  { x: 0, y: 0 },
  { x: 2 / 3, y: 0 },
  { x: 2 / 3, y: 2 / 3 },
  { x: 0, y: 1 },
];

describe("a homography", () => {
  it("of a square to a leaning one is that worked out by hand", () => {
    const map = homographyBetween(unitSquare, leaning);
    if (!map) throw new Error("There is one.");
    for (const [index, value] of [1, 0, 0, 0, 1, 0, 0.5, 0, 1].entries()) expect(map[index]).toBeCloseTo(value, 12);
    const middle = mapPoint(map, { x: 0.5, y: 0.5 });
    expect(middle?.x).toBeCloseTo(0.4, 12);
    expect(middle?.y).toBeCloseTo(0.4, 12);
    // The determinant of the derivative is 1 / (1 + x/2)³.
    expect(localScale(map, { x: 1, y: 0 })).toBeCloseTo(Math.sqrt(1 / 3.375), 12);
    // At x = -2 the map sends points to infinity, beyond it they are behind the camera.
    expect(mapPoint(map, { x: -2, y: 0 })).toBeNull();
    expect(mapPoint(map, { x: -3, y: 0 })).toBeNull();
    expect(localScale(map, { x: -3, y: 0 })).toBeNull();
  });

  it("is none when three points lie in a line", () => {
    const flat: Quad = [
      { x: 0, y: 0 },
      { x: 1, y: 0 },
      { x: 2, y: 0 },
      { x: 3, y: 0 },
    ];
    expect(homographyBetween(unitSquare, flat)).toBeNull();
    expect(homographyBetween(flat, unitSquare)).toBeNull();
  });

  const corner = (x: number, y: number): fc.Arbitrary<Point> =>
    fc.record({
      x: fc.double({ min: x - 60, max: x + 60, noNaN: true }),
      y: fc.double({ min: y - 60, max: y + 60, noNaN: true }),
    });
  const quad: fc.Arbitrary<Quad> = fc.tuple(corner(200, 200), corner(500, 210), corner(480, 620), corner(190, 600));

  it("is the one that eight linear equations give, and maps back", () => {
    fc.assert(
      fc.property(quad, quad, (from, to) => {
        const map = homographyBetween(from, to);
        const back = map && inverse(map);
        if (!map || !back) throw new Error("There is one.");
        const independent = byEquations(from, to);
        for (let index = 0; index < 9; index++)
          expect((map[index] ?? 0) / map[8]).toBeCloseTo(independent[index] ?? Number.NaN, 6);
        from.forEach((point, index) => {
          const mapped = mapPoint(map, point);
          expect(mapped?.x).toBeCloseTo(to[index]?.x ?? Number.NaN, 6);
          expect(mapped?.y).toBeCloseTo(to[index]?.y ?? Number.NaN, 6);
          const returned = mapped && mapPoint(back, mapped);
          expect(returned?.x).toBeCloseTo(point.x, 6);
          expect(returned?.y).toBeCloseTo(point.y, 6);
        });
      }),
      { numRuns: 200, seed: 7 },
    );
  });

  it("follows another in the order said", () => {
    const map = product(scaleBy(3), shiftBy(2, -1));
    expect(mapPoint(map, { x: 5, y: 4 })).toEqual({ x: 21, y: 9 });
  });
});

/** Direct linear transformation with the last figure 1 (Hartley and Zisserman, section 4.1), by plain elimination: another way than the module's. */
function byEquations(from: Quad, to: Quad): number[] {
  const rows = from.flatMap(({ x, y }, index) => {
    const { x: u, y: v } = to[index] ?? { x: 0, y: 0 };
    return [
      [x, y, 1, 0, 0, 0, -u * x, -u * y, u],
      [0, 0, 0, x, y, 1, -v * x, -v * y, v],
    ];
  });
  for (let column = 0; column < 8; column++) {
    let pivot = column;
    for (let row = column; row < 8; row++)
      if (Math.abs(rows[row]?.[column] ?? 0) > Math.abs(rows[pivot]?.[column] ?? 0)) pivot = row;
    const chosen = rows[pivot] ?? [];
    rows[pivot] = rows[column] ?? [];
    rows[column] = chosen.map((value) => value / (chosen[column] ?? 1));
    for (let row = 0; row < 8; row++) {
      if (row === column) continue;
      const factor = rows[row]?.[column] ?? 0;
      rows[row] = (rows[row] ?? []).map((value, place) => value - factor * (rows[column]?.[place] ?? 0));
    }
  }
  return [...rows.map((row) => row[8] ?? Number.NaN), 1];
}
