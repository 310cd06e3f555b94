import { boxOfRegion } from "../geometry/box.ts";
import type { NestedSheet, SheetLayout, SheetPiece, StockSheet } from "../sheets/nesting.ts";
import { formatSize } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { fineLineMm } from "./dimensions.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { drawNestedSheet } from "./nested-sheet.ts";
import { graphite } from "./palette.ts";
import { textItem } from "./text-item.ts";
import { smallTextMm, wrapText } from "./type.ts";

export type NestingDiagram = {
  readonly layout: SheetLayout;
  readonly pieces: readonly SheetPiece[];
  readonly stock: readonly StockSheet[];
  readonly unit: LengthUnit;
  /** The paper that is free for it, mm. */
  readonly widthMm: number;
  readonly heightMm: number;
  /** Whether a list ends where its lines do, for a screen; else it is as large as the paper. */
  readonly isTrimmed?: boolean;
};

const headingMm = 13;
const lineMm = 4.8;

/**
 * A layout as drawings for who cuts it: one list a sheet, or part of a sheet, that something is cut from, with its size
 * and use above and what lies on it below. As large as the paper, higher only where the list of pieces needs it.
 */
export function drawNestingDiagrams(diagram: NestingDiagram): DisplayList[] {
  const drawn = diagram.layout.sheets.filter(({ placements }) => placements.length > 0);
  return drawn.map((sheet, index) => page(diagram, sheet, `${index + 1} of ${drawn.length}`));
}

function page(diagram: NestingDiagram, sheet: NestedSheet, count: string): DisplayList {
  const { widthMm, heightMm, unit, isTrimmed = false } = diagram;
  const pieces = new Map(diagram.pieces.map((piece) => [piece.id, piece]));
  const box = boxOfRegion(sheet.region) ?? { x: 0, y: 0, width: 0, height: 0 };
  const lines = wrapText(contents(sheet, pieces), "sans", smallTextMm, widthMm);
  const footMm = (lines.length + 0.5) * lineMm;
  const room = Math.max(heightMm - headingMm - footMm, heightMm / 2);
  const scale = Math.max(box.width / (widthMm - fineLineMm), box.height / (room - fineLineMm));
  const belowMm = headingMm + box.height / scale + fineLineMm;
  const at = { x: fineLineMm / 2, y: headingMm + fineLineMm / 2 };
  const items: Item[] = [
    ...heading(diagram, sheet, { count, scale, size: formatSize(box.width, box.height, unit) }),
    ...drawNestedSheet({ sheet, pieces, scale, at, unit }),
    ...lines.map((line, index) => textItem(line, { x: 0, y: belowMm + (index + 1) * lineMm }, { colour: graphite })),
  ];
  return { widthMm, heightMm: isTrimmed ? belowMm + footMm : Math.max(heightMm, belowMm + footMm), items };
}

function heading(
  { stock, widthMm }: NestingDiagram,
  { stockId, part, parts, use }: NestedSheet,
  { count, scale, size }: { readonly count: string; readonly scale: number; readonly size: string },
): Item[] {
  const name = stock.find(({ id }) => id === stockId)?.name ?? stockId;
  const ofParts = parts > 1 ? `, part ${part} of ${parts}` : "";
  const figures = `${size}, ${usedWords(use)}, at 1:${Number(scale.toFixed(1))}`;
  return [
    textItem(`${name}${ofParts}`, { x: 0, y: 4 }, { font: "serif-bold", sizeMm: 4.2 }),
    textItem(count, { x: widthMm, y: 4 }, { colour: graphite, align: "right" }),
    textItem(figures, { x: 0, y: 10 }, { colour: graphite }),
  ];
}

const usedWords = (use: number): string => (use < 0.01 ? "under 1 % used" : `${Math.round(use * 100)} % used`);

/** What lies on a sheet: each piece once, in the order of the list, with how often. */
function contents({ placements }: NestedSheet, pieces: ReadonlyMap<string, SheetPiece>): string {
  const counts = new Map<string, number>();
  for (const { pieceId } of placements) counts.set(pieceId, (counts.get(pieceId) ?? 0) + 1);
  return [...counts].map(([id, count]) => `${count > 1 ? `${count} × ` : ""}${pieces.get(id)?.name ?? id}`).join(", ");
}
