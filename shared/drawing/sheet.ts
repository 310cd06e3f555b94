import type { Finding } from "../dry-fit/finding.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box } from "../geometry/path.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { FrozenNote, TitleBlock } from "../mockup/snapshot.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import { formatLength, formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { paperOf } from "../units/paper.ts";
import { frameOf } from "../units/zones.ts";
import { fineLineMm, type PaperScale } from "./dimensions.ts";
import type { DrawingSheet, Item } from "./display-list.ts";
import { type FlowLine, fillColumns, headingLines, paragraph } from "./flow.ts";
import { graphite, rule } from "./palette.ts";
import { type ScheduleRow, scheduleRows, scheduleTotal } from "./schedule.ts";
import { drawScheduleTable } from "./schedule-table.ts";
import { drawSheetFrame } from "./sheet-frame.ts";
import { planningCaution, sheetTextLines } from "./sheet-text.ts";
import { lineItem } from "./text-item.ts";
import { drawTitleBlock, titleBlockHeightMm } from "./title-block.ts";
import { drawViews, scaleOfViews, type ViewsInput } from "./views.ts";

export type Paper = "A4" | "A3" | "Letter" | "Tabloid";

export type SheetsInput = {
  readonly titleBlock: TitleBlock;
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  readonly findings: readonly Finding[];
  /** As carried over at issue. */
  readonly notes: readonly FrozenNote[];
  /** As they shall read, from the brief. */
  readonly words: string;
  readonly unit: LengthUnit;
  readonly paper: Paper;
};

const padMm = 5;
/** The right-hand column: notes above, title block below. ISO 7200 allows up to 180 mm; a narrow one leaves the picture its room. */
const leastColumnMm = 76;
const mostColumnMm = 100;

/** One sheet's places. */
type Layout = { readonly size: { widthMm: number; heightMm: number }; readonly left: Box; readonly right: Box };

function layoutOf(paper: Paper): Layout {
  const upright = paperOf(paper);
  if (!upright) throw new Error(`No paper is called ${paper}.`);
  const size = { widthMm: upright.heightMm, heightMm: upright.widthMm };
  const frame = frameOf(size);
  const column = Math.min(mostColumnMm, Math.max(leastColumnMm, frame.width * 0.27));
  return {
    size,
    left: { ...frame, width: frame.width - column },
    right: { ...frame, x: frame.x + frame.width - column, width: column },
  };
}

const inner = (box: Box): Box => ({
  x: box.x + padMm,
  y: box.y + padMm - 1,
  width: box.width - 2 * padMm,
  height: box.height - 2 * padMm + 2,
});

type Schedule = { readonly items: readonly Item[]; readonly heightMm: number; readonly rest: readonly ScheduleRow[] };

/** A print goes from hand to hand, so each says what its bare numbers are (ISO 129-1). */
const measuresIn: Readonly<Record<LengthUnit, string>> = { mm: "Measures in mm.", in: "Measures in inches." };

/** The sign's size, its frame included, for a narrow cell: it may break behind the cross only. */
function sizeText(document: MockupDocument, unit: LengthUnit): string {
  const whole = signBox(document);
  const [width, height] = [formatLength(whole.width, unit), formatLengthWithUnit(whole.height, unit)];
  return [`${width} ×`, height].map((part) => part.replaceAll(" ", "\u00a0")).join(" ");
}

/** Heading, table and, under the last row, everything together; as much as fits into a height. */
function layScheduleBlock(
  rows: readonly ScheduleRow[],
  input: SheetsInput,
  at: { x: number; y: number },
  room: { widthMm: number; heightMm: number },
): Schedule {
  const { document, figures } = input;
  const total = paragraph(scheduleTotal(document, figures, input.unit), {
    widthMm: room.widthMm,
    colour: graphite,
  });
  const heading = headingLines("Schedule", "", room.widthMm);
  const height = (lines: readonly FlowLine[]) => lines.reduce((sum, line) => sum + line.heightMm, 0);
  const totalMm = height(total) + 1.5;
  const { table, rest } = drawScheduleTable(rows, {
    widthMm: room.widthMm,
    heightMm: room.heightMm - height(heading) - totalMm,
  });
  const tableY = at.y + height(heading);
  const totalY = tableY + table.heightMm + 1.5;
  const box = (y: number, lines: readonly FlowLine[]): Box => ({
    x: at.x,
    y,
    width: room.widthMm,
    height: height(lines) + 0.01,
  });
  return {
    items: [
      ...fillColumns(heading, [box(at.y, heading)]).items,
      { kind: "group", id: "schedule", x: at.x, y: tableY, scale: 1, items: table.items },
      ...(rest.length === 0 ? fillColumns(total, [box(totalY, total)]).items : []),
    ],
    heightMm: height(heading) + table.heightMm + totalMm,
    rest,
  };
}

