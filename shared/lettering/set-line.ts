import type { Path } from "../geometry/path.ts";
import { glyphPath } from "./glyph-path.ts";
import type { Setting } from "./lay-words.ts";
import { isSpace, type LetterOfWords, linesOfWords, missingLetters, withoutInvisible } from "./letters-of-words.ts";
import type { LineGlyph, OpenFace } from "./open-face.ts";

/** A letter on the pen's line. */
export type SetLetter = {
  readonly letter: number;
  readonly reads: string;
  /** mm about the foot of its middle, y down, contours as the font has them. Empty for a space, and for what the face lacks. */
  readonly contours: Path;
  /** How far along the line the middle of its width stands, mm. */
  readonly middle: number;
};

/** The words of a setting line by line, each from the pen's start, before they are lined up. */
export function setLines(
  { words, capHeight, letterSpacing, kerning }: Omit<Setting, "lineSpacing" | "align" | "along">,
  face: OpenFace,
): readonly (readonly SetLetter[])[] {
  const mmPerUnit = capHeight / face.capHeight;
  return linesOfWords(words).map((line) => {
    let pen = 0;
    return glyphsByLetter(line, face, kerning).map(({ letter, reads, glyphs }) => {
      const width = glyphs[0]?.width ?? 0;
      const contours: Path[number][] = [];
      let advance = 0;
      for (const { outline, shift, advance: own } of glyphs) {
        contours.push(...glyphPath(outline, { mmPerUnit, shift: { x: shift.x + advance - width / 2, y: shift.y } }));
        advance += own;
      }
      const middle = pen + (width / 2) * mmPerUnit;
      // What takes no room, as a soft hyphen, takes no space after it either.
      pen += glyphs.length === 0 ? 0 : advance * mmPerUnit + letterSpacing;
      const isCut = !isSpace(reads) && missingLetters(reads, face.has).length === 0;
      return { letter, reads, contours: isCut ? contours : [], middle };
    });
  });
}

type LetterGlyphs = { readonly letter: number; reads: string; readonly glyphs: LineGlyph[] };

/** The glyphs of a line under the letters that they stand for. A glyph for several letters makes them one that reads as all of them. */
function glyphsByLetter(line: readonly LetterOfWords[], face: OpenFace, kerning: boolean): LetterGlyphs[] {
  const drawn = line.map((one) => ({ ...one, drawn: isSpace(one.text) ? " " : withoutInvisible(one.text) }));
  const owners = drawn.flatMap((one, index) => [...one.drawn].map(() => index));
  const letters = line.map(({ letter, text }): LetterGlyphs => ({ letter, reads: text, glyphs: [] }));
  let at = 0;
  for (const glyph of face.line(drawn.map((one) => one.drawn).join(""), { kerning })) {
    const from = owners[glyph.codePoints.length > 0 ? at : Math.max(0, at - 1)];
    at += glyph.codePoints.length;
    const owner = from === undefined ? undefined : letters[from];
    if (from === undefined || !owner) continue;
    owner.glyphs.push(glyph);
    const last = owners[at - 1] ?? from;
    for (let index = from + 1; index <= last; index++) {
      const joined = letters[index];
      if (!joined) continue;
      owner.reads += joined.reads;
      joined.reads = "";
    }
  }
  return letters;
}
