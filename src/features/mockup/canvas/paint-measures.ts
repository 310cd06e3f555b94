import { type FabricObject, Path as FabricPath, FabricText, Rect } from "fabric/es";
import type { Box } from "#shared/geometry/path.ts";
import { type Axis, otherAxis, spanOf } from "../model/span.ts";
import type { LetteredMeasure } from "./marks.ts";

/** The theme's ink and sheet: a canvas has no classes. */
const ink = "#1F1D1A";
const sheet = "#FFFFFF";

const still = { selectable: false, evented: false, objectCaching: false } as const;

const letterPx = 13;
const arrowPx = 7;
const arrowHalfPx = 2.2;
/** How far beside a box its distances to the board's edges are drawn. */
const besidePx = 15;
/** A gap that looks smaller than this isn't read but looked at closer, unless it is like another. */
const leastGapPx = 16;
/** Kept free between lettering and the window's edge. */
const edgePx = 12;

/** Distances as a drawing office gives them: lines with arrows, the figure on the line, read from below and from the right. */
export function paintMeasures(measures: readonly LetteredMeasure[], window: Box, mmPerPx: number): FabricObject[] {
  return measures.flatMap((measure) => paintMeasure(measure, window, mmPerPx));
}

function paintMeasure(measure: LetteredMeasure, window: Box, mmPerPx: number): FabricObject[] {
  const { axis, from, to, of, level, text, isEqual } = measure;
  const px = (count: number) => count * mmPerPx;
  if (of === "piece" && !isEqual && to - from < px(leastGapPx)) return [];
  const seen = spanOf(window, axis);
  const seenAcross = spanOf(window, otherAxis(axis));
  const [start, end] = [Math.max(from, seen.from + px(edgePx)), Math.min(to, seen.to - px(edgePx))];
  if (start >= end) return [];
  const wished = of === "board" ? level - px(besidePx) : level;
  const line = Math.min(seenAcross.to - px(edgePx), Math.max(seenAcross.from + px(edgePx + 22), wished));
  const place = placing(axis);
  const arrow = (tip: number, direction: number) =>
    strokeOf([
      place(tip + direction * px(arrowPx), line - px(arrowHalfPx)),
      place(tip, line),
      place(tip + direction * px(arrowPx), line + px(arrowHalfPx)),
    ]);
  const roomForArrows = to - from > px(2 * arrowPx + 4);
  const tail = roomForArrows ? 0 : px(arrowPx + 4);
  const strokes = [
    strokeOf([place(from - tail, line), place(to + tail, line)]),
    arrow(from, roomForArrows ? 1 : -1),
    arrow(to, roomForArrows ? -1 : 1),
    ...(of === "board"
      ? [from, to].map((along) => strokeOf([place(along, line - px(5)), place(along, Math.max(line + px(5), level))]))
      : [from, to].map((along) => strokeOf([place(along, line - px(7)), place(along, line + px(7))]))),
  ].join(" ");
  const lines = (stroke: string, widthPx: number, opacity: number) =>
    new FabricPath(strokes, { ...still, fill: null, stroke, strokeWidth: px(widthPx), opacity });
  return [lines(sheet, 3, 0.7), lines(ink, 1, 1), ...lettering({ axis, text, start, end, line }, px)];
}

type Lettering = {
  readonly axis: Axis;
  readonly text: string;
  readonly start: number;
  readonly end: number;
  readonly line: number;
};

/** The figure in the middle of what is seen of its line; where that is too short, beside the line. */
function lettering({ axis, text, start, end, line }: Lettering, px: (count: number) => number): FabricObject[] {
  const label = new FabricText(text, {
    ...still,
    fontFamily: "Merriweather",
    fontSize: px(letterPx),
    lineHeight: 1,
    fill: ink,
    strokeWidth: 0,
    angle: axis === "x" ? 0 : -90,
  });
  const [width, height] = [label.width + px(8), px(letterPx + 4)];
  const fits = end - start > width + px(2 * arrowPx);
  const across = fits ? line : line - px(letterPx);
  const { x, y } = placing(axis)((start + end) / 2, across);
  const ground = new Rect({
    ...still,
    left: x,
    top: y,
    width: axis === "x" ? width : height,
    height: axis === "x" ? height : width,
    rx: px(2),
    ry: px(2),
    fill: sheet,
    opacity: 0.92,
    strokeWidth: 0,
  });
  label.set({ left: x, top: y });
  return [ground, label];
}

const placing = (axis: Axis) => (along: number, across: number) =>
  axis === "x" ? { x: along, y: across } : { x: across, y: along };

const strokeOf = (points: readonly { readonly x: number; readonly y: number }[]): string =>
  points.map(({ x, y }, index) => `${index === 0 ? "M" : "L"} ${x} ${y}`).join(" ");
