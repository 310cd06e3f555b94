import { readFileSync } from "node:fs";
import { create } from "fontkit";
import { describe, expect, it } from "vitest";
import { unpackWoff } from "#server/artwork/unpack-woff.ts";

const woff = readFileSync(
  new URL(
    "../../../../node_modules/@fontsource/merriweather/files/merriweather-latin-400-normal.woff",
    import.meta.url,
  ),
);

describe("unpacking a WOFF font", () => {
  it("gives a TrueType font with the same outlines, as an independent reader sees both", () => {
    const packed = create(woff);
    const plain = create(unpackWoff(woff));
    if (!("layout" in packed) || !("layout" in plain)) throw new Error("A collection, not a font.");
    const outline = (font: typeof packed) => font.layout("Hamburg & 1/2").glyphs.map((glyph) => glyph.path.toSVG());
    expect(outline(plain)).toEqual(outline(packed));
    expect(plain.familyName).toBe("Merriweather");
  });

  it("lays every table on a multiple of four bytes inside the file", () => {
    const font = unpackWoff(woff);
    const count = font.readUInt16BE(4);
    expect(count).toBeGreaterThan(8);
    for (let index = 0; index < count; index++) {
      const at = 12 + 16 * index;
      expect(font.readUInt32BE(at + 8) % 4).toBe(0);
      expect(font.readUInt32BE(at + 8) + font.readUInt32BE(at + 12)).toBeLessThanOrEqual(font.length);
    }
  });

  it("refuses what is not WOFF", () => {
    expect(() => unpackWoff(Buffer.from("wOF2".padEnd(60)))).toThrow("Not a WOFF file.");
  });
});
