import { describe, expect, it } from "vitest";
import * as palette from "#shared/drawing/palette.ts";
import { colours } from "../../../../tailwind.config.ts";

describe("the drawing's inks", () => {
  it("are the theme's own", () => {
    const { ink, graphite, rule, linen, sheetWhite, madder, verdigris, ochre, oxblood } = palette;
    expect({ ink, graphite, rule, linen, sheet: sheetWhite, madder, verdigris, ochre, oxblood }).toEqual({
      ink: colours.ink,
      graphite: colours.graphite,
      rule: colours.rule,
      linen: colours.linen,
      sheet: colours.sheet,
      madder: colours.madder,
      verdigris: colours.verdigris,
      ochre: colours.ochre,
      oxblood: colours.oxblood,
    });
  });
});

describe("mixColours", () => {
  it.each([
    [0, "#102030"],
    [1, "#F0E0D0"],
    [0.25, "#485058"],
  ])("a share of %d gives %s", (share, mixed) => {
    expect(palette.mixColours("#102030", "#F0E0D0", share)).toBe(mixed);
  });

  it.each(["#12345", "red", "#12345G"])("refuses %s", (colour) => {
    expect(() => palette.mixColours(colour, "#000000", 0.5)).toThrow(/Not a colour/);
  });
});
