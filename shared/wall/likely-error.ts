import type { Box, Point } from "../geometry/path.ts";
import { homographyBetween, inverse, mapPoint } from "./homography.ts";
import { cornerAt, type Quad } from "./quad.ts";

/** How far lengths read off the photo may be from the truth, mm, one sigma. */
export type LikelyError = {
  readonly widthMm: number;
  readonly heightMm: number;
  /** Of the place of its middle. */
  readonly placeMm: number;
};

/**
 * How far the drawn size and place of a box on the wall may be off when each figure of the marked corners is `markPx` off:
 * each of the eight is moved both ways in turn, what that does to the box is read off, and the eight are added as squares, as errors that know nothing
 * of each other are (JCGM 100:2008, section 5.1). Null when the box is out of the camera's sight.
 */
export function likelyError(sheet: Quad, corners: Quad, box: Box, markPx: number): LikelyError | null {
  const map = homographyBetween(sheet, corners);
  if (!map) return null;
  const middle = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  const ends = [
    { x: box.x, y: middle.y },
    { x: box.x + box.width, y: middle.y },
    { x: middle.x, y: box.y },
    { x: middle.x, y: box.y + box.height },
  ];
  const drawn = ends.map((end) => mapPoint(map, end));
  const sums = { width: 0, height: 0, place: 0 };
  for (let figure = 0; figure < 8; figure++) {
    const [more, less] = [1, -1].map((sign) => measured(sheet, moved(corners, figure, sign * markPx), drawn));
    if (!more || !less) return null;
    sums.width += ((more.width - less.width) / 2) ** 2;
    sums.height += ((more.height - less.height) / 2) ** 2;
    sums.place += ((more.middle.x - less.middle.x) / 2) ** 2 + ((more.middle.y - less.middle.y) / 2) ** 2;
  }
  return { widthMm: Math.sqrt(sums.width), heightMm: Math.sqrt(sums.height), placeMm: Math.sqrt(sums.place) };
}

function moved(corners: Quad, figure: number, by: number): Quad {
  const shift = (index: number): Point => {
    const corner = cornerAt(corners, index);
    if (Math.floor(figure / 2) !== index) return corner;
    return figure % 2 === 0 ? { x: corner.x + by, y: corner.y } : { x: corner.x, y: corner.y + by };
  };
  return [shift(0), shift(1), shift(2), shift(3)];
}

/** Width, height and middle on the wall of what is drawn in the photo, were the corners these. */
function measured(sheet: Quad, corners: Quad, drawn: readonly (Point | null)[]) {
  const map = homographyBetween(sheet, corners);
  const back = map && inverse(map);
  if (!back) return null;
  const [left, right, top, bottom] = drawn.map((point) => (point ? mapPoint(back, point) : null));
  if (!left || !right || !top || !bottom) return null;
  return {
    width: Math.hypot(right.x - left.x, right.y - left.y),
    height: Math.hypot(bottom.x - top.x, bottom.y - top.y),
    middle: { x: (left.x + right.x + top.x + bottom.x) / 4, y: (left.y + right.y + top.y + bottom.y) / 4 },
  };
}
