import { describe, expect, it } from "vitest";
import { contrastRatio } from "#shared/colour/contrast.ts";
import { colours } from "../../../tailwind.config.ts";

// Thresholds: WCAG 2.2, 1.4.3 (text, 4.5:1) and 1.4.11 (outlines of controls, 3:1).
const grounds = ["paper", "sheet", "linen"] as const;
const texts = ["ink", "graphite", "madder", "verdigris", "ochre", "indigo", "oxblood"] as const;
/** Filled buttons and marked text, all lettered in the sheet's white. */
const fills = ["madder", "verdigris", "oxblood", "indigo", "ink"] as const;
const outlines = ["ink", "graphite", "madder", "verdigris", "ochre", "indigo", "oxblood"] as const;

describe("the palette", () => {
  it.each(grounds.flatMap((ground) => texts.map((text) => ({ text, ground }))))(
    "text in $text reads on $ground",
    ({ text, ground }) => {
      expect(contrastRatio(colours[text], colours[ground])).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(fills.map((fill) => ({ fill })))("white lettering reads on $fill", ({ fill }) => {
    expect(contrastRatio(colours.sheet, colours[fill])).toBeGreaterThanOrEqual(4.5);
  });

  it.each((["paper", "sheet"] as const).flatMap((ground) => outlines.map((outline) => ({ outline, ground }))))(
    "a control outlined in $outline shows on $ground",
    ({ outline, ground }) => {
      expect(contrastRatio(colours[outline], colours[ground])).toBeGreaterThanOrEqual(3);
    },
  );

  it("keeps rule for decoration only: it is too light to bound a control", () => {
    expect(contrastRatio(colours.rule, colours.paper)).toBeLessThan(3);
  });
});
