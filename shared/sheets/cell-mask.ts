import type { Region } from "../geometry/path.ts";

/** Cells that a shape touches, as runs along v, column by column along u. `starts` and `ends` count cells; ends are not included. */
export type CellMask = {
  readonly columns: number;
  readonly rows: number;
  readonly runColumns: Int16Array;
  readonly runStarts: Int16Array;
  readonly runEnds: Int16Array;
  /** By column: its first touched row and the end of its last run; both 0 for a column that is not touched. */
  readonly lows: Int16Array;
  readonly highs: Int16Array;
};

/** The grid a mask is drawn on: the direction a sheet is filled along is u, the other v. */
export type CellSize = { readonly along: "x" | "y"; readonly u: number; readonly v: number };

/** A shape that reaches less than this share of a cell into it does not touch it. */
const grazing = 1e-6;

/**
 * Every cell that the region touches, with `origin` at the corner of the first cell. A cell is touched when an edge runs
 * through it or when it lies inside altogether, so the mask is never smaller than the region.
 */
export function cellMask(region: Region, origin: { readonly x: number; readonly y: number }, cell: CellSize): CellMask {
  const spans = touchedSpans(region, origin, cell);
  const runs: { column: number; start: number; end: number }[] = [];
  const lows = new Int16Array(spans.length);
  const highs = new Int16Array(spans.length);
  for (const [column, list] of spans.entries()) {
    const joined = joinSpans(list);
    for (const run of joined) runs.push({ column, ...run });
    lows[column] = joined[0]?.start ?? 0;
    highs[column] = joined.at(-1)?.end ?? 0;
  }
  // Long runs collide most, so they are asked first.
  runs.sort((a, b) => b.end - b.start - (a.end - a.start) || a.column - b.column || a.start - b.start);
  return {
    columns: spans.length,
    rows: highs.reduce((most, end) => Math.max(most, end), 0),
    runColumns: Int16Array.from(runs, (run) => run.column),
    runStarts: Int16Array.from(runs, (run) => run.start),
    runEnds: Int16Array.from(runs, (run) => run.end),
    lows,
    highs,
  };
}

type Span = { start: number; end: number };

function touchedSpans(region: Region, origin: { readonly x: number; readonly y: number }, cell: CellSize): Span[][] {
  const columns: Span[][] = [];
  const crossings: number[][] = [];
  for (const ring of region) {
    const points = ring.map(({ x, y }) => ({
      u: (cell.along === "x" ? x - origin.x : y - origin.y) / cell.u,
      v: (cell.along === "x" ? y - origin.y : x - origin.x) / cell.v,
    }));
    let previous = points.at(-1);
    for (const point of points) {
      if (previous) addEdge(columns, crossings, previous, point);
      previous = point;
    }
  }
  for (const [column, list] of crossings.entries()) {
    if (!list) continue;
    list.sort((a, b) => a - b);
    for (let index = 0; index + 1 < list.length; index += 2)
      push(columns, column, list[index] ?? 0, list[index + 1] ?? 0);
  }
  return Array.from(columns, (list) => list ?? []);
}

type GridPoint = { readonly u: number; readonly v: number };

function addEdge(columns: Span[][], crossings: number[][], a: GridPoint, b: GridPoint): void {
  const [left, right] = a.u <= b.u ? [a, b] : [b, a];
  const slope = right.u === left.u ? 0 : (right.v - left.v) / (right.u - left.u);
  const first = Math.max(0, Math.floor(left.u + grazing));
  const last = Math.ceil(right.u - grazing) - 1;
  for (let column = first; column <= last; column++) {
    const from = Math.max(left.u, column);
    const to = Math.min(right.u, column + 1);
    const v0 = left.v + slope * (from - left.u);
    const v1 = right.u === left.u ? right.v : left.v + slope * (to - left.u);
    push(columns, column, Math.min(v0, v1), Math.max(v0, v1));
    const middle = column + 0.5;
    if (left.u <= middle && middle < right.u) {
      const list = crossings[column] ?? [];
      crossings[column] = list;
      list.push(left.v + slope * (middle - left.u));
    }
  }
}

function push(columns: Span[][], column: number, from: number, to: number): void {
  const start = Math.max(0, Math.floor(from + grazing));
  const end = Math.ceil(to - grazing);
  if (end <= start) return;
  const list = columns[column] ?? [];
  columns[column] = list;
  list.push({ start, end });
}

function joinSpans(list: readonly Span[]): Span[] {
  const joined: Span[] = [];
  for (const span of list.toSorted((a, b) => a.start - b.start || a.end - b.end)) {
    const last = joined.at(-1);
    if (last && span.start <= last.end) last.end = Math.max(last.end, span.end);
    else joined.push({ ...span });
  }
  return joined;
}
