import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type FigureUnit, figureUnits, formatLimit, shownFigure, storedFigure } from "#shared/dry-fit/limit-units.ts";

describe("a limit as it is written", () => {
  it.each([
    { stored: 0.1, unit: "percent", lengths: "mm", text: "10 %" },
    { stored: 0.07, unit: "percent", lengths: "mm", text: "7 %" },
    { stored: 7e-5, unit: "expansion", lengths: "in", text: "70 µm per m and K" },
    { stored: 20, unit: "kelvin", lengths: "mm", text: "20 K" },
    { stored: 4, unit: "points", lengths: "mm", text: "4 points" },
    { stored: 2, unit: "diameters", lengths: "mm", text: "2 diameters" },
    { stored: 1.5, unit: "colour difference", lengths: "mm", text: "1.5 ΔE00" },
    { stored: 45, unit: "degrees", lengths: "mm", text: "45°" },
    { stored: 3, unit: "to one", lengths: "mm", text: "3 : 1" },
    { stored: 300, unit: "number", lengths: "mm", text: "300" },
    { stored: 0.25, unit: "small length", lengths: "mm", text: "0.25 mm" },
    { stored: 0.5, unit: "small length", lengths: "in", text: "0.020″" },
    { stored: 900, unit: "length", lengths: "mm", text: "900 mm" },
    { stored: 914.4, unit: "length", lengths: "in", text: "36″" },
  ] as const)("$stored in $unit is $text where lengths are in $lengths", ({ stored, unit, lengths, text }) => {
    expect(formatLimit(stored, unit, lengths)).toBe(text);
  });

  it("comes back as it was shown, to the twelfth digit", () => {
    const units = Object.keys(figureUnits) as FigureUnit[];
    fc.assert(
      fc.property(fc.constantFrom(...units), fc.integer({ min: 0, max: 1_000_000 }), (unit, thousandths) => {
        const shown = thousandths / 1000;
        expect(shownFigure(storedFigure(shown, unit), unit)).toBe(shown);
      }),
    );
    // 10 typed where percent are shown is the default of a tenth, to the bit.
    expect(storedFigure(10, "percent")).toBe(0.1);
    expect(storedFigure(70, "expansion")).toBe(7e-5);
  });

  it("is no number where none was written", () => {
    expect(storedFigure(Number("ten"), "percent")).toBeNaN();
  });
});
