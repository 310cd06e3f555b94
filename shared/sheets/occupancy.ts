import type { CellMask } from "./cell-mask.ts";

/**
 * Which cells of a sheet are taken. `jumps` holds for each cell, column by column: where the next taken cell of its
 * column is when it is free (the number of rows when there is none), or minus the end of its taken run when it is taken.
 * One look then tells whether a run of cells is free, and how far to go on when it is not.
 */
export type Occupancy = {
  readonly columns: number;
  readonly rows: number;
  readonly taken: Uint8Array;
  readonly jumps: Int16Array;
};

/** A grid without anything on it. At most 32,000 rows. */
export function emptyOccupancy(columns: number, rows: number): Occupancy {
  return {
    columns,
    rows,
    taken: new Uint8Array(columns * rows),
    jumps: new Int16Array(columns * rows).fill(rows),
  };
}

/** Takes the cells of a mask at that column and row, or frees them. Changes the grid. */
export function stamp(grid: Occupancy, mask: CellMask, column: number, row: number, value: 0 | 1): void {
  for (let run = 0; run < mask.runColumns.length; run++) {
    const base = (column + (mask.runColumns[run] ?? 0)) * grid.rows + row;
    grid.taken.fill(value, base + (mask.runStarts[run] ?? 0), base + (mask.runEnds[run] ?? 0));
  }
  for (let at = 0; at < mask.columns; at++)
    refreshJumps(grid, column + at, row + (mask.lows[at] ?? 0), row + (mask.highs[at] ?? 0));
}

/** Works the jumps of a column out again after its cells changed from row `low` up to but not including `high`. Changes the grid. */
export function refreshJumps({ rows, taken, jumps }: Occupancy, column: number, low: number, high: number): void {
  const base = column * rows;
  const above = high < rows ? (jumps[base + high] ?? rows) : rows;
  let nextTaken = above < 0 ? high : above;
  let runEnd = above < 0 ? -above : rows;
  for (let row = high - 1; row >= 0; row--) {
    let jump = nextTaken;
    if (taken[base + row] === 1) {
      if (nextTaken !== row + 1) runEnd = row + 1;
      nextTaken = row;
      jump = -runEnd;
    }
    // Below the change, a cell whose jump stays leaves those before it as they are.
    if (row < low && jumps[base + row] === jump) return;
    jumps[base + row] = jump;
  }
}

/** Counts looks at the grid: the measure of work, the same on every machine. */
export type WorkMeter = { probes: number };

/** The first place, by column and then by row, from `from` to `last` column, where all cells of the mask are free. */
export function findPlace(
  grid: Occupancy,
  mask: CellMask,
  from: number,
  last: number,
  meter: WorkMeter,
): { readonly column: number; readonly row: number } | null {
  const { rows, jumps } = grid;
  const { runColumns, runStarts, runEnds } = mask;
  const runs = runColumns.length;
  const lastRow = rows - mask.rows;
  const lastColumn = Math.min(last, grid.columns - mask.columns);
  let probes = 0;
  let hard = 0;
  for (let column = from; column <= lastColumn; column++) {
    let row = 0;
    while (row <= lastRow) {
      let next = -1;
      for (let step = 0; step < runs; step++) {
        const run = hard + step < runs ? hard + step : hard + step - runs;
        const start = row + (runStarts[run] as number);
        const base = (column + (runColumns[run] as number)) * rows;
        const jump = jumps[base + start] as number;
        probes++;
        if (jump >= row + (runEnds[run] as number)) continue;
        // Behind the taken cells in the way; what follows them is asked again.
        next = (jump < 0 ? -jump : -(jumps[base + jump] as number)) - start + row;
        hard = run;
        break;
      }
      if (next < 0) {
        meter.probes += probes;
        return { column, row };
      }
      row = next;
    }
  }
  meter.probes += probes;
  return null;
}
