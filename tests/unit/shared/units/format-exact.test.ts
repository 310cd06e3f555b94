import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatExact, formatExactWithUnit } from "#shared/units/format-exact.ts";
import { parseLength } from "#shared/units/parse-length.ts";

describe("a length as it is set out", () => {
  it.each([
    { mm: 12.25, unit: "mm", text: "12.25" },
    { mm: -0.1, unit: "mm", text: "−0.1" },
    { mm: 300, unit: "mm", text: "300" },
    { mm: -0.0001, unit: "mm", text: "0" },
    { mm: 25.4 / 64, unit: "in", text: "1/64″" },
    { mm: 25.4 * 12.375, unit: "in", text: "12 3/8″" },
    { mm: -25.4, unit: "in", text: "−1″" },
    { mm: 10, unit: "in", text: "0.3937″" },
    { mm: Number.NaN, unit: "mm", text: "" },
  ] as const)("$mm mm in $unit is $text", ({ mm, unit, text }) => {
    expect(formatExact(mm, unit)).toBe(text);
  });

  it("says a step of the arrow keys with its unit", () => {
    expect(formatExactWithUnit(0.5, "mm")).toBe("0.5 mm");
    expect(formatExactWithUnit(25.4 / 32, "in")).toBe("1/32 inch");
  });

  it("is read back as the same length to within two thousandths of a millimetre", () => {
    fc.assert(
      fc.property(fc.double({ min: -3000, max: 3000, noNaN: true }), fc.constantFrom("mm", "in"), (mm, unit) => {
        expect(Math.abs((parseLength(formatExact(mm, unit), unit) ?? Number.NaN) - mm)).toBeLessThan(0.002);
      }),
    );
  });
});
