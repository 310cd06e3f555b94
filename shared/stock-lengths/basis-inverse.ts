/** The inverse of a basis and what it gives, kept up as columns are exchanged. */
export type BasisInverse = {
  /** The inverse times a sparse column. */
  readonly times: (entries: Entries) => Float64Array;
  /** One row of the inverse, as a view that the next exchange changes. */
  readonly row: (at: number) => Float64Array;
  /** Puts a column in place of the one at `at`; `direction` is the inverse times that column. */
  readonly exchange: (direction: Float64Array, at: number) => void;
  /** Works everything out anew from the columns of the basis; false for a singular one, which changes nothing. */
  readonly renew: (basis: readonly Entries[]) => boolean;
};

/** A column: its amounts other than 0, by row. */
export type Entries = readonly (readonly [row: number, amount: number])[];

/** Smaller pivots are taken for nothing. */
const leastPivot = 1e-9;

/** The inverse of the unit basis with `size` rows. */
export function unitInverse(size: number): BasisInverse {
  let rows = unitRows(size);
  return {
    times: (entries) => {
      const result = new Float64Array(size);
      for (const [index, row] of rows.entries()) {
        let sum = 0;
        for (const [at, amount] of entries) sum += (row[at] ?? 0) * amount;
        result[index] = sum;
      }
      return result;
    },
    row: (at) => rows[at] ?? new Float64Array(size),
    exchange: (direction, at) => reduce(rows, direction, at),
    renew: (basis) => {
      const inverse = inverted(basis, size);
      if (inverse) rows = inverse;
      return inverse !== null;
    },
  };
}

/** The inverse by Gauss and Jordan with the largest pivot of each column; null when there is none. */
function inverted(basis: readonly Entries[], size: number): Float64Array[] | null {
  const inverse = unitRows(size);
  const columns = Array.from({ length: size }, () => new Float64Array(size));
  for (const [at, entries] of basis.entries()) {
    for (const [row, amount] of entries) columns[row]?.fill(amount, at, at + 1);
  }
  for (let at = 0; at < size; at += 1) {
    let pivotRow = at;
    for (let row = at + 1; row < size; row += 1) {
      if (Math.abs(columns[row]?.[at] ?? 0) > Math.abs(columns[pivotRow]?.[at] ?? 0)) pivotRow = row;
    }
    if (Math.abs(columns[pivotRow]?.[at] ?? 0) < leastPivot) return null;
    swap(columns, at, pivotRow);
    swap(inverse, at, pivotRow);
    const steps = Float64Array.from(columns, (line) => line[at] ?? 0);
    reduce(columns, steps, at);
    reduce(inverse, steps, at);
  }
  return inverse;
}

function unitRows(size: number): Float64Array[] {
  return Array.from({ length: size }, (_, at) => new Float64Array(size).fill(1, at, at + 1));
}

function swap(list: Float64Array[], one: number, other: number): void {
  const [first, second] = [list[one], list[other]];
  if (!first || !second) return;
  list[one] = second;
  list[other] = first;
}

/** Divides row `at` by its step and takes it out of every other row as often as that row's step says. */
function reduce(rows: readonly Float64Array[], steps: Float64Array, at: number): void {
  const pivotRow = rows[at];
  if (!pivotRow) return;
  const divisor = steps[at] ?? 1;
  // Most of a row is empty: only where something stands is there anything to take out.
  const places: number[] = [];
  for (let index = 0; index < pivotRow.length; index += 1) {
    const value = pivotRow[index] ?? 0;
    if (value === 0) continue;
    pivotRow[index] = value / divisor;
    places.push(index);
  }
  for (let row = 0; row < rows.length; row += 1) {
    const step = steps[row] ?? 0;
    const line = rows[row];
    if (row === at || step === 0 || !line) continue;
    for (const index of places) line[index] = (line[index] ?? 0) - step * (pivotRow[index] ?? 0);
  }
}
