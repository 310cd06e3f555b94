import type { MockupDocument, WallPhoto } from "#shared/mockup/document.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import { formatFine, formatLengthWithUnit } from "#shared/units/format-length.ts";
import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";
import { isDoubtful, likelyErrorAt, type WallReading } from "#shared/wall/read-wall-photo.ts";
import { sheetSizeMm } from "#shared/wall/sheet-on-wall.ts";

const px = (value: number): string => `${Number(value.toFixed(value < 10 ? 1 : 0))} px`;

/** What is left over of the corners, and what that means. */
export function residualWords({ residualPx, residualMm, betterSheet }: WallReading, unit: LengthUnit): string {
  const off = `The corners are ${px(residualPx)} from where a camera would see the sheet’s, ${formatFine(residualMm, unit)} on the wall.`;
  if (!isDoubtful(residualPx)) return off;
  if (betterSheet)
    return `${off} They are those of ${betterSheet.paper === "A4" ? "an A4" : "a Letter"} sheet ${betterSheet.lies}: choose that if it is so.`;
  return `${off} That is more than a hand is off by: look at each corner again, at which sheet it is, and whether the photo was cropped.`;
}

/** How true the picture is where the sign hangs. */
export function errorWords(document: MockupDocument, photo: WallPhoto, reading: WallReading, unit: LengthUnit): string {
  const { board } = document;
  const whole = signBox(document);
  const box = { ...whole, x: whole.x + photo.at.x - board.width / 2, y: whole.y + photo.at.y - board.height / 2 };
  const error = likelyErrorAt(photo, reading, box);
  if (!error) return "The sign hangs where this photo does not show the wall.";
  const about = (mm: number) => formatLengthWithUnit(mm < 10 ? Math.ceil(mm * 2) / 2 : Math.ceil(mm), unit);
  return `Here the sign, ${formatLengthWithUnit(whole.width, unit)} wide, is true to about ${about(error.widthMm)}, its height to ${about(error.heightMm)} and its place to ${about(error.placeMm)}.`;
}

/** Whether the depth of the sign is seen, and why not. */
export function depthWords({ camera }: WallReading): string {
  return camera
    ? "What stands off the wall is shown where the camera would see it."
    : "The view is too frontal to tell the camera’s focal length, so what stands off the wall is drawn flat on it.";
}

/** Where the sign hangs from the sheet. */
export function placeOnWallWords(document: MockupDocument, photo: WallPhoto, unit: LengthUnit): string {
  const { at } = photo;
  const whole = signBox(document);
  const sheet = sheetSizeMm(photo);
  const left = whole.x + at.x - document.board.width / 2;
  const top = whole.y + at.y - document.board.height / 2;
  const gaps = [
    gapWords("right", left - sheet.width / 2, unit),
    gapWords("left", -sheet.width / 2 - (left + whole.width), unit),
    gapWords("below", top - sheet.height / 2, unit),
    gapWords("above", -sheet.height / 2 - (top + whole.height), unit),
  ].filter((words) => words !== null);
  return gaps.length === 0 ? "It covers the sheet." : `From edge to edge it hangs ${gaps.join(" and ")} the sheet.`;
}

function gapWords(side: "right" | "left" | "below" | "above", gap: number, unit: LengthUnit): string | null {
  if (gap < 0) return null;
  const length = formatLengthWithUnit(gap, unit);
  return side === "right" || side === "left" ? `${length} ${side} of` : `${length} ${side}`;
}

/** How far the arrow keys move the sign along the wall, mm: round lengths of the person's unit. */
export const wallStepsOf = (unit: LengthUnit): { readonly usual: number; readonly fine: number } =>
  unit === "mm" ? { usual: 10, fine: 1 } : { usual: inchesToMm(1 / 2), fine: inchesToMm(1 / 16) };
