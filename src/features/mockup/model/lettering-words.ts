import type { LaidWords } from "#shared/lettering/lay-words.ts";
import { lettersOfWords, nameOfLetter } from "#shared/lettering/letters-of-words.ts";

/** More than so many are counted, not named. */
const mostNamed = 6;

/** What a face has no letter for, in a sentence; null when it has them all. */
export function missingWords(missing: readonly string[], face: string): string | null {
  if (missing.length === 0) return null;
  return `${face} has no letter for ${listed(missing.map(nameOfLetter))}. Choose another face, or write it with other letters.`;
}

/** Which letters run into each other, in a sentence; null when none do. */
export function touchingWords({ touching, letters }: Pick<LaidWords, "touching" | "letters">): string | null {
  if (touching.length === 0) return null;
  const readAt = new Map(letters.map(({ letter, reads }) => [letter, reads]));
  const pairs = touching.map(([a, b]) => `${readAt.get(a) ?? ""}${readAt.get(b) ?? ""}`);
  const them = pairs.length === 1 ? "Two letters run into each other" : "Letters run into each other";
  return `${them}: ${listed(pairs)}. As pieces of one sheet they can’t be cut so. Space them out, or join them to one piece: they are chosen when they lie on the board, ready for it.`;
}

/** The words on one line, in short, as lists and history name them. */
export function shortWords(words: string): string {
  const line = words.trim().replace(/\s+/gu, " ");
  const letters = lettersOfWords(line);
  return letters.length > 28
    ? `${letters
        .slice(0, 27)
        .map(({ text }) => text)
        .join("")}…`
    : line;
}

function listed(names: readonly string[]): string {
  const shown = names.slice(0, mostNamed);
  const rest = names.length - shown.length;
  if (rest > 0) return `${shown.join(", ")} and ${rest} more`;
  return shown.length < 2 ? shown.join("") : `${shown.slice(0, -1).join(", ")} and ${shown.at(-1)}`;
}
