import { lettersOfWords } from "./letters-of-words.ts";

/**
 * For each letter of the new words the place of the same letter in the old ones, or null. Letters that stayed at the beginning
 * and at the end are found again when others came or went between them; between those, a letter is the same that stands at
 * the same place.
 */
export function matchLetters(before: string, after: string): readonly (number | null)[] {
  const old = lettersOfWords(before).map(({ text }) => text);
  const next = lettersOfWords(after).map(({ text }) => text);
  const shorter = Math.min(old.length, next.length);
  let head = 0;
  while (head < shorter && old[head] === next[head]) head++;
  let tail = 0;
  while (tail < shorter - head && old[old.length - 1 - tail] === next[next.length - 1 - tail]) tail++;
  return next.map((text, index) => {
    if (index < head) return index;
    if (index >= next.length - tail) return index - next.length + old.length;
    return index < old.length - tail && old[index] === text ? index : null;
  });
}
