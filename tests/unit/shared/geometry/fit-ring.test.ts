import { describe, expect, it } from "vitest";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { distanceToRegionEdgeMm } from "#shared/geometry/contains.ts";
import { fitRing } from "#shared/geometry/fit-ring.ts";
import { flattenPath, flattenRing } from "#shared/geometry/flatten.ts";
import type { Path, Polygon } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";

const tolerance = 0.03;
const polygonOf = (path: Path): Polygon => flattenPath(path)[0] ?? [];
const kinds = (polygon: Polygon) => {
  const { segments } = fitRing(polygon, tolerance);
  return {
    lines: segments.filter(({ kind }) => kind === "line").length,
    cubics: segments.filter(({ kind }) => kind === "cubic").length,
  };
};
/** How far the fitted outline strays from the points it was fitted to, both ways. */
function strayMm(polygon: Polygon): number {
  const fitted = [flattenRing(fitRing(polygon, tolerance), 0.001)];
  const there = polygon.map((point) => distanceToRegionEdgeMm(fitted, point));
  const back = (fitted[0] ?? []).map((point) => distanceToRegionEdgeMm([polygon], point));
  return Math.max(...there, ...back);
}

describe("fitting curves to a flattened ring", () => {
  it("a circle comes back as a few cubics", () => {
    const circle = polygonOf(circlePath({ x: 40, y: -7 }, 100));
    expect(circle.length).toBeGreaterThan(100);
    expect(kinds(circle).lines).toBe(0);
    expect(kinds(circle).cubics).toBeLessThanOrEqual(8);
    // Flattening leaves up to 0.02 between chord and curve.
    expect(strayMm(circle)).toBeLessThan(tolerance + 0.02);
  });

  it("a rectangle and a star keep their edges", () => {
    expect(kinds(polygonOf(rectanglePath({ x: 0, y: 0, width: 50, height: 20 })))).toEqual({ lines: 3, cubics: 0 });
    const star = Array.from({ length: 14 }, (_, k) => ({
      x: (k % 2 ? 20 : 50) * Math.cos((k * Math.PI) / 7),
      y: (k % 2 ? 20 : 50) * Math.sin((k * Math.PI) / 7),
    }));
    expect(kinds(star).cubics).toBe(0);
    expect(strayMm(star)).toBeLessThan(1e-9);
  });

  it("a rounded rectangle keeps its straight sides and its round corners", () => {
    const panel = polygonOf(roundedRectanglePath({ x: 0, y: 0, width: 200, height: 120 }, 16));
    const { lines, cubics } = kinds(panel);
    expect(lines).toBe(4);
    expect(cubics).toBeGreaterThanOrEqual(4);
    expect(cubics).toBeLessThanOrEqual(12);
    expect(strayMm(panel)).toBeLessThan(tolerance + 0.02);
  });

  it("a wave strays no farther than the tolerance and keeps its area", () => {
    const wave: Polygon = [
      ...Array.from({ length: 600 }, (_, i) => ({ x: i / 2, y: 20 * Math.sin(i / 30) + 5 * Math.sin(i / 7) })),
      { x: 300, y: 80 },
      { x: 0, y: 80 },
    ];
    expect(strayMm(wave)).toBeLessThan(tolerance + 0.02);
    expect(fitRing(wave, tolerance).segments.length).toBeLessThan(120);
    const fitted = regionAreaMm2([flattenRing(fitRing(wave, tolerance), 0.001)]);
    expect(Math.abs(fitted / regionAreaMm2([wave]) - 1)).toBeLessThan(0.0002);
  });

  it("less than a triangle is no ring", () => {
    expect(() =>
      fitRing(
        [
          { x: 0, y: 0 },
          { x: 1, y: 1 },
        ],
        tolerance,
      ),
    ).toThrow(RangeError);
  });
});
