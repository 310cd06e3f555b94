import { describe, expect, it } from "vitest";
import { rulerLines, rulerSteps, seenSpacingMm } from "@/features/mockup/model/ruler-steps.ts";

const inch = 25.4;

describe("a ruler's steps", () => {
  it.each([
    { scale: 0.2, unit: "mm", figureMm: 500, lineMm: 50 },
    { scale: 1.2, unit: "mm", figureMm: 50, lineMm: 5 },
    { scale: 6, unit: "mm", figureMm: 10, lineMm: 1 },
    { scale: 40, unit: "mm", figureMm: 2, lineMm: 0.2 },
    { scale: 0.2, unit: "in", figureMm: 12 * inch, lineMm: inch },
    { scale: 1.2, unit: "in", figureMm: 3 * inch, lineMm: inch / 4 },
    { scale: 6, unit: "in", figureMm: inch / 2, lineMm: inch / 16 },
    { scale: 40, unit: "in", figureMm: inch / 16, lineMm: inch / 16 },
  ] as const)("at $scale px a mm are $figureMm and $lineMm mm in $unit", ({ scale, unit, figureMm, lineMm }) => {
    const steps = rulerSteps(scale, unit);
    expect(steps.figureMm).toBeCloseTo(figureMm, 9);
    expect(steps.lineMm).toBeCloseTo(lineMm, 9);
  });

  it("have figures at multiples from the board's corner, on both sides of it, and middles between", () => {
    const lines = rulerLines(-52, 104, 1.2, "mm");
    expect(lines.filter(({ kind }) => kind === "figure").map(({ at }) => at)).toEqual([-50, 0, 50, 100]);
    expect(lines.filter(({ kind }) => kind === "middle").map(({ at }) => at)).toEqual([-25, 25, 75]);
    expect(lines).toHaveLength(31);
  });

  it("have no middle where it is no line", () => {
    // Figures at every sixteenth, and nothing between.
    expect(rulerLines(0, 5, 40, "in").map(({ kind }) => kind)).toEqual(["figure", "figure", "figure", "figure"]);
    expect(rulerLines(10, 5, 1, "mm")).toEqual([]);
  });
});

describe("a grid on the screen", () => {
  it("has its own lines, or as few of them as are told apart", () => {
    expect(seenSpacingMm(5, 1.2, 5)).toBe(5);
    expect(seenSpacingMm(5, 0.4, 5)).toBe(25);
    expect(seenSpacingMm(1, 1.2, 5)).toBe(5);
  });
});
