/** A letter as it is read: one or more characters that make one sign to the eye, as é, with its place among all of the words. */
export type LetterOfWords = { readonly letter: number; readonly text: string };

const segmenter = new Intl.Segmenter("en", { granularity: "grapheme" });

/** The words letter by letter, composed (Unicode NFC), spaces and line feeds counted. */
export function lettersOfWords(words: string): readonly LetterOfWords[] {
  return [...segmenter.segment(words.normalize("NFC"))].map(({ segment }, letter) => ({ letter, text: segment }));
}

/** The same by lines, without the line feeds. */
export function linesOfWords(words: string): readonly (readonly LetterOfWords[])[] {
  const lines: LetterOfWords[][] = [[]];
  for (const one of lettersOfWords(words)) {
    if (one.text === "\n") lines.push([]);
    else lines.at(-1)?.push(one);
  }
  return lines;
}

/** Space of any width: it parts letters and is not cut. */
export const isSpace = (text: string): boolean => /^\s+$/u.test(text);

/** Characters without a shape of their own, as a soft hyphen. A face that lacks them lacks nothing. */
const isInvisible = (character: string): boolean => /^\p{Default_Ignorable_Code_Point}$/u.test(character);

/** A letter as it is drawn. */
export const withoutInvisible = (text: string): string => [...text].filter((one) => !isInvisible(one)).join("");

/** What is written of the words that `has` does not know, each once, in the order of the words. */
export function missingLetters(words: string, has: (codePoint: number) => boolean): string[] {
  const missing = lettersOfWords(words)
    .filter(({ text }) => !isSpace(text))
    .filter(({ text }) => [...withoutInvisible(text)].some((one) => !has(one.codePointAt(0) ?? 0)))
    .map(({ text }) => text);
  return [...new Set(missing)];
}

/** A letter with its number in Unicode, for those that one can't tell by looking. */
export function nameOfLetter(text: string): string {
  const numbers = [...text].map((one) => `U+${(one.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, "0")}`);
  return `${text} (${numbers.join(" ")})`;
}

/** Which letter of the words it is as people count them, from 1 and without spaces; `letter` counts from 0 and with them. */
export function numberOfLetter(words: string, letter: number): number {
  return lettersOfWords(words).filter((one) => one.letter <= letter && !isSpace(one.text)).length;
}
