import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { placePath, placePoint, placeRegion, unplacePoint } from "#shared/geometry/placement.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import {
  matrixInverse,
  matrixMultiply,
  matrixStretch,
  pointTransform,
  rotateMatrix,
  scaleMatrix,
  translateMatrix,
} from "#shared/geometry/transform.ts";

const placement = { x: 100, y: 50, turn: 90, scale: 2, mirrored: false };

describe("placing a piece", () => {
  it("turns clockwise as seen from the front, after scaling and before moving", () => {
    // The piece's right becomes the board's down.
    expect(placePoint({ x: 3, y: 0 }, placement)).toEqual({ x: 100, y: 56 });
    expect(placePoint({ x: 0, y: 3 }, placement)).toEqual({ x: 94, y: 50 });
  });

  it("mirrors left to right before it turns", () => {
    expect(placePoint({ x: 3, y: 1 }, { ...placement, turn: 0, mirrored: true })).toEqual({ x: 94, y: 52 });
    expect(placePoint({ x: 3, y: 0 }, { ...placement, mirrored: true })).toEqual({ x: 100, y: 44 });
  });

  it("quarter turns leave no dust in the numbers", () => {
    expect(boxOfPath(placePath(rectanglePath({ x: -5, y: -2, width: 10, height: 4 }), placement))).toEqual({
      x: 96,
      y: 40,
      width: 8,
      height: 20,
    });
    for (const turn of [-90, 270, 450])
      expect(placePoint({ x: 1, y: 0 }, { ...placement, x: 0, y: 0, turn, scale: 1 }).x).toBeCloseTo(0, 15);
  });

  it("keeps areas but for the scale, and comes back to where it was", () => {
    fc.assert(
      fc.property(
        fc.record({
          x: fc.integer({ min: -999, max: 999 }),
          y: fc.integer({ min: -999, max: 999 }),
          turn: fc.integer({ min: -360, max: 360 }),
          scale: fc.integer({ min: 1, max: 40 }).map((n) => n / 8),
          mirrored: fc.boolean(),
        }),
        (place) => {
          const ell = [
            [
              { x: 0, y: 0 },
              { x: 10, y: 0 },
              { x: 10, y: 5 },
              { x: 5, y: 5 },
              { x: 5, y: 10 },
              { x: 0, y: 10 },
            ],
          ];
          expect(regionAreaMm2(placeRegion(ell, place))).toBeCloseTo(75 * place.scale ** 2, 6);
          const back = unplacePoint(placePoint({ x: 7, y: -3 }, place), place);
          expect(back.x).toBeCloseTo(7, 8);
          expect(back.y).toBeCloseTo(-3, 8);
        },
      ),
      { seed: 3, numRuns: 200 },
    );
  });
});

describe("matrices", () => {
  it("the inner map is done first", () => {
    const moved = matrixMultiply(scaleMatrix(2), translateMatrix(3, 0));
    expect(pointTransform({ x: 1, y: 1 }, moved)).toEqual({ x: 8, y: 2 });
  });

  it("a map that flattens has no inverse", () => {
    expect(matrixInverse(scaleMatrix(0, 3))).toBeNull();
    expect(() => unplacePoint({ x: 0, y: 0 }, { ...placement, scale: 0 })).toThrow(RangeError);
  });

  it("tells the largest stretch, also of a shear", () => {
    expect(matrixStretch(matrixMultiply(rotateMatrix(33), scaleMatrix(3, 2)))).toBeCloseTo(3, 12);
    // x' = x + y: the golden ratio is the greater singular value.
    expect(matrixStretch({ a: 1, b: 0, c: 1, d: 1, e: 0, f: 0 })).toBeCloseTo((1 + Math.sqrt(5)) / 2, 12);
  });
});
