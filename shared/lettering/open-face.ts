import type { Font } from "fontkit";

/** One step of a glyph's outline in font units, y up. */
export type GlyphStep = {
  readonly kind: "move" | "line" | "quadratic" | "cubic" | "close";
  /** x and y of the step's points in turn, handles first. */
  readonly numbers: readonly number[];
};

/** A glyph in its place in a line, in font units, y up. */
export type LineGlyph = {
  /** What of the text it stands for. A glyph made out of another one stands for nothing more. */
  readonly codePoints: readonly number[];
  readonly outline: readonly GlyphStep[];
  /** Its own width, and how far on the next glyph begins: what kerning gives or takes is the difference. */
  readonly width: number;
  readonly advance: number;
  /** From the pen's place, for marks over letters. */
  readonly shift: { readonly x: number; readonly y: number };
};

/** An opened font file, as far as setting words needs it. */
export type OpenFace = {
  /** Height of the outline of H in font units. The file's own figure for it is off by up to 4 % in some fonts. */
  readonly capHeight: number;
  readonly has: (codePoint: number) => boolean;
  /** The glyphs of one line from left to right, without ligatures, so that a letter is a piece. */
  readonly line: (text: string, options: { readonly kerning: boolean }) => readonly LineGlyph[];
};

/** Ligatures would make one piece of several letters; fractions turn figures into others. */
const unwanted = { liga: false, clig: false, dlig: false, frac: false };

const kinds: Readonly<Record<string, GlyphStep["kind"]>> = {
  moveTo: "move",
  lineTo: "line",
  quadraticCurveTo: "quadratic",
  bezierCurveTo: "cubic",
  closePath: "close",
};

/** A font that fontkit has opened. Throws a RangeError for one without capitals. */
export function openFace(font: Font): OpenFace {
  const capHeight = font.glyphForCodePoint("H".codePointAt(0) ?? 0).bbox.maxY;
  if (!(capHeight > 0)) throw new RangeError("A face without capitals has no cap height.");
  return {
    capHeight,
    has: (codePoint) => font.hasGlyphForCodePoint(codePoint),
    line: (text, { kerning }) => {
      const { glyphs, positions } = font.layout(text, { ...unwanted, kern: kerning });
      return glyphs.map((glyph, index) => {
        const place = positions[index];
        return {
          codePoints: glyph.codePoints,
          outline: glyph.path.commands.flatMap(({ command, args }) => {
            const kind = kinds[command];
            return kind ? [{ kind, numbers: args }] : [];
          }),
          width: glyph.advanceWidth,
          advance: place?.xAdvance ?? glyph.advanceWidth,
          shift: { x: place?.xOffset ?? 0, y: place?.yOffset ?? 0 },
        };
      });
    },
  };
}
