/** Light held back, 0 to 1 a cell, row by row. Cell (0, 0) starts at the upper left. */
export type Mask = { readonly columns: number; readonly rows: number; readonly cells: Float32Array };

export function emptyMask(columns: number, rows: number): Mask {
  return { columns, rows, cells: new Float32Array(columns * rows) };
}

/** Adds the part of each cell of a row that a span covers, with a weight. Ends are in cells and may lie anywhere. */
export function addSpan(mask: Mask, row: number, from: number, to: number, weight: number): void {
  const start = Math.max(0, from);
  const end = Math.min(mask.columns, to);
  if (end <= start) return;
  const first = Math.floor(start);
  const last = Math.min(mask.columns - 1, Math.ceil(end) - 1);
  for (let column = first; column <= last; column += 1) {
    const covered = Math.min(end, column + 1) - Math.max(start, column);
    const at = row * mask.columns + column;
    mask.cells[at] = (mask.cells[at] ?? 0) + covered * weight;
  }
}

/** Keeps the darker of two masks of one size, cell by cell, in the first. */
export function keepDarker(into: Mask, other: Mask): void {
  for (let at = 0; at < into.cells.length; at += 1) {
    const value = other.cells[at] ?? 0;
    if (value > (into.cells[at] ?? 0)) into.cells[at] = value;
  }
}

/**
 * One mean over `width` cells along a line of cells that lie `step` apart. The width need not be whole: the sums are read
 * between cells too, so that the blur has exactly the spread asked for. Outside the line there is no shadow.
 */
function boxPass(cells: Float32Array, start: number, step: number, count: number, width: number, sums: Float64Array) {
  sums[0] = 0;
  for (let index = 0; index < count; index += 1) {
    sums[index + 1] = (sums[index] ?? 0) + (cells[start + index * step] ?? 0);
  }
  const total = sums[count] ?? 0;
  const sumTo = (at: number) => {
    if (at <= 0) return 0;
    if (at >= count) return total;
    const whole = Math.floor(at);
    const before = sums[whole] ?? 0;
    return before + ((sums[whole + 1] ?? before) - before) * (at - whole);
  };
  for (let index = 0; index < count; index += 1) {
    const middle = index + 0.5;
    cells[start + index * step] = (sumTo(middle + width / 2) - sumTo(middle - width / 2)) / width;
  }
}

const passes = 3;

/**
 * Blurs a mask in place by three box passes each way, which come within 1 % of a Gaussian of these sigmas (in cells): the
 * spread of a box of width w is w²/12, so each of the three is 2σ wide. Boxes of up to one cell change nothing and are left out.
 */
export function blurMask(mask: Mask, sigmaColumns: number, sigmaRows: number): void {
  const sums = new Float64Array(Math.max(mask.columns, mask.rows) + 1);
  for (let pass = 0; pass < passes; pass += 1) {
    if (2 * sigmaColumns > 1) {
      for (let row = 0; row < mask.rows; row += 1) {
        boxPass(mask.cells, row * mask.columns, 1, mask.columns, 2 * sigmaColumns, sums);
      }
    }
    if (2 * sigmaRows > 1) {
      for (let column = 0; column < mask.columns; column += 1) {
        boxPass(mask.cells, column, mask.columns, mask.rows, 2 * sigmaRows, sums);
      }
    }
  }
}

/** The value at a place given in cells, between the middles of the four cells around it; nothing outside. */
export function maskAt(mask: Mask, x: number, y: number): number {
  const left = Math.floor(x - 0.5);
  const top = Math.floor(y - 0.5);
  const shareX = x - 0.5 - left;
  const shareY = y - 0.5 - top;
  const cell = (column: number, row: number) =>
    column < 0 || row < 0 || column >= mask.columns || row >= mask.rows
      ? 0
      : (mask.cells[row * mask.columns + column] ?? 0);
  const upper = cell(left, top) * (1 - shareX) + cell(left + 1, top) * shareX;
  const lower = cell(left, top + 1) * (1 - shareX) + cell(left + 1, top + 1) * shareX;
  return upper * (1 - shareY) + lower * shareY;
}
