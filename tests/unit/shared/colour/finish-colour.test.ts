import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { colouringCoats, finishColour } from "#shared/colour/finish-colour.ts";
import { colourOf, deltaE00, labOf } from "#shared/colour/lab.ts";
import type { Coat } from "#shared/mockup/document.ts";

const stain = (colour: string, strength: number): Coat => ({
  kind: "stain",
  name: "Stain",
  colour,
  strength,
  dryingHours: 8,
});
const clear = (base: "water-borne" | "oil or shellac"): Coat => ({
  kind: "clear coat",
  name: "Clear",
  base,
  dryingHours: 2,
});
const pine = "#E6CFA4";

describe("wood under its finish", () => {
  it("keeps its colour to the letter under what does not colour it", () => {
    const plain: Coat[] = [
      { kind: "sanding", grit: 180 },
      { kind: "conditioner", name: "Conditioner", dryingHours: 1 },
      { kind: "other", name: "Wax", dryingHours: 1 },
    ];
    expect(colouringCoats(plain)).toEqual([]);
    expect(finishColour(pine, plain)).toBe(pine);
    expect(finishColour(pine, [])).toBe(pine);
  });

  it("takes the stain's colour when it covers, and lies between the two when it does not", () => {
    expect(finishColour(pine, [stain("#3A2415", 1)])).toBe("#3A2415");
    const half = labOf(finishColour(pine, [stain("#3A2415", 0.5)])).L;
    expect(half).toBeCloseTo((labOf(pine).L + labOf("#3A2415").L) / 2, 0);
  });

  it("is darker under oil than under a water-borne coat, 8 and 3 of CIELAB's lightness", () => {
    const lightness = (finish: Coat[]) => labOf(finishColour(pine, finish)).L;
    expect(labOf(pine).L - lightness([clear("water-borne")])).toBeCloseTo(3, 0);
    expect(labOf(pine).L - lightness([clear("oil or shellac")])).toBeCloseTo(8, 0);
  });
});

it("a colour comes back from CIELAB as it went in", () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 0xffffff }), (value) => {
      const colour = `#${value.toString(16).padStart(6, "0").toUpperCase()}`;
      expect(colourOf(labOf(colour))).toBe(colour);
    }),
  );
  // Beyond what a screen shows: still a colour, and the nearest green there is.
  expect(deltaE00(labOf(colourOf({ L: 60, a: -120, b: 90 })), labOf("#00FF00"))).toBeLessThan(25);
});
