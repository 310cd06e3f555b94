import { describe, expect, it } from "vitest";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import { pathFromText, pathToText, subpathsFromText } from "#shared/geometry/path-text.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";

describe("paths as text", () => {
  it("writes M, L, C and Z, rounded, without a minus before zero", () => {
    expect(pathToText(rectanglePath({ x: -0.0001, y: 2.00049, width: 3, height: 4 }))).toBe("M0 2L3 2L3 6L0 6Z");
    expect(pathToText([])).toBe("");
  });

  it("reads back what it wrote", () => {
    const path = [...circlePath({ x: 12.5, y: 3 }, 8), ...rectanglePath({ x: 1, y: 2, width: 3, height: 4 })];
    expect(pathToText(pathFromText(pathToText(path, 9)) ?? [], 6)).toBe(pathToText(path, 6));
  });

  it("an arc becomes cubics that keep its area", () => {
    const disc = pathFromText("M0 10A10 10 0 0 1 20 10A10 10 0 0 1 0 10z") ?? [];
    expect(disc[0]?.segments.every(({ kind }) => kind === "cubic")).toBe(true);
    expect(regionAreaMm2(flattenPath(disc, 1e-4)) / (100 * Math.PI)).toBeCloseTo(1.0003, 3);
    expect(boxOfPath(disc)?.width).toBeCloseTo(20, 6);
  });

  it("packed arc flags, relative steps and shorthands are read", () => {
    expect(pathToText(pathFromText("m1 1h4v3H1z") ?? [])).toBe("M1 1L5 1L5 4L1 4Z");
    // Q 5 10 10 0 is the cubic 10/3, 20/3 · 20/3, 20/3; T mirrors the handle.
    expect(pathToText(pathFromText("M0 0Q5 10 10 0T20 0") ?? [])).toBe(
      "M0 0C3.333 6.667 6.667 6.667 10 0C13.333 -6.667 16.667 -6.667 20 0Z",
    );
    expect(pathFromText("M0 0a5 5 0 0110 0")).toHaveLength(1);
  });

  it("after Z the next line starts where the closed one began", () => {
    expect(pathToText(pathFromText("M2 2L8 2L8 8ZL0 0L0 5") ?? [])).toBe("M2 2L8 2L8 8ZM2 2L0 0L0 5Z");
  });

  it("tells open from closed, and keeps a closed point", () => {
    expect(subpathsFromText("M0 0L5 5M9 9zM3 3")?.map(({ closed, segments }) => [closed, segments.length])).toEqual([
      [false, 1],
      [true, 0],
      [false, 0],
    ]);
    expect(pathFromText("M3 3")).toEqual([]);
  });

  it.each(["L 5 5", "M 0 0 L 5", "M 0 0 X 4 4", "M 0 0 L NaN 4", "nonsense"])("%s is not path data", (text) => {
    expect(pathFromText(text)).toBeNull();
  });

  it("no data is no path", () => {
    expect(pathFromText("")).toEqual([]);
  });
});
