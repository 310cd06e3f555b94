/** What the table is made of: an item's size, worth and how many there are. */
export type TableItem = { readonly size: number; readonly worth: number; readonly demand: number };

/** Numbers in a table, about; more items make its cells coarser. */
const mostNumbers = 400_000;
const fewestCells = 256;
const mostCells = 4_096;

export type WorthTable = {
  /** No choice of the items from `from` on that fits `left` is worth more. */
  readonly atMost: (from: number, left: number) => number;
  /** Steps of work that making it took. */
  readonly work: number;
};

/**
 * Upper bounds for every way to fill a bar: lengths are counted in cells, sizes rounded down, so that whatever fits in truth
 * fits here, and the best filling in cells is worth as much or more. Dynamic programming from the last item to the first; an
 * item that there are many of is taken in bundles of 1, 2, 4 and so on. Worths are whole numbers.
 */
export function worthTable(items: readonly TableItem[], room: number): WorthTable {
  const cells = Math.min(mostCells, Math.max(fewestCells, Math.floor(mostNumbers / Math.max(1, items.length))));
  const cell = room / cells;
  const rows: Float64Array[] = [];
  let row = new Float64Array(cells + 1);
  rows[items.length] = row;
  let work = 0;
  for (let index = items.length - 1; index >= 0; index -= 1) {
    const { size = 1, worth = 0, demand = 0 } = items[index] ?? {};
    row = row.slice();
    // A hair off, so that rounding in the division never makes a size larger than it is.
    const length = Math.floor(size / cell - 1e-9);
    let left = Math.min(demand, Math.ceil(cells / Math.max(1, length)) + 1);
    if (length <= 0) {
      for (let at = 0; at <= cells; at += 1) row[at] = (row[at] ?? 0) + worth * demand;
      left = 0;
    }
    for (let bundle = 1; left > 0; bundle *= 2) {
      const count = Math.min(bundle, left);
      left -= count;
      for (let at = cells; at >= count * length; at -= 1) {
        const taken = (row[at - count * length] ?? 0) + count * worth;
        if (taken > (row[at] ?? 0)) row[at] = taken;
      }
      work += cells;
    }
    rows[index] = row;
  }
  return {
    atMost: (from, left) => rows[from]?.[Math.min(cells, Math.floor(left / cell + 1e-9))] ?? 0,
    work: work / 10,
  };
}
