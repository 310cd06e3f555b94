import { describe, expect, it } from "vitest";
import { distanceToRegionEdgeMm } from "#shared/geometry/contains.ts";
import { cubicPoint, cubicSteps, flattenPath } from "#shared/geometry/flatten.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";

describe("flattening", () => {
  it("takes ⌈√(0.75 · D / tolerance)⌉ steps", () => {
    // Second differences 40 and 10 apart: D = 50 along y for 0, 0 · 10, 30 · 20, 10 …
    const p = [
      { x: 0, y: 0 },
      { x: 10, y: 30 },
      { x: 20, y: 10 },
      { x: 30, y: 0 },
    ] as const;
    expect(cubicSteps(...p, 0.02)).toBe(Math.ceil(Math.sqrt((0.75 * 50) / 0.02)));
    expect(cubicSteps({ x: 0, y: 0 }, { x: 1, y: 0 }, { x: 2, y: 0 }, { x: 3, y: 0 }, 0.02)).toBe(1);
  });

  it.each([0.02, 0.5, 0.005])("stays within %f mm of the curve", (tolerance) => {
    const c1 = { x: 90, y: -40 };
    const c2 = { x: -60, y: 120 };
    const to = { x: 50, y: 60 };
    const flat = flattenPath([{ start: { x: 0, y: 0 }, segments: [{ kind: "cubic", c1, c2, to }] }], tolerance);
    const away = Array.from({ length: 999 }, (_, i) =>
      distanceToRegionEdgeMm(flat, cubicPoint({ x: 0, y: 0 }, c1, c2, to, (i + 1) / 1000)),
    );
    expect(Math.max(...away)).toBeLessThanOrEqual(tolerance);
    expect(Math.max(...away)).toBeGreaterThan(tolerance / 10);
  });

  it("keeps straight edges, and drops the last point that repeats the first", () => {
    const box = { x: 1, y: 2, width: 3, height: 4 };
    expect(flattenPath(rectanglePath(box))).toEqual([
      [
        { x: 1, y: 2 },
        { x: 4, y: 2 },
        { x: 4, y: 6 },
        { x: 1, y: 6 },
      ],
    ]);
    const [ring] = flattenPath(circlePath({ x: 0, y: 0 }, 10));
    expect(ring?.at(-1)).not.toEqual(ring?.[0]);
  });

  it("leaves out rings that are less than a triangle", () => {
    expect(flattenPath([{ start: { x: 0, y: 0 }, segments: [{ kind: "line", to: { x: 5, y: 0 } }] }])).toEqual([]);
    expect(flattenPath([])).toEqual([]);
  });

  it("does not drown in a curve of a thousand kilometres", () => {
    const [ring] = flattenPath(circlePath({ x: 0, y: 0 }, 1e9));
    expect(ring?.length).toBe(4 * 4096);
  });
});
