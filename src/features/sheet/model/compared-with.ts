type Lettered = { readonly letter: string };

/** Letters in the order they are given: A to Y, then AA (ASME Y14.35). Negative when `a` came before `b`. */
export function compareLetters(a: Lettered, b: Lettered): number {
  return a.letter.length - b.letter.length || (a.letter < b.letter ? -1 : Number(a.letter > b.letter));
}

/** The other letter that this one is best compared with: the one before it, else the one after it; null when it is alone. */
export function comparedWith<Other extends Lettered>(letter: string, others: readonly Other[]): Other | null {
  const sorted = others.filter((other) => other.letter !== letter).sort(compareLetters);
  return sorted.findLast((other) => compareLetters(other, { letter }) < 0) ?? sorted[0] ?? null;
}
