import type { Piece } from "../mockup/document.ts";

/** A letter of the brief beside the letter of the sign. One of them is missing where the other has nothing beside it. */
export type ReadCell = {
  /** Its place among all, from 0. */
  readonly at: number;
  readonly brief: string | null;
  readonly sign: { readonly text: string; readonly pieceId: string } | null;
};

/** A line of the brief, word by word. */
export type ReadLine = { readonly words: readonly (readonly ReadCell[])[] };

export type ReadBack = {
  readonly lines: readonly ReadLine[];
  /** Letters of the sign, and how many places are not alike. */
  readonly letters: number;
  readonly differences: number;
};

export const isAlike = ({ brief, sign }: Pick<ReadCell, "brief" | "sign">): boolean =>
  brief !== null && brief === sign?.text;

type Reading = { readonly piece: Pick<Piece, "id" | "reads"> };

/** So many letters are compared; more than that is no sign. */
const mostLetters = 1200;

/**
 * The sign's letters, in reading order, beside those of the brief, so that as few places as can be differ. Spaces are not cut and not
 * compared. What the sign has more stands behind the letter that it follows.
 */
export function readBack(briefWords: string, letters: readonly Reading[]): ReadBack {
  const sign = letters
    .flatMap(({ piece }) => [...bare(piece.reads)].map((text) => ({ text, pieceId: piece.id })))
    .slice(0, mostLetters);
  const lines = briefWords
    .normalize("NFC")
    .split(/\r\n|\r|\n/)
    .map((line) => line.split(/\s+/u).filter((word) => word !== ""))
    .filter((words) => words.length > 0);
  const brief = lines
    .flat()
    .flatMap((word) => [...word])
    .slice(0, mostLetters);
  const beside = cellsOf(brief, sign);
  let at = 0;
  const take = (word: string): ReadCell[] => {
    const cells: ReadCell[] = [];
    let left = [...word].length;
    while (at < beside.length) {
      const cell = beside[at];
      if (!cell || (left === 0 && cell.brief !== null)) break;
      if (cell.brief !== null) left -= 1;
      cells.push(cell);
      at += 1;
    }
    return cells;
  };
  const read = lines.map((words): ReadLine => ({ words: words.map(take).filter((word) => word.length > 0) }));
  const rest = beside.slice(at);
  return {
    lines: rest.length > 0 ? [...read, { words: [rest] }] : read,
    letters: sign.length,
    differences: beside.filter((cell) => !isAlike(cell)).length,
  };
}

/** As letters are compared: composed, without spaces. */
const bare = (text: string): string => text.normalize("NFC").replace(/\s+/gu, "");

/** Both lists side by side with the fewest changes (R. A. Wagner and M. J. Fischer, Journal of the ACM 21, 1974). */
function cellsOf(brief: readonly string[], sign: readonly NonNullable<ReadCell["sign"]>[]): ReadCell[] {
  const width = sign.length + 1;
  // Fewest changes from the letters from here on.
  const least = new Uint16Array((brief.length + 1) * width);
  const cost = (i: number, j: number) => least[i * width + j] ?? 0;
  for (let i = brief.length; i >= 0; i--)
    for (let j = sign.length; j >= 0; j--) {
      if (i === brief.length) least[i * width + j] = sign.length - j;
      else if (j === sign.length) least[i * width + j] = brief.length - i;
      else {
        const change = brief[i] === sign[j]?.text ? 0 : 1;
        least[i * width + j] = Math.min(cost(i + 1, j + 1) + change, cost(i + 1, j) + 1, cost(i, j + 1) + 1);
      }
    }
  const cells: ReadCell[] = [];
  let i = 0;
  let j = 0;
  while (i < brief.length || j < sign.length) {
    const both = i < brief.length && j < sign.length;
    const change = brief[i] === sign[j]?.text ? 0 : 1;
    const isPair = both && cost(i, j) === cost(i + 1, j + 1) + change;
    const isMissing = !isPair && i < brief.length && (j === sign.length || cost(i, j) === cost(i + 1, j) + 1);
    cells.push({
      at: cells.length,
      brief: isPair || isMissing ? (brief[i] ?? null) : null,
      sign: isMissing ? null : (sign[j] ?? null),
    });
    if (isPair || isMissing) i += 1;
    if (!isMissing) j += 1;
  }
  return cells;
}
