import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfRegion } from "#shared/geometry/box.ts";
import { regionContains } from "#shared/geometry/contains.ts";
import type { Cap, Kernel } from "#shared/geometry/kernel.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const points = (...list: [number, number][]) => list.map(([x, y]) => ({ x, y }));
const pen = { closed: false, widthMm: 4, join: "mitre", cap: "butt", mitreLimit: 4 } as const;

describe("the outline of a line drawn with a pen", () => {
  it.each<{ cap: Cap; area: number; right: number }>([
    { cap: "butt", area: 80, right: 20 },
    { cap: "square", area: 96, right: 22 },
    { cap: "round", area: 80 + 4 * Math.PI, right: 22 },
  ])("20 mm long and 4 mm wide covers $area mm² with $cap caps", ({ cap, area, right }) => {
    const outline = kernel.strokeOutline(points([0, 0], [20, 0]), { ...pen, cap });
    expect(Math.abs(regionAreaMm2(outline) - area)).toBeLessThan(0.1);
    const box = boxOfRegion(outline);
    expect((box?.x ?? 0) + (box?.width ?? 0)).toBeCloseTo(right, 2);
  });

  // Two arms of 20 mm that meet at a right angle: 2 · 80 less the square of 2 × 2 that they share, and the corner outside.
  it.each([
    { join: "mitre", area: 156 + 4 },
    { join: "bevel", area: 156 + 2 },
    { join: "round", area: 156 + Math.PI },
  ] as const)("a right angle with a $join join covers $area mm²", ({ join, area }) => {
    const outline = kernel.strokeOutline(points([0, 0], [20, 0], [20, 20]), { ...pen, join });
    expect(Math.abs(regionAreaMm2(outline) - area)).toBeLessThan(0.05);
  });

  it("a mitre over the limit becomes a bevel", () => {
    // 60° between the edges: the mitre is 1 / sin 30° = 2 widths long.
    const corner = points([0, 0], [20, 0], [10, 10 * Math.sqrt(3)]);
    const reach = (mitreLimit: number) => {
      const box = boxOfRegion(kernel.strokeOutline(corner, { ...pen, mitreLimit }));
      return (box?.x ?? 0) + (box?.width ?? 0);
    };
    expect(reach(2.01)).toBeCloseTo(20 + 4 * Math.cos(Math.PI / 6), 2);
    expect(reach(1.99)).toBeLessThan(20 + 2);
  });

  it("a closed square frame has a hole and four mitred corners", () => {
    const frame = kernel.strokeOutline(points([0, 0], [20, 0], [20, 20], [0, 20]), { ...pen, closed: true });
    expect(frame).toHaveLength(2);
    expect(regionAreaMm2(frame)).toBeCloseTo(24 * 24 - 16 * 16, 6);
  });

  it("a line that runs back on itself keeps its round turn", () => {
    const outline = kernel.strokeOutline(points([0, 0], [20, 0], [5, 0]), { ...pen, join: "round" });
    expect(regionContains(outline, { x: 21.9, y: 0 })).toBe(true);
    expect(Math.abs(regionAreaMm2(outline) - (80 + 2 * Math.PI))).toBeLessThan(0.05);
  });

  it("a smooth point is joined round even under a bevel", () => {
    const line = [
      { x: 0, y: 0 },
      { x: 20, y: 0, smooth: true },
      { x: 20, y: 20 },
    ];
    const area = regionAreaMm2(kernel.strokeOutline(line, { ...pen, join: "bevel" }));
    expect(Math.abs(area - (156 + Math.PI))).toBeLessThan(0.05);
  });

  it("a fine curve is covered without pinholes and without slits", () => {
    const arc = Array.from({ length: 400 }, (_, i) => ({
      x: 200 * Math.cos((i * Math.PI) / 798),
      y: 200 * Math.sin((i * Math.PI) / 798),
      smooth: true,
    }));
    const outline = kernel.strokeOutline(arc, { ...pen, widthMm: 50, join: "round" });
    expect(outline).toHaveLength(1);
    // A quarter of the ring between radii 225 and 175.
    expect(Math.abs(regionAreaMm2(outline) / ((Math.PI / 4) * (225 ** 2 - 175 ** 2)) - 1)).toBeLessThan(0.0002);
  });

  it.each<{ cap: Cap; area: number }>([
    { cap: "butt", area: 0 },
    { cap: "square", area: 16 },
    { cap: "round", area: 4 * Math.PI },
  ])("a line without length is a dot of $area mm² with $cap caps", ({ cap, area }) => {
    const outline = kernel.strokeOutline(points([3, 3], [3, 3]), { ...pen, cap });
    expect(Math.abs(regionAreaMm2(outline) - area)).toBeLessThan(0.1);
  });

  it("nothing comes of no points or a pen without width", () => {
    expect(kernel.strokeOutline([], pen)).toEqual([]);
    expect(kernel.strokeOutline(points([0, 0], [9, 0]), { ...pen, widthMm: 0 })).toEqual([]);
  });
});
