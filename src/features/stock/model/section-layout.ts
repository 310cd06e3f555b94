import { formatFine } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { Matter } from "./section-bodies.ts";
import type { Dimension, StandoffSection } from "./standoff-section.ts";

/** px on the screen, from the drawing's upper left corner. */
type Spot = { readonly x: number; readonly y: number };
type Line = { readonly from: Spot; readonly to: Spot };

export type LaidDimension = {
  readonly field: string;
  readonly number: number;
  readonly label: string;
  /** The measured length in the shop's unit; empty while it is not written. */
  readonly text: string;
  /** The line with an arrow at both ends. */
  readonly line: Line;
  /** From the part to the line, or from the line to its label. */
  readonly helpers: readonly Line[];
  /** Middle of the balloon; the text stands to its right. */
  readonly balloon: Spot;
};

export type LaidSection = {
  readonly width: number;
  readonly height: number;
  readonly axis: Line;
  readonly bodies: readonly { readonly matter: Matter; readonly points: string }[];
  readonly dimensions: readonly LaidDimension[];
};

const margin = 14;
const rowHeight = 26;
const balloonRadius = 10;
/** Of a figure at 13 px, a little generously. */
export const digitWidth = 8.2;
const gap = 8;

/** Places a section and its dimensions in a drawing of that width, so that no label lies on another. */
export function layOutSection(
  section: StandoffSection,
  { width, tallest, unit }: { readonly width: number; readonly tallest: number; readonly unit: LengthUnit },
): LaidSection {
  const across = section.dimensions.filter((dimension) => dimension.way === "across");
  const along = section.dimensions.filter((dimension) => dimension.way === "along");
  const scale = Math.min(
    (width - 2 * margin) / Math.max(section.to - section.from, 1),
    tallest / Math.max(2 * section.reach, 1),
  );
  const left = (width - (section.to - section.from) * scale) / 2;
  const px = (mm: number) => left + (mm - section.from) * scale;

  const labels = spread(
    across.map((dimension) => ({ at: px(dimension.at), width: labelWidth(textOf(dimension, unit)) })),
    width,
  );
  const rowsAbove = Math.max(0, ...labels.map(({ row }) => row + 1));
  const top = rowsAbove * rowHeight + gap;
  const axisY = top + section.reach * scale;
  const bottom = axisY + section.reach * scale;
  const py = (mm: number) => axisY - mm * scale;

  const laidAcross = across.map((dimension, index): LaidDimension => {
    const label = labels[index] ?? { x: margin, row: 0 };
    const x = px(dimension.at);
    const balloon = { x: label.x + balloonRadius, y: (rowsAbove - label.row - 1) * rowHeight + rowHeight / 2 };
    const line = { from: { x, y: py(dimension.from) }, to: { x, y: py(dimension.to) } };
    const leader = { from: line.to, to: { x: balloon.x, y: balloon.y + balloonRadius } };
    return { ...named(dimension, unit), line, helpers: [leader], balloon };
  });

  const taken: { readonly row: number; readonly from: number; readonly to: number }[] = [];
  const laidAlong = along
    .toSorted((a, b) => a.to - a.from - (b.to - b.from) || a.number - b.number)
    .map((dimension): LaidDimension => {
      const x1 = px(dimension.from);
      const x2 = px(dimension.to);
      const needed = labelWidth(textOf(dimension, unit));
      // A label that does not fit between the arrows stands beside them, on the side that has room.
      const inside = x2 - x1 >= needed + 2 * gap;
      const beside = x2 + gap + needed <= width ? x2 + gap : x1 - gap - needed;
      const labelX = inside ? (x1 + x2 - needed) / 2 : Math.max(0, beside);
      const span = { from: Math.min(x1, labelX), to: Math.max(x2, labelX + needed) };
      const row = freeRow(taken, span);
      taken.push({ row, ...span });
      const y = bottom + gap + row * rowHeight + rowHeight / 2;
      const helper = (x: number): Line => ({ from: { x, y: bottom + 2 }, to: { x, y: y + 4 } });
      const balloon = { x: labelX + balloonRadius, y };
      const line = { from: { x: x1, y }, to: { x: x2, y } };
      return { ...named(dimension, unit), line, helpers: [helper(x1), helper(x2)], balloon };
    });
  const rowsBelow = Math.max(0, ...taken.map(({ row }) => row + 1));

  return {
    width,
    height: bottom + gap + rowsBelow * rowHeight + gap,
    axis: { from: { x: 2, y: axisY }, to: { x: width - 2, y: axisY } },
    bodies: section.bodies.map(({ matter, outline }) => ({
      matter,
      points: outline.map(([x, y]) => `${rounded(px(x))},${rounded(py(y))}`).join(" "),
    })),
    dimensions: [...laidAcross, ...laidAlong].sort((a, b) => a.number - b.number),
  };
}

const named = (dimension: Dimension, unit: LengthUnit) => ({
  field: dimension.field,
  number: dimension.number,
  label: dimension.label,
  text: textOf(dimension, unit),
});

/** Without the unit, which stands beside every field. */
const textOf = ({ mm }: Dimension, unit: LengthUnit): string =>
  mm === null ? "" : formatFine(mm, unit).replace(/ mm$/, "");

const labelWidth = (text: string): number => 2 * balloonRadius + (text === "" ? 0 : 4 + text.length * digitWidth);

const rounded = (value: number): number => Math.round(value * 100) / 100;

function freeRow(
  taken: readonly { readonly row: number; readonly from: number; readonly to: number }[],
  { from, to }: { readonly from: number; readonly to: number },
): number {
  for (let row = 0; ; row += 1) {
    if (taken.every((one) => one.row !== row || one.to + gap < from || to + gap < one.from)) return row;
  }
}

/**
 * Left edges for labels that want to stand above a place each: in one row pushed apart as far as needed, or in two by
 * turns where one has no room for all. In the order given.
 */
function spread(
  labels: readonly { readonly at: number; readonly width: number }[],
  width: number,
): { readonly x: number; readonly row: number }[] {
  const order = labels.map((label, index) => ({ ...label, index })).sort((a, b) => a.at - b.at || a.index - b.index);
  const total = order.reduce((sum, label) => sum + label.width + gap, -gap);
  const rows = total <= width ? 1 : 2;
  const placed: { x: number; row: number }[] = [];
  for (let row = 0; row < rows; row += 1) {
    const ofRow = order.filter((_, place) => place % rows === row);
    let edge = 0;
    const xs = ofRow.map((label) => {
      const x = Math.max(edge, label.at - balloonRadius);
      edge = x + label.width + gap;
      return x;
    });
    // What was pushed over the right side comes back, and pushes its neighbours.
    let limit = width;
    for (let place = ofRow.length - 1; place >= 0; place -= 1) {
      const label = ofRow[place];
      if (!label) continue;
      const x = Math.min(xs[place] ?? 0, limit - label.width);
      placed[label.index] = { x: Math.max(0, x), row };
      limit = x - gap;
    }
  }
  return placed;
}
