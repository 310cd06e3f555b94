import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatFine, formatLength, formatLengthWithUnit, formatSize } from "#shared/units/format-length.ts";
import { parseLength } from "#shared/units/parse-length.ts";

describe("a length on a drawing", () => {
  it.each([
    { mm: 600, text: "600" },
    { mm: 19, text: "19" },
    { mm: 4.5, text: "4.5" },
    { mm: 12.34, text: "12.3" },
    { mm: 2.25, text: "2.3" },
    { mm: 0.04, text: "0" },
    { mm: -0.04, text: "0" },
    { mm: -12.5, text: "−12.5" },
    { mm: Number.NaN, text: "–" },
    { mm: Number.POSITIVE_INFINITY, text: "–" },
  ])("of $mm mm reads $text", ({ mm, text }) => {
    expect(formatLength(mm, "mm")).toBe(text);
  });

  it.each([
    { mm: 25.4, text: "1″" },
    { mm: 314.325, text: "12 3/8″" },
    { mm: 1.5875, text: "1/16″" },
    { mm: 12.7, text: "1/2″" },
    { mm: 0.79, text: "0″" },
    { mm: 0.8, text: "1/16″" },
    { mm: 25.3, text: "1″" },
    { mm: -38.1, text: "−1 1/2″" },
    { mm: 0, text: "0″" },
    { mm: Number.NaN, text: "–" },
  ])("of $mm mm reads $text in a shop that works in inches", ({ mm, text }) => {
    expect(formatLength(mm, "in")).toBe(text);
  });

  it("says its unit inside a sentence", () => {
    expect(formatLengthWithUnit(4.5, "mm")).toBe("4.5 mm");
    expect(formatLengthWithUnit(314.325, "in")).toBe("12 3/8″");
    expect(formatLengthWithUnit(Number.NaN, "mm")).toBe("–");
    expect(formatSize(600, 400, "mm")).toBe("600 × 400 mm");
    expect(formatSize(609.6, 406.4, "in")).toBe("24″ × 16″");
  });

  it("keeps hundredths of a mm and thousandths of an inch where a sixteenth is too coarse", () => {
    expect(formatFine(9.128, "mm")).toBe("9.13 mm");
    expect(formatFine(9, "in")).toBe("0.354″");
    expect(formatFine(-0.001, "mm")).toBe("0 mm");
    expect(formatFine(Number.NaN, "in")).toBe("–");
  });

  it("read back, is within half a sixteenth of an inch", () => {
    fc.assert(
      fc.property(fc.double({ min: -10_000, max: 10_000, noNaN: true }), (mm) => {
        const back = parseLength(formatLength(mm, "in"), "in");
        expect(back).not.toBeNull();
        expect(Math.abs((back ?? 0) - mm)).toBeLessThanOrEqual(25.4 / 32 + 1e-9);
      }),
    );
  });
});

describe("a typed length", () => {
  it.each([
    { text: "600", unit: "mm" as const, mm: 600 },
    { text: " 12,5 ", unit: "mm" as const, mm: 12.5 },
    { text: "60 cm", unit: "in" as const, mm: 600 },
    { text: "2 in", unit: "mm" as const, mm: 50.8 },
    { text: "12 3/8", unit: "in" as const, mm: 314.325 },
    { text: "12-3/8″", unit: "mm" as const, mm: 314.325 },
    { text: '3/4"', unit: "mm" as const, mm: 19.05 },
    { text: ".5", unit: "in" as const, mm: 12.7 },
    { text: "−1 1/2 in", unit: "in" as const, mm: -38.1 },
    { text: "-0", unit: "mm" as const, mm: 0 },
    { text: "3/8", unit: "mm" as const, mm: 9.525 },
    { text: "12 3/8", unit: "mm" as const, mm: 314.325 },
    { text: "1.2 m", unit: "mm" as const, mm: 1200 },
    { text: "2'", unit: "mm" as const, mm: 609.6 },
    { text: "2'6\"", unit: "in" as const, mm: 762 },
    { text: "2'-6 1/2", unit: "in" as const, mm: 774.7 },
    { text: "-1 ft 6 in", unit: "mm" as const, mm: -457.2 },
    { text: "2′ 6″", unit: "mm" as const, mm: 762 },
    { text: "6''", unit: "mm" as const, mm: 152.4 },
    { text: "1 foot", unit: "in" as const, mm: 304.8 },
  ])("$text in $unit is $mm mm", ({ text, unit, mm }) => {
    expect(parseLength(text, unit)).toBeCloseTo(mm, 9);
  });

  it.each(["", "wide", "12 3/", "1/0", "1 2 3", "12mm3", "1e3", "NaN", "--3", "2'6 mm", "'6", "2'2'", "1/0 ft"])(
    "%j is none",
    (text) => {
      expect(parseLength(text, "mm")).toBeNull();
    },
  );
});
