import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { type CellMask, type CellSize, cellMask } from "./cell-mask.ts";
import { type CutShape, type LaidShape, laidShapes } from "./cut-shape.ts";
import type { Item } from "./filler.ts";
import { emptyOccupancy, findPlace, type Occupancy, refreshJumps, stamp, type WorkMeter } from "./occupancy.ts";
import { freeTurnsFor } from "./outline-turns.ts";
import type { SheetField } from "./sheet-field.ts";

/** A shape in one of its ways on a kind of field. */
export type Way = {
  readonly index: number;
  readonly laid: LaidShape;
  readonly mask: CellMask;
  /** Length along the field's filling direction and across it, mm. */
  readonly long: number;
  readonly wide: number;
};

/** What the cells of all fields with the same outline share. */
export type Ground = {
  readonly field: SheetField;
  readonly cell: CellSize;
  /** Of the first cell. A piece whose box begins at `inner` begins `padMm` behind it. */
  readonly origin: { readonly x: number; readonly y: number };
  readonly padMm: number;
  readonly empty: Occupancy;
  readonly ways: readonly (readonly Way[])[];
  readonly wayCount: number;
};

/** A sheet on which pieces are being laid. */
export type Bin = {
  readonly ground: Ground;
  readonly sheet: number;
  readonly grid: Occupancy;
  /** Columns before this one have no room for a way, by its index. Kept while pieces come, lowered when they go. */
  readonly known: Int16Array;
  readonly laid: Set<Laying>;
};

export type Laying = {
  readonly item: Item;
  readonly bin: Bin;
  readonly way: Way;
  readonly column: number;
  readonly row: number;
  /** Where the piece ends along the filling direction, from the beginning of the sheet, mm. */
  readonly end: number;
};

/** Draws a field and every way of every shape on cells of about `cellMm`. `padMm`: how far grown outlines reach at most. */
export function groundOf(
  field: SheetField,
  shapes: readonly CutShape[],
  { cellMm, padMm }: { readonly cellMm: number; readonly padMm: number },
  kernel: Kernel,
): Ground {
  const { inner, along } = field;
  const width = inner.width + 2 * padMm;
  const height = inner.height + 2 * padMm;
  const [long, wide] = along === "x" ? [width, height] : [height, width];
  // Whole cells fill the field exactly, so that nothing is lost at its far edges.
  const columns = Math.max(1, Math.ceil(long / cellMm));
  const rows = Math.max(1, Math.ceil(wide / cellMm));
  const cell = { along, u: long / columns, v: wide / rows };
  const origin = { x: inner.x - padMm, y: inner.y - padMm };
  const empty = emptyOccupancy(columns, rows);
  if (field.allowed) blockOutside(empty, field.allowed, origin, { width, height }, cell, kernel);
  const freeTurns = freeTurnsFor(shapes.length);
  let wayCount = 0;
  const ways = shapes.map((shape) =>
    laidShapes(shape, { grainTurn: field.stock.grainTurn, freeTurns })
      .filter(({ box }) => box.width <= inner.width + fitMm && box.height <= inner.height + fitMm)
      .map((laid): Way => {
        const touched = cellMask(laid.grown, { x: laid.box.x - padMm, y: laid.box.y - padMm }, cell);
        const [longMm, wideMm] = along === "x" ? [laid.box.width, laid.box.height] : [laid.box.height, laid.box.width];
        // The grown outline reaches less than the pad over the piece; counted in full, the piece ends inside the margin.
        const mask = {
          ...touched,
          columns: Math.max(touched.columns, Math.ceil((longMm + 2 * padMm) / cell.u - fitMm)),
          rows: Math.max(touched.rows, Math.ceil((wideMm + 2 * padMm) / cell.v - fitMm)),
        };
        return { index: wayCount++, laid, mask, long: longMm, wide: wideMm };
      }),
  );
  return { field, cell, origin, padMm, empty, ways, wayCount };
}

/** A piece as wide as the sheet fits on it, whatever its last digits. */
const fitMm = 1e-6;

function blockOutside(
  grid: Occupancy,
  allowed: Region,
  origin: { readonly x: number; readonly y: number },
  size: { readonly width: number; readonly height: number },
  cell: CellSize,
  kernel: Kernel,
): void {
  const { x, y } = origin;
  const right = x + size.width;
  const bottom = y + size.height;
  const frame: Region = [
    [
      { x, y },
      { x: right, y },
      { x: right, y: bottom },
      { x, y: bottom },
    ],
  ];
  const outside = kernel.difference(frame, allowed);
  const box = boxOfRegion(outside);
  if (!box) return;
  const mask = cellMask(outside, origin, cell);
  for (const [run, column] of mask.runColumns.entries()) {
    if (column >= grid.columns) continue;
    const end = Math.min(grid.rows, mask.runEnds[run] ?? 0);
    grid.taken.fill(1, column * grid.rows + (mask.runStarts[run] ?? 0), column * grid.rows + end);
  }
  for (let column = 0; column < grid.columns; column++) refreshJumps(grid, column, 0, grid.rows);
}

export function openBin(ground: Ground, sheet: number): Bin {
  const { empty, wayCount } = ground;
  const grid = { ...empty, taken: empty.taken.slice(), jumps: empty.jumps.slice() };
  return { ground, sheet, grid, known: new Int16Array(wayCount), laid: new Set() };
}

/** Lays the piece down. The cells must be free. */
export function lay(laying: Laying): void {
  stamp(laying.bin.grid, laying.way.mask, laying.column, laying.row, 1);
  laying.bin.laid.add(laying);
}

/** Takes the piece up again. */
export function takeUp(laying: Laying): void {
  const { bin, way, column, row } = laying;
  stamp(bin.grid, way.mask, column, row, 0);
  bin.laid.delete(laying);
  // A place that has come free touches one of these columns.
  for (const ways of bin.ground.ways) {
    for (const { index, mask } of ways) {
      const first = Math.max(0, column - mask.columns + 1);
      if ((bin.known[index] ?? 0) > first) bin.known[index] = first;
    }
  }
}

/** The place of an item in a bin where it ends first, tried in those of its ways that `isTried`; null when there is none. */
export function findLaying(
  item: Item,
  bin: Bin,
  meter: WorkMeter,
  isTried: (way: Way) => boolean = () => true,
): Laying | null {
  const { ground, grid, known } = bin;
  const { cell, field } = ground;
  const { inner, box } = field;
  const start = field.along === "x" ? inner.x - box.x : inner.y - box.y;
  let best: Laying | null = null;
  for (const way of ground.ways[item.shape] ?? []) {
    if (!isTried(way)) continue;
    const from = known[way.index] ?? 0;
    const limit = best ? Math.ceil((best.end - start - way.long) / cell.u - 1e-9) - 1 : grid.columns;
    if (from > limit) continue;
    const place = findPlace(grid, way.mask, from, limit, meter);
    known[way.index] = place ? place.column : Math.min(limit + 1, grid.columns);
    if (!place) continue;
    const end = start + place.column * cell.u + way.long;
    best = { item, bin, way, column: place.column, row: place.row, end };
  }
  return best;
}
