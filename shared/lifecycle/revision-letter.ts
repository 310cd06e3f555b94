/** The alphabet without I, O, Q, S, X and Z, which are mistaken for figures or for each other (ASME Y14.35). */
const letters = "ABCDEFGHJKLMNPRTUVWY";

/**
 * The letter of the revision at `index`, from 0: A to Y, then AA, AB and so on (ASME Y14.35). Throws for what is no
 * index.
 */
export function revisionLetter(index: number): string {
  if (!Number.isSafeInteger(index) || index < 0) throw new RangeError(`${index} is no place in a row of revisions.`);
  const last = letters[index % letters.length] ?? "";
  return index < letters.length ? last : revisionLetter(Math.floor(index / letters.length) - 1) + last;
}

/** The place of a letter in the row, from 0; null for a text that is no revision letter. */
export function revisionIndex(letter: string): number | null {
  if (letter.length === 0 || letter.length > 8) return null;
  let index = -1;
  for (const character of letter) {
    const place = letters.indexOf(character);
    if (place < 0) return null;
    index = (index + 1) * letters.length + place;
  }
  return index;
}

/** The letter after `letter`; A when there is none before. Throws for a text that is no revision letter. */
export function nextRevisionLetter(letter: string | null): string {
  if (letter === null) return revisionLetter(0);
  const index = revisionIndex(letter);
  if (index === null) throw new RangeError(`${letter} is no revision letter.`);
  return revisionLetter(index + 1);
}
