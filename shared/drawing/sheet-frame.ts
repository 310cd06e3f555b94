import type { Box } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { columnFields, frameOf, rowFields, type SheetSize } from "../units/zones.ts";
import { fineLineMm, outlineMm } from "./dimensions.ts";
import type { Item } from "./display-list.ts";
import { graphite, ink, sheetWhite } from "./palette.ts";
import { lineItem, textItem } from "./text-item.ts";
import { capHeightShare, smallTextMm } from "./type.ts";

/** Width of the band around the frame that carries the zones' letters and numbers. */
const bandMm = 5;

function grown(box: Box, by: number): Box {
  return { x: box.x - by, y: box.y - by, width: box.width + 2 * by, height: box.height + 2 * by };
}

/** White paper, the frame and the zone marks around it: letters down, numbers across (ISO 5457). */
export function drawSheetFrame(sheet: SheetSize): Item[] {
  const frame = frameOf(sheet);
  const outer = grown(frame, bandMm);
  const baseline = (smallTextMm * capHeightShare) / 2;
  const style = { font: "serif" as const, colour: graphite, align: "middle" as const };
  const tick = (x: number, y: number, toX: number, toY: number) =>
    lineItem({ x, y }, { x: toX, y: toY }, fineLineMm, graphite);
  const right = frame.x + frame.width;
  const bottom = frame.y + frame.height;
  const columns = columnFields(sheet).flatMap(({ label, fromMm, toMm }, index) => {
    const x = (fromMm + toMm) / 2;
    const marks = [outer.y + bandMm / 2, bottom + bandMm / 2].map((y) =>
      textItem(label, { x, y: y + baseline }, style),
    );
    const ticks = [tick(fromMm, outer.y, fromMm, frame.y), tick(fromMm, bottom, fromMm, bottom + bandMm)];
    return [...marks, ...(index === 0 ? [] : ticks)];
  });
  const rows = rowFields(sheet).flatMap(({ label, fromMm, toMm }, index) => {
    const y = (fromMm + toMm) / 2 + baseline;
    const marks = [outer.x + bandMm / 2, right + bandMm / 2].map((x) => textItem(label, { x, y }, style));
    const ticks = [tick(outer.x, fromMm, frame.x, fromMm), tick(right, fromMm, right + bandMm, fromMm)];
    return [...marks, ...(index === 0 ? [] : ticks)];
  });
  const paper = { x: 0, y: 0, width: sheet.widthMm, height: sheet.heightMm };
  return [
    { kind: "path", path: rectanglePath(paper), fill: sheetWhite },
    { kind: "path", path: rectanglePath(outer), stroke: { colour: graphite, widthMm: fineLineMm } },
    ...columns,
    ...rows,
    { kind: "path", path: rectanglePath(frame), stroke: { colour: ink, widthMm: outlineMm } },
  ];
}
