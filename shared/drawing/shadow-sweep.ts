import { boxOfPoints } from "../geometry/box.ts";
import type { Box, Point, Region } from "../geometry/path.ts";
import { type Light, shadowOffsetMm } from "./light.ts";
import { addSpan, emptyMask, type Mask } from "./mask.ts";

/** Something that stands in the light: its outline on the board and where it starts and ends above the back of the board. */
export type Caster = { readonly region: Region; readonly bottom: number; readonly top: number };

/** Light and the height of what receives the shadow. */
export type SweepOptions = { readonly light: Light; readonly level: number };

/** The light's own axes: `along` is where shadows fall, `across` square to it; `box` is in these axes, in mm, cut into square cells. */
export type Frame = { readonly along: Point; readonly across: Point; readonly box: Box; readonly cell: number };

/** A point of the board in the light's axes. */
export const inFrame = ({ along, across }: Pick<Frame, "along" | "across">, { x, y }: Point): Point => ({
  x: x * along.x + y * along.y,
  y: x * across.x + y * across.y,
});

/** Rows are sampled this many times a cell, columns exactly. */
const samplesPerRow = 4;

type Edge = { readonly top: number; readonly bottom: number; readonly x: number; readonly slope: number };

/** Edges of a region in the light's own axes, in cells, without the level ones. */
function edgesOf(region: Region, frame: Frame): Edge[] {
  const toCells = (point: Point): Point => {
    const turned = inFrame(frame, point);
    return { x: (turned.x - frame.box.x) / frame.cell, y: (turned.y - frame.box.y) / frame.cell };
  };
  return region.flatMap((polygon) => {
    const points = polygon.map(toCells);
    return points.flatMap((to, index): Edge[] => {
      const from = points.at(index - 1) ?? to;
      if (from.y === to.y) return [];
      const [upper, lower] = from.y < to.y ? [from, to] : [to, from];
      const slope = (lower.x - upper.x) / (lower.y - upper.y);
      return [{ top: upper.y, bottom: lower.y, x: upper.x, slope }];
    });
  });
}

/** Where sample rows cross the edges of one caster, for the rows it reaches only. */
function crossingsByRow(edges: readonly Edge[], rows: number): { first: number; crossings: number[][] } {
  const rowAfter = (y: number) => Math.min(rows, Math.max(0, Math.ceil(y * samplesPerRow - 0.5)));
  const first = edges.reduce((least, { top }) => Math.min(least, rowAfter(top)), rows);
  const end = edges.reduce((most, { bottom }) => Math.max(most, rowAfter(bottom)), 0);
  const crossings: number[][] = Array.from({ length: Math.max(0, end - first) }, () => []);
  for (const edge of edges) {
    for (let row = rowAfter(edge.top); row < rowAfter(edge.bottom); row += 1) {
      crossings[row - first]?.push(edge.x + edge.slope * ((row + 0.5) / samplesPerRow - edge.top));
    }
  }
  return { first, crossings };
}

type Span = { readonly from: number; readonly to: number };

function spansJoined(spans: Span[]): Span[] {
  const joined: { from: number; to: number }[] = [];
  for (const span of spans.sort((a, b) => a.from - b.from)) {
    const last = joined.at(-1);
    if (last && span.from <= last.to) last.to = Math.max(last.to, span.to);
    else joined.push({ ...span });
  }
  return joined;
}

/** The part of the frame's grid one group of casters can darken: it blurs that part and nothing else. */
export type Window = { readonly column: number; readonly row: number; readonly columns: number; readonly rows: number };

export function windowOf(
  casters: readonly Caster[],
  options: SweepOptions,
  frame: Frame,
  grid: Mask,
  reachMm: number,
): Window {
  const corners = casters.flatMap(({ region, bottom, top }) => {
    const box = boxOfPoints(region.flat().map((point) => inFrame(frame, point)));
    if (!box) return [];
    const [near, far] = [Math.max(bottom - options.level, 0), top - options.level].map((height) =>
      shadowOffsetMm(height, options.light),
    );
    return [
      { x: box.x + (near ?? 0) - reachMm, y: box.y - reachMm },
      { x: box.x + box.width + (far ?? 0) + reachMm, y: box.y + box.height + reachMm },
    ];
  });
  const box = boxOfPoints(corners) ?? frame.box;
  const within = (value: number, most: number) => Math.min(most, Math.max(0, value));
  const column = within(Math.floor((box.x - frame.box.x) / frame.cell), grid.columns);
  const row = within(Math.floor((box.y - frame.box.y) / frame.cell), grid.rows);
  const right = within(Math.ceil((box.x + box.width - frame.box.x) / frame.cell), grid.columns);
  const bottom = within(Math.ceil((box.y + box.height - frame.box.y) / frame.cell), grid.rows);
  return { column, row, columns: right - column, rows: bottom - row };
}

/**
 * The casters that end at one height, swept from where they start (or from the receiver, if they start below it) to their top. The
 * light falls along the rows, so the sweep only makes each span of a row longer: it is exact.
 */
export function sweptMask(
  casters: readonly Caster[],
  options: SweepOptions,
  frame: Frame,
  { columns, rows }: Window,
): Mask {
  const mask = emptyMask(columns, rows);
  const sampleRows = rows * samplesPerRow;
  const spans: Span[][] = Array.from({ length: sampleRows }, () => []);
  for (const caster of casters) {
    const near = shadowOffsetMm(Math.max(caster.bottom - options.level, 0), options.light) / frame.cell;
    const far = shadowOffsetMm(caster.top - options.level, options.light) / frame.cell;
    const { first, crossings: rowsCrossed } = crossingsByRow(edgesOf(caster.region, frame), sampleRows);
    for (const [row, crossings] of rowsCrossed.entries()) {
      crossings.sort((a, b) => a - b);
      for (let index = 0; index + 1 < crossings.length; index += 2) {
        spans[first + row]?.push({ from: (crossings[index] ?? 0) + near, to: (crossings[index + 1] ?? 0) + far });
      }
    }
  }
  for (const [row, list] of spans.entries()) {
    for (const { from, to } of spansJoined(list)) {
      addSpan(mask, Math.floor(row / samplesPerRow), from, to, 1 / samplesPerRow);
    }
  }
  return mask;
}
