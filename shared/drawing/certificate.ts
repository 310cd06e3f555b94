import { rectanglePath } from "../geometry/shapes.ts";
import { paperOf } from "../units/paper.ts";
import { fineLineMm, outlineMm } from "./dimensions.ts";
import type { DrawingSheet, Item } from "./display-list.ts";
import { type FlowLine, fillColumns, headingLines, paragraph, spaceLine } from "./flow.ts";
import { graphite, ink, rule, sheetWhite, verdigris } from "./palette.ts";
import { planningCaution } from "./sheet-text.ts";
import { lineItem, textItem } from "./text-item.ts";
import { smallTextMm, wrapText } from "./type.ts";

/** Everything an approval consists of, as it is certified. Texts are printed as given. */
export type CertificateInput = {
  readonly shop: string;
  readonly client: string;
  readonly title: string;
  readonly number: string;
  readonly revision: string;
  /** As the approver typed it. */
  readonly typedName: string;
  /** Name and address of the contact whose session it was. */
  readonly signedInAs: string;
  /** Each sentence that was ticked. */
  readonly acknowledgements: readonly string[];
  /** Date and time with its zone, as "2026-12-01 10:12:45 +01:00 (Europe/Berlin)". */
  readonly decidedAt: string;
  /** SHA-256 of the issued PDF's bytes and of the snapshot's stored text, in hexadecimal. */
  readonly pdfSha256: string;
  readonly snapshotSha256: string;
  /** Name of this certificate, as "Approval of CL-0142, revision B". */
  readonly reference?: string;
  readonly paper: "A4" | "Letter";
};

const marginMm = 22;
const labelMm = 46;
const rowPadMm = 1.6;
const lineMm = 5;

type Row = { readonly label: string; readonly value: string };

function rowsOf(input: CertificateInput): Row[] {
  return [
    { label: "Shop", value: input.shop },
    { label: "Client", value: input.client },
    { label: "Title", value: input.title },
    { label: "Number", value: input.number },
    { label: "Revision", value: input.revision },
    { label: "Approved by", value: input.typedName },
    { label: "Signed in as", value: input.signedInAs },
    { label: "Date and time", value: input.decidedAt },
  ];
}

/** SHA-256 in groups of eight digits: a person compares them by eye. */
const grouped = (hash: string) => hash.replace(/(.{8})(?=.)/g, "$1 ");

function drawRows(
  rows: readonly Row[],
  at: { x: number; y: number },
  widthMm: number,
): { items: Item[]; bottom: number } {
  const items: Item[] = [lineItem(at, { x: at.x + widthMm, y: at.y }, outlineMm)];
  let y = at.y;
  for (const { label, value } of rows) {
    const lines = wrapText(value, "sans-semibold", 3.8, widthMm - labelMm);
    const height = Math.max(1, lines.length) * lineMm + 2 * rowPadMm;
    const baseline = (index: number) => y + rowPadMm + lineMm * (index + 0.74);
    items.push(textItem(label, { x: at.x, y: baseline(0) }, { colour: graphite }));
    for (const [index, line] of lines.entries()) {
      items.push(textItem(line, { x: at.x + labelMm, y: baseline(index) }, { font: "sans-semibold", sizeMm: 3.8 }));
    }
    y += height;
    items.push(lineItem({ x: at.x, y }, { x: at.x + widthMm, y }, fineLineMm, rule));
  }
  return { items, bottom: y };
}

/** A tick drawn as a line: the fonts have none. */
function tickLine(text: string, widthMm: number): FlowLine[] {
  const [first, ...rest] = paragraph(text, { widthMm, indentMm: 8, font: "serif", sizeMm: 3.8 });
  if (!first) return [];
  const ticked: FlowLine = {
    ...first,
    draw: ({ x, y }) => [
      {
        kind: "line",
        points: [
          { x: x + 0.6, y: y + 2.6 },
          { x: x + 2, y: y + 4 },
          { x: x + 4.8, y: y + 0.8 },
        ],
        stroke: { colour: verdigris, widthMm: 0.6, cap: "round" },
      },
      ...first.draw({ x, y }),
    ],
  };
  return [ticked, ...rest, spaceLine(1.6)];
}

/**
 * The approval as a document of its own, upright sheets in true mm: who approved what, when, with which acknowledgements, and the hashes that tie it to
 * the issued file. A long list of acknowledgements goes on over further sheets.
 */
export function drawCertificate(input: CertificateInput): DrawingSheet[] {
  const paper = paperOf(input.paper);
  if (!paper) throw new Error(`No paper is called ${input.paper}.`);
  const { widthMm, heightMm } = paper;
  const width = widthMm - 2 * marginMm;
  const left = marginMm;
  const reference = input.reference ?? `Approval of ${input.number}, revision ${input.revision}`;
  const titleLines = wrapText(reference, "serif", 5, width);
  const table = drawRows(rowsOf(input), { x: left, y: 50 + titleLines.length * 7 }, width);
  const hashes = [
    { label: "Issued PDF", hash: input.pdfSha256 },
    { label: "Frozen drawing", hash: input.snapshotSha256 },
  ];
  const lines: FlowLine[] = [
    ...headingLines("Acknowledged at approval", "", width),
    ...input.acknowledgements.flatMap((text) => tickLine(text, width)),
    spaceLine(3),
    ...headingLines(
      "What was approved",
      "SHA-256 of the files as issued; any change to a file changes its number",
      width,
    ),
    ...hashes.flatMap(({ label, hash }) => [
      ...paragraph(label, { widthMm: width, font: "sans-semibold", keepsWithNext: true }),
      ...paragraph(grouped(hash), { widthMm: width, font: "sans", sizeMm: smallTextMm }),
      spaceLine(1.6),
    ]),
    spaceLine(3),
    ...paragraph(planningCaution, { widthMm: width, colour: graphite }),
  ];
  const bottom = heightMm - marginMm - 4;
  const frame = { x: 10, y: 10, width: widthMm - 20, height: heightMm - 20 };
  const ground: Item[] = [
    { kind: "path", path: rectanglePath({ x: 0, y: 0, width: widthMm, height: heightMm }), fill: sheetWhite },
    { kind: "path", path: rectanglePath(frame), stroke: { colour: ink, widthMm: outlineMm } },
  ];
  const head: Item[] = [
    textItem(input.shop, { x: left, y: 27 }, { font: "serif-bold", sizeMm: 4.4, colour: graphite }),
    textItem("Certificate of approval", { x: left, y: 40 }, { font: "serif-black", sizeMm: 9 }),
    ...titleLines.map((line, index) =>
      textItem(line, { x: left, y: 49 + index * 7 }, { font: "serif", sizeMm: 5, colour: verdigris }),
    ),
  ];
  const first = fillColumns(lines, [{ x: left, y: table.bottom + 8, width, height: bottom - table.bottom - 8 }]);
  const bodies = [[...head, ...table.items, ...first.items]];
  let rest = first.rest;
  while (rest.length > 0) {
    const more = fillColumns(rest, [{ x: left, y: marginMm, width, height: bottom - marginMm }]);
    bodies.push(more.items);
    rest = more.rest;
  }
  return bodies.map((items, index) => ({
    name: `Certificate ${index + 1} of ${bodies.length}`,
    widthMm,
    heightMm,
    items: [
      ...ground,
      ...items,
      textItem(
        `Sheet ${index + 1} of ${bodies.length}`,
        { x: widthMm - marginMm, y: heightMm - 15 },
        { colour: graphite, align: "right" },
      ),
    ],
  }));
}
