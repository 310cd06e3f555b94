import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { z } from "zod";
import { contrastRatio, relativeLuminance } from "#shared/colour/contrast.ts";
import { checkReference } from "../support/check-reference.ts";

// W3C, Web Content Accessibility Guidelines 2.2, "relative luminance" and "contrast ratio".
const { pairs } = z
  .object({
    pairs: z.array(z.object({ fg: z.string(), bg: z.string(), L_fg: z.number(), L_bg: z.number(), ratio: z.number() })),
  })
  .parse(JSON.parse(readFileSync(new URL("../fixtures/reference/wcag-contrast.json", import.meta.url), "utf8")));

it("the table has its 20 pairs", () => {
  expect(pairs).toHaveLength(20);
});

it.each(pairs)("$fg on $bg has $ratio : 1", ({ fg, bg, L_fg, L_bg, ratio }) => {
  expect(relativeLuminance(fg)).toBeCloseTo(L_fg, 5);
  expect(relativeLuminance(bg)).toBeCloseTo(L_bg, 5);
  checkReference({
    what: `contrast ratio of ${fg} on ${bg}`,
    source: "WCAG 2.2",
    expected: ratio,
    got: contrastRatio(fg, bg),
    within: 5e-5,
  });
  expect(contrastRatio(bg, fg)).toBe(contrastRatio(fg, bg));
});

it("what is no colour is refused", () => {
  expect(() => contrastRatio("#FFFFFF", "white")).toThrow(RangeError);
});
