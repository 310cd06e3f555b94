/**
 * Solves `matrix` · x = `right` by elimination with the largest pivot of each column. Null when a column has none to speak
 * of beside the largest entry.
 */
export function solveLinear(matrix: readonly (readonly number[])[], right: readonly number[]): number[] | null {
  const size = right.length;
  const rows = matrix.map((row, index) => [...row, right[index] ?? 0]);
  const at = (row: number, column: number): number => rows[row]?.[column] ?? 0;
  const largest = Math.max(...rows.flatMap((row) => row.slice(0, size).map(Math.abs)), 0);
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let row = column + 1; row < size; row++)
      if (Math.abs(at(row, column)) > Math.abs(at(pivot, column))) pivot = row;
    const [chosen, top] = [rows[pivot], rows[column]];
    if (!chosen || !top || Math.abs(at(pivot, column)) <= largest * 1e-14) return null;
    [rows[column], rows[pivot]] = [chosen, top];
    for (let row = column + 1; row < size; row++) {
      const factor = at(row, column) / at(column, column);
      const lower = rows[row];
      if (lower)
        for (let place = column; place <= size; place++) lower[place] = at(row, place) - factor * at(column, place);
    }
  }
  const found: number[] = new Array(size).fill(0);
  for (let row = size - 1; row >= 0; row--) {
    let sum = at(row, size);
    for (let column = row + 1; column < size; column++) sum -= at(row, column) * (found[column] ?? 0);
    found[row] = sum / at(row, row);
  }
  return found;
}
