import type { TitleBlock } from "../mockup/snapshot.ts";
import { fineLineMm, outlineMm } from "./dimensions.ts";
import type { Colour, Font, Item } from "./display-list.ts";
import { graphite, ink, ochre } from "./palette.ts";
import { lineItem, textItem } from "./text-item.ts";
import { smallTextMm, wrapText } from "./type.ts";

type Cell = {
  readonly label: string;
  readonly value: string;
  /** Share of the row's width. */
  readonly share: number;
  readonly font?: Font;
  readonly sizeMm?: number;
  readonly colour?: Colour;
};

export type TitleBlockInput = {
  readonly titleBlock: TitleBlock;
  readonly scale: string;
  readonly size: string;
  readonly paper: string;
  readonly sheet: number;
  readonly sheets: number;
};

const padMm = 1.8;
const labelMm = 4.4;
const lineMm = 4.8;

function rowsOf({ titleBlock, scale, size, paper, sheet, sheets }: TitleBlockInput): Cell[][] {
  return [
    [
      { label: "Owner", value: titleBlock.owner, share: 0.5 },
      { label: "Client", value: titleBlock.client, share: 0.5 },
    ],
    [
      { label: "Title", value: titleBlock.title, share: 0.72, font: "serif-bold", sizeMm: 4 },
      { label: "Revision", value: titleBlock.revision, share: 0.28, font: "serif-bold", sizeMm: 4 },
    ],
    [
      { label: "Number", value: titleBlock.number, share: 0.36 },
      { label: "Date of issue", value: titleBlock.date, share: 0.36 },
      { label: "Sheet", value: `${sheet} of ${sheets}`, share: 0.28 },
    ],
    [
      { label: "Created by", value: titleBlock.createdBy, share: 0.36 },
      { label: "Approved by", value: "not yet", share: 0.36, colour: ochre },
      { label: "Scale", value: scale, share: 0.28 },
    ],
    [
      { label: "Document type", value: titleBlock.documentType, share: 0.4 },
      { label: "Size", value: size, share: 0.4 },
      { label: "Paper", value: paper, share: 0.2 },
    ],
  ];
}

type LaidCell = Cell & { readonly x: number; readonly lines: readonly string[] };
type LaidRow = { readonly cells: readonly LaidCell[]; readonly heightMm: number };

function layRow(cells: readonly Cell[], widthMm: number): LaidRow {
  let x = 0;
  const laid = cells.map((cell): LaidCell => {
    const width = cell.share * widthMm;
    const lines = wrapText(cell.value, cell.font ?? "sans-semibold", cell.sizeMm ?? smallTextMm, width - 2 * padMm);
    const at = x;
    x += width;
    return { ...cell, x: at, lines };
  });
  const most = Math.max(1, ...laid.map(({ lines }) => lines.length));
  return { cells: laid, heightMm: 0.9 + labelMm + most * lineMm + 0.8 };
}

/** The height a title block of this width takes, long values wrapped. */
export function titleBlockHeightMm(input: TitleBlockInput, widthMm: number): number {
  return rowsOf(input).reduce((sum, row) => sum + layRow(row, widthMm).heightMm, 0);
}

/** The title block with its lower right corner at the frame's: the fields of ISO 7200, and scale, size and paper beside them. */
export function drawTitleBlock(
  input: TitleBlockInput,
  at: { readonly x: number; readonly y: number },
  widthMm: number,
): Item[] {
  const items: Item[] = [lineItem(at, { x: at.x + widthMm, y: at.y }, outlineMm)];
  let y = at.y;
  for (const row of rowsOf(input).map((cells) => layRow(cells, widthMm))) {
    if (y > at.y) items.push(lineItem({ x: at.x, y }, { x: at.x + widthMm, y }, fineLineMm, ink));
    for (const cell of row.cells) {
      const x = at.x + cell.x + padMm;
      if (cell.x > 0)
        items.push(lineItem({ x: at.x + cell.x, y }, { x: at.x + cell.x, y: y + row.heightMm }, fineLineMm, ink));
      items.push(textItem(cell.label, { x, y: y + 0.9 + labelMm * 0.72 }, { colour: graphite }));
      for (const [index, line] of cell.lines.entries()) {
        items.push(
          textItem(
            line,
            { x, y: y + 0.9 + labelMm + lineMm * (index + 0.72) },
            {
              font: cell.font ?? "sans-semibold",
              sizeMm: cell.sizeMm ?? smallTextMm,
              colour: cell.colour ?? ink,
            },
          ),
        );
      }
    }
    y += row.heightMm;
  }
  return [...items, lineItem(at, { x: at.x, y }, outlineMm)];
}
