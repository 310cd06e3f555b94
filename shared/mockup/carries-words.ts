/** Words of this many letters and more are looked for: shorter ones stand in half of all names. */
const leastLetters = 3;

/** Whether a name has one of the words of these texts in it, whatever its capitals: "Heron rings" carries "HERON & WEIR". */
export function carriesWords(name: string, texts: readonly string[]): boolean {
  const folded = fold(name);
  return texts
    .flatMap((text) => fold(text).split(/[^\p{L}\p{N}]+/u))
    .some((word) => [...word].length >= leastLetters && folded.includes(word));
}

const fold = (text: string): string => text.normalize("NFKC").toLowerCase();
