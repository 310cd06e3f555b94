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

/** Keeps the darker of a mask and a smaller one laid on it with its upper left cell at (column, row), cell by cell, in the first. */
export function keepDarker(into: Mask, patch: Mask, column: number, row: number): void {
  for (let y = 0; y < patch.rows; y += 1) {
    const target = (row + y) * into.columns + column;
    for (let x = 0; x < patch.columns; x += 1) {
      const value = patch.cells[y * patch.columns + x] ?? 0;
      if (value > (into.cells[target + x] ?? 0)) into.cells[target + x] = value;
    }
  }
}

const passes = 3;

/**
 * Three means over `width` cells along each row, in place. The width need not be whole: sums are read between cells too, so
 * that the blur has exactly the spread asked for. Outside the row there is no shadow.
 */
function blurRows(cells: Float32Array, columns: number, rows: number, width: number): void {
  // Before the row the sums are 0 and after it they stay at the total, so that no place needs a check.
  const pad = Math.ceil(width / 2) + 2;
  const sums = new Float64Array(columns + 2 * pad + 1);
  const [from, to] = [pad + 0.5 - width / 2, pad + 0.5 + width / 2];
  const [lowAt, highAt] = [Math.floor(from), Math.floor(to)];
  const [lowShare, highShare] = [from - lowAt, to - highAt];
  for (let row = 0; row < rows; row += 1) {
    const start = row * columns;
    for (let pass = 0; pass < passes; pass += 1) {
      let sum = 0;
      for (let index = 0; index < columns; index += 1) {
        sum += cells[start + index] ?? 0;
        sums[pad + index + 1] = sum;
      }
      if (sum === 0) break;
      sums.fill(sum, pad + columns + 1);
      for (let index = 0; index < columns; index += 1) {
        const low = sums[index + lowAt] ?? 0;
        const high = sums[index + highAt] ?? 0;
        const lowSum = low + ((sums[index + lowAt + 1] ?? 0) - low) * lowShare;
        const highSum = high + ((sums[index + highAt + 1] ?? 0) - high) * highShare;
        cells[start + index] = (highSum - lowSum) / width;
      }
    }
  }
}

function turnOver(cells: Float32Array, columns: number, rows: number): Float32Array {
  const turned = new Float32Array(cells.length);
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      turned[column * rows + row] = cells[row * columns + column] ?? 0;
    }
  }
  return turned;
}

/**
 * Width in cells of the three boxes that together spread like a Gaussian of `sigma` cells. A box of width w adds w²/12 to the
 * variance; cells themselves add 1/12 when the outline is sampled, 1/12 in each pass and 1/6 when the result is read between them.
 */
const boxWidth = (sigma: number): number => Math.sqrt(Math.max(0, 4 * sigma * sigma - 2));

/**
 * Blurs a mask in place by three box passes each way, which come within 1 % of a Gaussian of these sigmas (in cells). Boxes of
 * up to one cell change nothing and are left out.
 */
export function blurMask({ cells, columns, rows }: Mask, sigmaColumns: number, sigmaRows: number): void {
  const [across, down] = [boxWidth(sigmaColumns), boxWidth(sigmaRows)];
  if (across > 1) blurRows(cells, columns, rows, across);
  if (down > 1) {
    const turned = turnOver(cells, columns, rows);
    blurRows(turned, rows, columns, down);
    cells.set(turnOver(turned, rows, columns));
  }
}

/** The value at a place given in cells, between the middles of the four cells around it; nothing at the rim and outside. */
export function maskAt({ columns, rows, cells }: Mask, x: number, y: number): number {
  const left = Math.floor(x - 0.5);
  const top = Math.floor(y - 0.5);
  if (left < 0 || top < 0 || left + 1 >= columns || top + 1 >= rows) return 0;
  const shareX = x - 0.5 - left;
  const shareY = y - 0.5 - top;
  const at = top * columns + left;
  const upper = (cells[at] ?? 0) * (1 - shareX) + (cells[at + 1] ?? 0) * shareX;
  const lower = (cells[at + columns] ?? 0) * (1 - shareX) + (cells[at + columns + 1] ?? 0) * shareX;
  return upper * (1 - shareY) + lower * shareY;
}
