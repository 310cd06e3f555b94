import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { holdingPattern } from "#shared/plates/holding-pattern.ts";
import { longestSpanMm } from "#shared/plates/longest-span.ts";

const at = (...places: [number, number][]) => places.map(([x, y]) => ({ x, y }));

describe("the longest span between points", () => {
  it.each([
    { name: "none", points: at(), span: 0 },
    { name: "one", points: at([3, 4]), span: 0 },
    { name: "two", points: at([0, 0], [30, 40]), span: 50 },
    { name: "three in a row", points: at([0, 0], [400, 0], [150, 0]), span: 250 },
    { name: "a rectangle", points: at([0, 0], [300, 0], [0, 200], [300, 200]), span: 300 },
    {
      name: "a rectangle with one in the middle of a long side",
      points: at([0, 0], [300, 0], [0, 200], [300, 200], [150, 0]),
      span: 300,
    },
    { name: "two rows of three", points: at([0, 0], [150, 0], [300, 0], [0, 200], [150, 200], [300, 200]), span: 200 },
    {
      name: "a square with one in its middle",
      points: at([0, 0], [300, 0], [0, 300], [300, 300], [150, 150]),
      span: 300,
    },
    { name: "two pairs far apart", points: at([0, 0], [10, 0], [500, 0], [510, 0]), span: 490 },
  ])("of $name is $span", ({ points, span }) => expect(longestSpanMm(points)).toBeCloseTo(span, 9));

  it("is no more than the farthest two, and no less than the nearest neighbour of any", () => {
    const coordinate = fc.integer({ min: 0, max: 500 });
    const point = fc.record({ x: coordinate, y: coordinate });
    fc.assert(
      fc.property(fc.array(point, { minLength: 2, maxLength: 9 }), (points) => {
        const apart = (a: { x: number; y: number }, b: { x: number; y: number }) => Math.hypot(a.x - b.x, a.y - b.y);
        const all = points.flatMap((a) => points.map((b) => apart(a, b)));
        const span = longestSpanMm(points);
        expect(span).toBeLessThanOrEqual(Math.max(...all) + 1e-9);
        for (const [index, a] of points.entries()) {
          const others = points.filter((_, place) => place !== index).map((b) => apart(a, b));
          expect(span).toBeGreaterThanOrEqual(Math.min(...others) - 1e-9);
        }
      }),
    );
  });
});

describe("how points hold a sheet", () => {
  it.each([
    { name: "a rectangle", points: at([0, 0], [300, 0], [0, 200], [300, 200]), longer: 300, shorter: 200 },
    {
      name: "a turned square",
      points: at([100, 0], [200, 100], [100, 200], [0, 100]),
      longer: 141.42,
      shorter: 141.42,
    },
    {
      name: "a rectangle drilled a little off",
      points: at([0, 0], [300, 3], [0, 200], [300, 200]),
      longer: 300.02,
      shorter: 200,
    },
  ])("$name: four points", ({ points, longer, shorter }) => {
    const pattern = holdingPattern(points, 7.5);
    expect(pattern).toMatchObject({ kind: "four points" });
    expect(pattern?.longer).toBeCloseTo(longer, 1);
    if (pattern?.kind === "four points") expect(pattern.shorter).toBeCloseTo(shorter, 1);
  });

  it.each([
    { name: "four in a row", points: at([0, 0], [100, 0], [200, 0], [300, 0]), longer: 100 },
    { name: "a trapezium", points: at([50, 0], [250, 0], [0, 200], [300, 200]), longer: 300 },
    { name: "a leaning parallelogram", points: at([0, 0], [300, 0], [350, 200], [50, 200]), longer: 300 },
    { name: "three", points: at([0, 0], [100, 0], [50, 80]), longer: 100 },
  ])("$name: a span", ({ points, longer }) => {
    expect(holdingPattern(points, 7.5)).toMatchObject({ kind: "span", longer });
  });

  it("not at all with fewer than two apart", () => {
    expect(holdingPattern(at([1, 1]), 7.5)).toBeNull();
    expect(holdingPattern(at([1, 1], [1, 1]), 7.5)).toBeNull();
  });
});
