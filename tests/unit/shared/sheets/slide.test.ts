import { describe, expect, it } from "vitest";
import type { Region } from "#shared/geometry/path.ts";
import { slideDistance, sliderOf } from "#shared/sheets/slide.ts";

const polygon = (...points: readonly (readonly [number, number])[]): Region => [points.map(([x, y]) => ({ x, y }))];
const box = (x: number, y: number, width: number, height: number): Region =>
  polygon([x, y], [x + width, y], [x + width, y + height], [x, y + height]);
const origin = { x: 0, y: 0 };
const frame: Region = [...box(0, 0, 40, 40), ...box(5, 5, 30, 30).map((ring) => ring.toReversed())];

describe("how far a shape slides before it meets another", () => {
  it.each([
    { case: "a box beside another", axis: "x", moving: box(30, 0, 10, 10), standing: box(0, 5, 10, 10), far: 20 },
    { case: "one that it touches", axis: "x", moving: box(10, 0, 10, 10), standing: box(0, 5, 10, 10), far: 0 },
    {
      case: "one that it only passes along",
      axis: "x",
      moving: box(30, 15, 10, 10),
      standing: box(0, 5, 10, 10),
      far: 99,
    },
    { case: "one behind it", axis: "x", moving: box(0, 0, 10, 10), standing: box(20, 0, 10, 10), far: 99 },
    {
      case: "one that it touches from the far side",
      axis: "x",
      moving: box(0, 0, 10, 10),
      standing: box(10, 0, 10, 10),
      far: 99,
    },
    {
      case: "one just like it on the same level",
      axis: "x",
      moving: box(25, 0, 10, 10),
      standing: box(0, 0, 10, 10),
      far: 15,
    },
    // The corner at (20, 5) meets the slope x = 10 − y at 5.
    {
      case: "a slope, with a corner",
      axis: "x",
      moving: box(20, 5, 10, 10),
      standing: polygon([0, 0], [10, 0], [0, 10]),
      far: 15,
    },
    // Slopes of one in two and one in one: the tip at y = 10 reaches x = 20 and meets x = 5.
    {
      case: "a tip with a slope",
      axis: "x",
      moving: polygon([20, 10], [30, 5], [30, 15]),
      standing: polygon([0, 5], [10, 5], [0, 15]),
      far: 15,
    },
    { case: "a box above", axis: "y", moving: box(0, 30, 10, 10), standing: box(5, 0, 10, 12), far: 18 },
    { case: "the inner side of a frame around it", axis: "x", moving: box(20, 20, 10, 10), standing: frame, far: 15 },
    { case: "the inner side of a frame, upwards", axis: "y", moving: box(20, 22, 10, 10), standing: frame, far: 17 },
  ] as const)("$case: $far", ({ axis, moving, standing, far }) => {
    expect(slideDistance(axis, sliderOf(moving), origin, sliderOf(standing), origin, 99)).toBeCloseTo(far, 9);
  });

  it("is the same for outlines that run the other way round, as mirrored ones do", () => {
    const turned = (region: Region) => region.map((ring) => ring.toReversed());
    const [moving, standing] = [sliderOf(turned(box(20, 20, 10, 10))), sliderOf(turned(frame))];
    expect(slideDistance("x", moving, origin, standing, origin, 99)).toBeCloseTo(15, 9);
  });

  it("counts from where both lie", () => {
    const square = sliderOf(box(0, 0, 10, 10));
    expect(slideDistance("x", square, { x: 50, y: 3 }, square, { x: 12, y: 0 }, 99)).toBeCloseTo(28, 9);
  });
});
