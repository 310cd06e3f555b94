import { fineLineMm } from "./dimensions.ts";
import type { DisplayList, Font, Item } from "./display-list.ts";
import { graphite, linen, rule } from "./palette.ts";
import type { ScheduleRow } from "./schedule.ts";
import { lineItem, textItem } from "./text-item.ts";
import { smallTextMm, textWidthMm, wrapText } from "./type.ts";

type Column = {
  readonly field: keyof ScheduleRow;
  readonly align: "left" | "right";
  readonly wraps: boolean;
  readonly font: Font;
};

const columns: readonly Column[] = [
  { field: "key", align: "left", wraps: false, font: "serif-bold" },
  { field: "what", align: "left", wraps: true, font: "sans" },
  { field: "stock", align: "left", wraps: true, font: "sans" },
  { field: "thickness", align: "right", wraps: false, font: "sans" },
  { field: "heldBy", align: "left", wraps: true, font: "sans" },
  { field: "offset", align: "right", wraps: false, font: "sans" },
  { field: "topAt", align: "right", wraps: false, font: "sans" },
  { field: "pieces", align: "right", wraps: false, font: "sans" },
  { field: "mass", align: "right", wraps: false, font: "sans" },
];

const heads: ScheduleRow = {
  key: "Key",
  what: "What",
  stock: "Stock",
  thickness: "Thick",
  heldBy: "Held by",
  offset: "Offset",
  topAt: "Top at",
  pieces: "Pieces",
  mass: "Mass",
};

const padMm = 1.7;
const lineMm = 4.5;
const rowPadMm = 1.3;

/** Shares room among columns of words: who wants less than an even share gets what it wants, the others share the rest. */
function shareRoom(wanted: readonly number[], room: number): number[] {
  const given = new Map<number, number>();
  let left = room;
  for (const [rank, index] of wanted
    .map((_, place) => place)
    .sort((a, b) => (wanted[a] ?? 0) - (wanted[b] ?? 0))
    .entries()) {
    const even = left / (wanted.length - rank);
    const width = Math.min(wanted[index] ?? 0, even);
    given.set(index, width);
    left -= width;
  }
  return wanted.map((_, index) => (given.get(index) ?? 0) + Math.max(0, left) / wanted.length);
}

/** Numbers take what they need, words share the rest. */
function columnWidths(rows: readonly ScheduleRow[], widthMm: number): number[] {
  const wanted = columns.map(({ field, font }) => {
    const cells = rows.map((row) => textWidthMm(row[field], font, smallTextMm));
    return Math.max(textWidthMm(heads[field], "sans-semibold", smallTextMm), ...cells) + 2 * padMm;
  });
  const numbers = columns.reduce((sum, { wraps }, index) => sum + (wraps ? 0 : (wanted[index] ?? 0)), 0);
  const words = shareRoom(
    wanted.filter((_, index) => columns[index]?.wraps),
    Math.max(0, widthMm - numbers),
  );
  return columns.map(({ wraps }, index) => (wraps ? (words.shift() ?? 0) : (wanted[index] ?? 0)));
}

type DrawnRow = { readonly heightMm: number; readonly draw: (y: number) => Item[] };

function layRow(row: ScheduleRow, widths: readonly number[]): DrawnRow {
  const cells = columns.map((column, index) => {
    const width = (widths[index] ?? 0) - 2 * padMm;
    return column.wraps ? wrapText(row[column.field], column.font, smallTextMm, width) : [row[column.field]];
  });
  const heightMm = Math.max(...cells.map((lines) => lines.length)) * lineMm + 2 * rowPadMm;
  const draw = (y: number): Item[] => {
    let x = 0;
    return cells.flatMap((lines, index) => {
      const column = columns[index];
      const width = widths[index] ?? 0;
      const at = column?.align === "right" ? x + width - padMm : x + padMm;
      x += width;
      return lines.map((line, number) =>
        textItem(
          line,
          { x: at, y: y + rowPadMm + lineMm * (number + 0.76) },
          { font: column?.font ?? "sans", align: column?.align ?? "left" },
        ),
      );
    });
  };
  return { heightMm, draw };
}

function drawHead(widths: readonly number[], widthMm: number, heightMm: number): Item[] {
  let x = 0;
  const band: Item = {
    kind: "path",
    path: [
      {
        start: { x: 0, y: 0 },
        segments: [
          { kind: "line", to: { x: widthMm, y: 0 } },
          { kind: "line", to: { x: widthMm, y: heightMm } },
          { kind: "line", to: { x: 0, y: heightMm } },
        ],
      },
    ],
    fill: linen,
  };
  const texts = columns.map(({ field, align }, index) => {
    const width = widths[index] ?? 0;
    const at = align === "right" ? x + width - padMm : x + padMm;
    x += width;
    return textItem(
      heads[field],
      { x: at, y: rowPadMm + lineMm * 0.76 },
      { font: "sans-semibold", colour: graphite, align },
    );
  });
  return [band, ...texts];
}

/**
 * The schedule as a table of one width, as many rows as fit into `heightMm`; `rest` are the rows that did not fit. Height of the result is
 * what was used.
 */
export function drawScheduleTable(
  rows: readonly ScheduleRow[],
  { widthMm, heightMm = Number.POSITIVE_INFINITY }: { readonly widthMm: number; readonly heightMm?: number },
): { readonly table: DisplayList; readonly rest: readonly ScheduleRow[] } {
  const widths = columnWidths(rows, widthMm);
  const headMm = lineMm + 2 * rowPadMm;
  const items: Item[] = drawHead(widths, widthMm, headMm);
  let y = headMm;
  let drawn = 0;
  for (const row of rows) {
    const laid = layRow(row, widths);
    if (drawn > 0 && y + laid.heightMm > heightMm) break;
    items.push(
      ...laid.draw(y),
      lineItem({ x: 0, y: y + laid.heightMm }, { x: widthMm, y: y + laid.heightMm }, fineLineMm, rule),
    );
    y += laid.heightMm;
    drawn += 1;
  }
  return { table: { widthMm, heightMm: y, items }, rest: rows.slice(drawn) };
}
