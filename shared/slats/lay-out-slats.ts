import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Polygon, Region } from "../geometry/path.ts";
import { checked, type Outcome } from "../units/outcome.ts";
import { checkedSlats, mostSlats, spineWidthOf } from "./check-slats.ts";
import { pitchMm } from "./half-board.ts";
import { sidesOf, startHeightMm } from "./sides.ts";
import type { Slat, SlatBoard, SlatDesign, SlatLayout, Spine } from "./slat-layout.ts";
import { slatsOnOutline } from "./slats-on-outline.ts";
import { slatsOnRectangle } from "./slats-on-rectangle.ts";

/**
 * The slats of a board in laying order, each as cut and as trimmed, with the spine where there is one. Rectangles in closed
 * form, other outlines by clipping: they may be round, hollow or in several parts. Refused: measures that are no numbers or
 * out of range, a slat wider than the board, a gap wider than the slat, more than 2,000 slats.
 */
export function layOutSlats(board: SlatBoard, design: SlatDesign, kernel: Kernel): Outcome<SlatLayout> {
  const laidOut = checkedSlats(board, design, () => layOut(board, design, kernel));
  if (!laidOut.ok) return laidOut;
  // Notches can part slats into more pieces than the strips that were counted before.
  return checked({ slats: [laidOut.value.slats.length, { least: 0, most: mostSlats }] }, () => laidOut.value);
}

/** The board's outline as a region without crossings. */
export function bodyOf({ width, height, outline }: SlatBoard, kernel: Kernel): Region {
  return outline ? kernel.union(outline, "evenodd") : [corners({ x: 0, y: 0, width, height })];
}

function layOut(board: SlatBoard, design: SlatDesign, kernel: Kernel): SlatLayout {
  const body = bodyOf(board, kernel);
  const laid = board.outline ? kernel.offset(body, design.overhang, "mitre") : body;
  const slats = sidesOf(board, design).flatMap((side) =>
    board.outline ? slatsOnOutline(side, design, body, laid, kernel) : slatsOnRectangle(side, design),
  );
  return {
    design,
    body,
    slats: inLayingOrder(slats),
    spine: spineOf(board, design, body, kernel),
    startHeight: startHeightMm(board, design),
    pitch: pitchMm(design),
  };
}

/** From the start on, then from the start back; a strip's left side first, and its parts from the near end on. */
function inLayingOrder(slats: readonly Omit<Slat, "order">[]): Slat[] {
  const place = ({ strip }: Pick<Slat, "strip">) => (strip >= 0 ? strip : 1e6 - strip);
  // The sort keeps equals as they were: sides come left first, and parts near end first.
  return slats.toSorted((a, b) => place(a) - place(b)).map((slat, index) => ({ ...slat, order: index + 1 }));
}

/** Along the whole board with its overhang at both ends; several parts where the board has notches. */
function spineOf(board: SlatBoard, design: SlatDesign, body: Region, kernel: Kernel): Spine | null {
  if (design.pattern !== "spine") return null;
  const width = spineWidthOf(design);
  const x = board.width / 2 + design.spineOffset - width / 2;
  const box = boxOfRegion(body);
  if (!box) return null;
  const strip: Box = { x, y: box.y, width, height: box.height };
  const trimmed = board.outline ? kernel.intersect([corners(strip)], body) : [corners(strip)];
  const left = boxOfRegion(trimmed);
  if (!left) return null;
  const length = left.height + 2 * design.overhang;
  return { untrimmed: corners({ x, y: left.y - design.overhang, width, height: length }), trimmed, length };
}

function corners({ x, y, width, height }: Box): Polygon {
  return [
    { x, y },
    { x: x + width, y },
    { x: x + width, y: y + height },
    { x, y: y + height },
  ];
}
