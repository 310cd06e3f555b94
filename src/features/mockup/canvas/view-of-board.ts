import { dimensionRowMm } from "#shared/drawing/dimensions.ts";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import { smallTextMm } from "#shared/drawing/type.ts";
import { boxCentre } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";
import { type DrawingView, type Size, viewScaled } from "@/lib/drawing-view.ts";

/** Lettering on a screen that shows the whole board, in px of the em. */
const letterPx = 13;
/** What a mm of paper is on a screen that shows the whole board. */
const pxPerPaperMm = letterPx / smallTextMm;
const edgePx = 10;
/** Kept free above, where the section beside it has its heading and one row of dimensions more. */
const headingPx = 50;

/** Room for dimensions around the board, in mm of paper: it does not change with the size of board or window. */
export type PaperMargins = {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
};

/** Below the board the section beside it has two rows of dimensions from the wall and a line that states its scale. */
const sectionBottom = 27;

/** So many rows of dimensions have room above the section, with its heading over them. */
const rowsAboveSection = 2;

/** Three rows below and at the right, as most signs have them, for the time before the first picture. */
export const usualMargins: PaperMargins = { left: 14, top: 14, right: 27, bottom: 30 };

/**
 * The margins of a picture of `drawElevation` around a sign, whose box is the board's with its frame, to half a mm so that the window stays still
 * over changes that don't matter. `sectionRows` are the rows of dimensions above the section beside it.
 */
export function marginsOf(
  list: DisplayList,
  sign: Box,
  { paperScale, sectionRows }: { readonly paperScale: number; readonly sectionRows: number },
): PaperMargins {
  const origin = boardOriginOf(list) ?? { x: 0, y: 0 };
  const paper = (mm: number) => Math.round((mm / paperScale) * 2) / 2;
  return {
    left: paper(origin.x + sign.x),
    top: paper(origin.y + sign.y) + dimensionRowMm * Math.max(0, sectionRows - rowsAboveSection),
    right: paper(list.widthMm - origin.x - sign.x - sign.width),
    bottom: Math.max(sectionBottom, paper(list.heightMm - origin.y - sign.y - sign.height)),
  };
}

/**
 * The view of a whole sign with its dimensions in a window: where its board's upper left corner lies, and how large a mm is. A frame round the
 * board makes the sign's box begin left of and above that corner.
 */
export function fitSign(sign: Box, margins: PaperMargins, room: Size): DrawingView {
  const px = (paper: number) => paper * pxPerPaperMm;
  const left = edgePx + px(margins.left);
  const top = headingPx + edgePx + px(margins.top);
  const across = room.width - left - edgePx - px(margins.right);
  const down = room.height - top - edgePx - px(margins.bottom);
  const scale = Math.max(0.01, Math.min(across / sign.width, down / sign.height));
  return {
    scale,
    x: left + (across - sign.width * scale) / 2 - sign.x * scale,
    y: top + (down - sign.height * scale) / 2 - sign.y * scale,
  };
}

/** How many mm of the sign are one of paper, where a mm of the sign is `scale` px. */
export function paperScaleAt(scale: number): number {
  return Number((pxPerPaperMm / scale).toPrecision(3));
}

/** A view with a spot of the board in the middle, close enough to see it well. */
export function viewAt(spot: { readonly x: number; readonly y: number }, fit: DrawingView, room: Size): DrawingView {
  const scale = fit.scale * 3;
  return { scale, x: room.width / 2 - spot.x * scale, y: room.height / 2 - spot.y * scale };
}

/** Room left around what is looked at, as a share of the window. */
const aroundShare = 0.16;

/** The view with a box of the board in the middle, as close as it fits with some room around, but no closer than one may come. */
export function viewOfBox(box: Box, fit: DrawingView, room: Size): DrawingView {
  const free = 1 - 2 * aroundShare;
  const scale = Math.min((room.width * free) / box.width, (room.height * free) / box.height);
  const seen = viewScaled(fit, scale / fit.scale, { x: 0, y: 0 }, fit);
  const middle = boxCentre(box);
  return {
    scale: seen.scale,
    x: room.width / 2 - middle.x * seen.scale,
    y: room.height / 2 - middle.y * seen.scale,
  };
}
