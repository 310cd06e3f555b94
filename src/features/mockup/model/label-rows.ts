type Label = {
  readonly x: number;
  readonly width: number /** Said whatever else must go. */;
  readonly first?: boolean;
};

/** Room between two labels of a row, px. */
const gapPx = 4;

/**
 * In which of `rows` rows each centred label stands so that none runs into another, by index; null for one that finds no
 * room. From left to right, after those that come first.
 */
export function labelRows(labels: readonly Label[], rows: number): (number | null)[] {
  const taken: { readonly left: number; readonly right: number }[][] = Array.from({ length: rows }, () => []);
  const placed: (number | null)[] = labels.map(() => null);
  const order = labels
    .map((label, index) => ({ ...label, index }))
    .toSorted((a, b) => Number(b.first ?? false) - Number(a.first ?? false) || a.x - b.x || a.index - b.index);
  for (const { x, width, index } of order) {
    const [left, right] = [x - width / 2, x + width / 2];
    const row = taken.findIndex((others) =>
      others.every((other) => right + gapPx <= other.left || other.right + gapPx <= left),
    );
    if (row < 0) continue;
    taken[row]?.push({ left, right });
    placed[index] = row;
  }
  return placed;
}
