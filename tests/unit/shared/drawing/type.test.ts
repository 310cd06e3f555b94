import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Font } from "#shared/drawing/display-list.ts";
import { measuredCharacters } from "#shared/drawing/letter-widths.ts";
import { capHeightShare, leastCapHeightMm, smallTextMm, textWidthMm, wrapText } from "#shared/drawing/type.ts";
import { openFont, setWidth } from "../../../support/text-boxes.ts";

const fonts: readonly Font[] = ["serif", "serif-bold", "serif-black", "sans", "sans-semibold"];

describe("letter widths", () => {
  it.each(fonts)("of %s are those of the font file, character by character", (font) => {
    for (const character of measuredCharacters) {
      expect(textWidthMm(character, font, 1000), character).toBeCloseTo(setWidth(character, font) * 1000, -0.3);
    }
  });

  it.each(fonts)("of %s make a sentence no narrower than the font sets it", (font) => {
    const text = "The chalk planets have no template: 49.5 mm, 4 × Ø8. AVATo";
    expect(textWidthMm(text, font, 1)).toBeGreaterThanOrEqual(setWidth(text, font) - 0.01);
  });

  it("give digits one width, so that columns of figures line up", () => {
    expect(textWidthMm("1111", "sans", 3.4)).toBe(textWidthMm("8888", "sans", 3.4));
  });

  it("are guessed wide for letters that were not measured", () => {
    expect(textWidthMm("Ж", "serif", 10)).toBe(9);
  });
});

describe("small text", () => {
  it.each(fonts)("in %s has capitals of 2.5 mm", (font) => {
    const file = openFont(font);
    expect(file.capHeight / file.unitsPerEm).toBeCloseTo(capHeightShare, 3);
    expect(smallTextMm * capHeightShare).toBeGreaterThanOrEqual(leastCapHeightMm);
  });
});

describe("wrapText", () => {
  it("breaks between words, before the measure is passed", () => {
    expect(wrapText("a standoff of nineteen", "sans", 10, 60)).toEqual(["a standoff", "of nineteen"]);
  });

  it("keeps what a no-break space holds together", () => {
    expect(wrapText("23\u00a05/8″ × 15\u00a03/4″", "sans", 10, 50)).toEqual(["23\u00a05/8″ ×", "15\u00a03/4″"]);
  });

  it("has nothing to say for nothing", () => {
    expect(wrapText("  ", "sans", 10, 60)).toEqual([]);
  });

  it("loses no letter and passes the measure with no line, even for words wider than it", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 60 }), fc.integer({ min: 15, max: 90 }), (text, width) => {
        const lines = wrapText(text, "serif", 10, width);
        expect(lines.join("").replace(/\s/g, "")).toBe(text.replace(/\s/g, ""));
        for (const line of lines) expect(textWidthMm(line, "serif", 10)).toBeLessThanOrEqual(width + 1e-9);
      }),
    );
  });
});
