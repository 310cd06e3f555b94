import type { Box, Point } from "../geometry/path.ts";
import { drawBalloon } from "./balloon.ts";
import type { Colour, Font, Item } from "./display-list.ts";
import { graphite, ink } from "./palette.ts";
import { textItem } from "./text-item.ts";
import { smallTextMm, wrapText } from "./type.ts";

/** A line of running text. One that keeps with the next is never the last of its column unless a block is longer than a column. */
export type FlowLine = { readonly heightMm: number; readonly keeps: boolean; readonly draw: (at: Point) => Item[] };

export const flowLineMm = 4.8;

type ParagraphStyle = {
  readonly widthMm: number;
  readonly font?: Font;
  readonly sizeMm?: number;
  readonly colour?: Colour;
  readonly indentMm?: number;
  /** Keeps the last line with what follows too. */
  readonly keepsWithNext?: boolean;
};

/** Text wrapped to a width, its lines kept together. */
export function paragraph(text: string, style: ParagraphStyle): FlowLine[] {
  const { widthMm, font = "sans", sizeMm = smallTextMm, colour = ink, indentMm = 0, keepsWithNext = false } = style;
  const heightMm = Math.max(flowLineMm, sizeMm * 1.35);
  const lines = wrapText(text, font, sizeMm, widthMm - indentMm);
  return lines.map((line, index) => ({
    heightMm,
    keeps: keepsWithNext || index < lines.length - 1,
    draw: ({ x, y }) => [textItem(line, { x: x + indentMm, y: y + heightMm * 0.74 }, { font, sizeMm, colour })],
  }));
}

export function spaceLine(heightMm: number): FlowLine {
  return { heightMm, keeps: false, draw: () => [] };
}

/** A heading with quieter words after it, kept with what follows. */
export function headingLines(text: string, after: string, widthMm: number): FlowLine[] {
  const title = paragraph(text, { widthMm, font: "serif-bold", sizeMm: 4.2, keepsWithNext: true });
  return [
    ...title,
    ...paragraph(after, { widthMm, colour: graphite, keepsWithNext: true }),
    { ...spaceLine(0.8), keeps: true },
  ];
}

const numberIndentMm = 9;

/** A numbered block: its number in a balloon beside the first line. */
export function numberedBlock(
  { number, colour, text, meta }: { number: number; colour: Colour; text: string; meta: string },
  widthMm: number,
): FlowLine[] {
  const indent = { widthMm, indentMm: numberIndentMm };
  const [first, ...rest] = paragraph(text, { ...indent, keepsWithNext: true });
  if (!first) return [];
  const numbered: FlowLine = {
    ...first,
    heightMm: first.heightMm + 0.8,
    draw: ({ x, y }) => [
      ...drawBalloon(String(number), { x: x + 3, y: y + 0.8 + flowLineMm * 0.5 }, 1, colour),
      ...first.draw({ x, y: y + 0.8 }),
    ],
  };
  return [numbered, ...rest, ...paragraph(meta, { ...indent, colour }), spaceLine(2)];
}

/** Cuts a flow into blocks that stay together. */
function blocksOf(lines: readonly FlowLine[]): FlowLine[][] {
  const blocks: FlowLine[][] = [];
  let block: FlowLine[] = [];
  for (const line of lines) {
    block.push(line);
    if (line.keeps) continue;
    blocks.push(block);
    block = [];
  }
  return block.length === 0 ? blocks : [...blocks, block];
}

const heightOf = (lines: readonly FlowLine[]) => lines.reduce((sum, line) => sum + line.heightMm, 0);

/** Fills columns from the first on and gives back what did not fit. A block that is longer than a whole column is broken. */
export function fillColumns(lines: readonly FlowLine[], columns: readonly Box[]): { items: Item[]; rest: FlowLine[] } {
  const waiting = blocksOf(lines);
  const items: Item[] = [];
  for (const column of columns) {
    let y = column.y;
    const bottom = column.y + column.height;
    while (waiting[0]) {
      const [block = []] = waiting;
      const whole = heightOf(block);
      if (y + whole > bottom && (whole <= column.height || y > column.y)) break;
      let taken = 0;
      for (const line of block) {
        if (y + line.heightMm > bottom) break;
        items.push(...line.draw({ x: column.x, y }));
        y += line.heightMm;
        taken += 1;
      }
      if (taken < block.length) {
        waiting[0] = block.slice(taken);
        break;
      }
      waiting.shift();
    }
  }
  return { items, rest: waiting.flat() };
}
