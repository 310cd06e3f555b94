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
  /** The glyphs of one line from left to right. Ligatures are taken apart, so that a letter is a piece. */
  readonly line: (text: string, options: { readonly kerning: boolean }) => readonly LineGlyph[];
};

const kinds: Readonly<Record<string, GlyphStep["kind"]>> = {
  moveTo: "move",
  lineTo: "line",
  quadraticCurveTo: "quadratic",
  bezierCurveTo: "cubic",
  closePath: "close",
};

/** Lines that are kept laid: as many as are written at a time. */
const mostKept = 40;

/**
 * A face by what opens its font with fontkit, anew each time it is called. Throws a RangeError for one without capitals.
 */
export function openFace(open: () => Font): OpenFace {
  const font = open();
  const capHeight = font.glyphForCodePoint("H".codePointAt(0) ?? 0).bbox.maxY;
  if (!(capHeight > 0)) throw new RangeError("A face without capitals has no cap height.");
  const kept = new Map<string, readonly LineGlyph[]>();
  return {
    capHeight,
    has: (codePoint) => font.hasGlyphForCodePoint(codePoint),
    line: (text, { kerning }) => {
      const key = `${kerning} ${text}`;
      const laid =
        kept.get(key) ??
        lettersApart(laidLine(font, open, text, { kern: kerning }), () =>
          laidLine(font, open, text, { kern: kerning, ...apart }),
        );
      if (kept.size >= mostKept) kept.clear();
      kept.set(key, laid);
      return laid;
    },
  };
}

/** Without what makes one glyph of several letters. */
const apart = { liga: false, clig: false, dlig: false };

/**
 * A line with what each glyph stands for. fontkit keeps glyphs and remembers of each what it first stood for, which was nothing when
 * it was opened as the letter under an accent. So where there are as many glyphs as characters they are taken one by one, and else
 * the font is opened anew.
 */
function laidLine(font: Font, open: () => Font, text: string, features: Record<string, boolean>): LineGlyph[] {
  const characters = [...text].map((one) => one.codePointAt(0) ?? 0);
  const glyphs = glyphsOf(font, text, features);
  if (glyphs.length !== characters.length) return glyphsOf(open(), text, features);
  return glyphs.map((glyph, index) => ({ ...glyph, codePoints: characters.slice(index, index + 1) }));
}

function glyphsOf(font: Font, text: string, features: Record<string, boolean>): LineGlyph[] {
  // Fractions would turn figures into others.
  const { glyphs, positions } = font.layout(text, { ...features, frac: false });
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
}

/**
 * A line as the face wants it, but for its ligatures. They can't simply be switched off: scripts use the same feature to give a
 * letter the form that meets its neighbour. So each letter that is a glyph of its own keeps that form, and the others come
 * from the line that was laid without ligatures.
 */
function lettersApart(joined: readonly LineGlyph[], layPlain: () => readonly LineGlyph[]): readonly LineGlyph[] {
  if (joined.every(({ codePoints }) => codePoints.length === 1)) return joined;
  const wanted = clustersOf(joined);
  return [...clustersOf(layPlain())].flatMap(([key, glyphs]) => wanted.get(key) ?? glyphs);
}

/** Glyphs by the stretch of the text that they stand for. */
function clustersOf(glyphs: readonly LineGlyph[]): ReadonlyMap<string, readonly LineGlyph[]> {
  const clusters = new Map<string, LineGlyph[]>();
  let at = 0;
  let own: LineGlyph[] = [];
  for (const glyph of glyphs) {
    const { length } = glyph.codePoints;
    if (length > 0 || own.length === 0) {
      own = [];
      clusters.set(`${at}+${length}`, own);
      at += length;
    }
    own.push(glyph);
  }
  return clusters;
}