/** Millimetres of the sign that make one on the sheets' paper: what elevation and section of the same set are lettered for. */
export function paperScaleOf(input: Omit<ViewsInput, "kernel"> & { readonly paper: Paper }): PaperScale {
  const picture = inner(layoutOf(input.paper).left);
  return 1 / scaleOfViews(input, { widthMm: picture.width, heightMm: picture.height }).scale.factor;
}

/** The left part of a further sheet cut into columns as wide as the right one. */
function textColumns(box: Box, widthMm: number): Box[] {
  const count = Math.max(1, Math.floor((box.width + 2 * padMm) / (widthMm + 2 * padMm)));
  const pitch = box.width / count;
  return Array.from({ length: count }, (_, index) => ({ ...box, x: box.x + index * pitch, width: pitch - 2 * padMm }));
}

/**
 * The drawing set at issue, lying sheets in true mm of paper: the first with elevation, section and, where it does not cost a scale,
 * the schedule; notes and the dry fit beside; further sheets for what does not fit.
 */
export function drawSheets(input: SheetsInput): DrawingSheet[] {
  const { document, titleBlock, paper } = input;
  const { size, left, right } = layoutOf(paper);
  const picture = inner(left);
  const text = inner(right);
  const block = {
    titleBlock,
    scale: "1:1000",
    size: sizeText(document, input.unit),
    paper,
    sheet: 10,
    sheets: 10,
  };
  const titleMm = titleBlockHeightMm(block, right.width);
  const caution = paragraph(`${measuresIn[input.unit]} ${planningCaution}`, { widthMm: text.width, colour: graphite });
  const cautionMm = caution.reduce((sum, line) => sum + line.heightMm, 0);
  const notesBox = { ...text, height: right.height - titleMm - cautionMm - 2 * padMm };

  const rows = scheduleRows(document, input.figures, input.unit);
  const room = { widthMm: picture.width, heightMm: picture.height };
  const trial = layScheduleBlock(rows, input, { x: 0, y: 0 }, { ...room, heightMm: room.heightMm * 0.6 });
  const alone = scaleOfViews(input, room);
  const shared = scaleOfViews(input, { ...room, heightMm: room.heightMm - trial.heightMm - padMm });
  const together = trial.rest.length === 0 && shared.fits && shared.scale.factor === alone.scale.factor;
  const { scale } = alone;

  const bodies: Item[][] = [];
  let lines = sheetTextLines(input, text.width);
  const first = fillColumns(lines, [notesBox]);
  lines = first.rest;
  if (together) {
    const heightMm = room.heightMm - trial.heightMm - padMm;
    const at = { x: picture.x, y: picture.y + heightMm + padMm };
    const schedule = layScheduleBlock(rows, input, at, { ...room, heightMm: room.heightMm * 0.6 });
    bodies.push([...drawViews(input, scale, { ...picture, ...room, heightMm }), ...schedule.items, ...first.items]);
  } else bodies.push([...drawViews(input, scale, { ...picture, ...room }), ...first.items]);

  let waiting: readonly ScheduleRow[] = together ? [] : rows;
  while (waiting.length > 0 || lines.length > 0) {
    const items: Item[] = [];
    let free = picture;
    if (waiting.length > 0) {
      const schedule = layScheduleBlock(waiting, input, picture, room);
      items.push(...schedule.items);
      waiting = schedule.rest;
      const used = schedule.heightMm + padMm;
      free = { ...picture, y: picture.y + used, height: Math.max(0, picture.height - used) };
    }
    // What is left of a sheet under a table is worth filling only when a few lines go into it.
    const columns = waiting.length === 0 && free.height > 40 ? textColumns(free, text.width) : [];
    const filled = fillColumns(lines, [...columns, notesBox]);
    items.push(...filled.items);
    lines = filled.rest;
    bodies.push(items);
  }

  return bodies.map((items, index): DrawingSheet => {
    const sheetBlock = { ...block, scale: scale.name, sheet: index + 1, sheets: bodies.length };
    const ownMm = titleBlockHeightMm(sheetBlock, right.width);
    const titleY = right.y + right.height - ownMm;
    const cautionBox = { ...text, y: titleY - cautionMm - padMm * 0.6, height: cautionMm + 0.01 };
    return {
      name: `Sheet ${index + 1} of ${bodies.length}`,
      widthMm: size.widthMm,
      heightMm: size.heightMm,
      items: [
        ...drawSheetFrame(size),
        lineItem({ x: right.x, y: right.y }, { x: right.x, y: titleY }, fineLineMm, rule),
        lineItem(
          { x: right.x, y: cautionBox.y - 2 },
          { x: right.x + right.width, y: cautionBox.y - 2 },
          fineLineMm,
          rule,
        ),
        ...items,
        ...fillColumns(caution, [cautionBox]).items,
        ...drawTitleBlock(sheetBlock, { x: right.x, y: titleY }, right.width),
      ],
    };
  });
}
