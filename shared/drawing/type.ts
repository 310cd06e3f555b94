import type { Font } from "./display-list.ts";
import { letterWidths, measuredCharacters } from "./letter-widths.ts";

/** Cap height of both families as a share of the em (1486 of 2000 units, from the font files). */
export const capHeightShare = 0.743;

/** Nothing on a printed sheet is lettered lower than this: 2.5 mm is our own floor, the least nominal size ISO 3098 lists for drawings beside 1.8. */
export const leastCapHeightMm = 2.5;

/** The em size whose capitals are 2.5 mm high, rounded up. */
export const smallTextMm = 3.4;

/** What a character outside the measured ones is taken to need, as a share of the em: wider than nearly all of them. */
const unmeasuredShare = 0.9;

const positions = new Map<string, number>();
for (const character of measuredCharacters) positions.set(character, positions.size);

/**
 * How far a line of text runs, in the unit of `sizeMm`, without kerning (which makes nearly every line a little shorter).
 * Characters outside Latin-1 are estimated high, so that a layout that trusts this never overlaps.
 */
export function textWidthMm(text: string, font: Font, sizeMm: number): number {
  const widths = letterWidths[font];
  let thousandths = 0;
  for (const character of text) {
    const position = positions.get(character);
    thousandths += position === undefined ? unmeasuredShare * 1000 : (widths[position] ?? unmeasuredShare * 1000);
  }
  return (thousandths / 1000) * sizeMm;
}

/** Cuts a word that alone is wider than the measure, so that no line runs out of its box. */
function breakWord(word: string, fits: (text: string) => boolean): string[] {
  const parts: string[] = [];
  let part = "";
  for (const character of word) {
    if (part !== "" && !fits(part + character)) {
      parts.push(part);
      part = "";
    }
    part += character;
  }
  return [...parts, part];
}

/** Breaks text at spaces (not at no-break ones) into lines no wider than `widthMm`; a newline starts a new line, an overlong word is cut. Empty text gives no lines. */
export function wrapText(text: string, font: Font, sizeMm: number, widthMm: number): string[] {
  const fits = (line: string) => textWidthMm(line, font, sizeMm) <= widthMm;
  const lines: string[] = [];
  if (text.trim() === "") return lines;
  for (const paragraph of text.split("\n")) {
    let line = "";
    for (const word of paragraph.split(/[ \t\r]+/).flatMap((each) => (fits(each) ? [each] : breakWord(each, fits)))) {
      const longer = line === "" ? word : `${line} ${word}`;
      if (line !== "" && !fits(longer)) {
        lines.push(line);
        line = word;
      } else line = longer;
    }
    lines.push(line);
  }
  return lines;
}
