import { boxOfRegion } from "../geometry/box.ts";
import { checked, lengthRange, type Outcome, type Range, spanRange } from "../units/outcome.ts";
import { slopeOf } from "./half-board.ts";
import type { SlatBoard, SlatDesign } from "./slat-layout.ts";

/** Flatter slats are no mosaic: a mitre at 15 degrees is already five slat widths long. */
export const slatAngleRange: Range = { least: 15, most: 90 };
/** Narrowest slat, mm, and most slats and points of an outline that a board may have. Our choice. */
const narrowestMm = 1;
export const mostSlats = 2_000;
const mostOutlinePoints = 20_000;
/** Most parts that an outline may cut strips into: beyond it clipping takes minutes. */
const mostParts = 20_000;
/** What must be left of a board on each side of a spine, mm. Our choice. */
const leastReachMm = 1;

/** `compute`'s value for a board and slats that can be laid, else the first measure that is out of range. */
export function checkedSlats<T>(board: SlatBoard, design: SlatDesign, compute: () => T): Outcome<T> {
  const { pattern, angle, slatWidth, gap, spineOffset, start, overhang } = design;
  const { width, height, outline } = board;
  const spineWidth = spineWidthOf(design);
  const points = outline?.reduce((count, ring) => count + ring.length, 0) ?? 4;
  const side = (width - spineWidth) / 2 - leastReachMm;
  const sizes = checked(
    {
      boardWidth: [width, lengthRange],
      boardHeight: [height, lengthRange],
      angle: [angle, slatAngleRange],
      slatWidth: [slatWidth, { least: narrowestMm, most: Math.min(width, height) }],
      gap: [gap, { least: 0, most: slatWidth }],
      ...(pattern === "spine"
        ? { spineWidth: [spineWidth, { least: narrowestMm, most: width - 2 * leastReachMm }] }
        : {}),
      ...(pattern === "single" ? {} : { spineOffset: [spineOffset, { least: -side, most: side }] }),
      startHeight: [start.kind === "height" ? start.height : 0, { least: -lengthRange.most, most: lengthRange.most }],
      overhang: [overhang, { least: 0, most: 1_000 }],
      outlinePoints: [points, { least: 3, most: mostOutlinePoints }],
    },
    () => null,
  );
  if (!sizes.ok) return sizes;
  const outlined = checked(outlineMeasures(board), () => null);
  if (!outlined.ok) return outlined;
  return checked(
    {
      slats: [roughCount(board, design), { least: 0, most: mostSlats }],
      outlineParts: [roughParts(board, design), { least: 0, most: mostParts }],
    },
    compute,
  );
}

/** Width of the spine; nothing for slats that have none. */
export const spineWidthOf = ({ pattern, spineWidth }: Pick<SlatDesign, "pattern" | "spineWidth">): number =>
  pattern === "spine" ? spineWidth : 0;

function outlineMeasures({ outline }: SlatBoard): Record<string, readonly [number, Range]> {
  if (!outline) return {};
  const isSound = outline.flat().every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y));
  const box = isSound ? boxOfRegion(outline) : null;
  const reach = { least: -lengthRange.most, most: 2 * lengthRange.most };
  return {
    outlineWidth: [box?.width ?? Number.NaN, spanRange],
    outlineHeight: [box?.height ?? Number.NaN, spanRange],
    outlineLeft: [box?.x ?? Number.NaN, reach],
    outlineTop: [box?.y ?? Number.NaN, reach],
  };
}

/** Slats that the board with its overhang can take at most. */
export function roughCount(
  { width, height }: SlatBoard,
  { pattern, angle, slatWidth, gap, overhang }: SlatDesign,
): number {
  const { sin, cos } = slopeOf(angle);
  const along = (height + 2 * overhang) * sin + (width + 2 * overhang) * cos * (pattern === "single" ? 1 : 0.5);
  return (pattern === "single" ? 1 : 2) * Math.ceil(along / (slatWidth + gap));
}

/** Parts that an outline can cut the strips into at most: each crosses it twice. */
function roughParts({ outline }: SlatBoard, { angle, slatWidth, gap }: SlatDesign): number {
  const { sin, cos } = slopeOf(angle);
  let across = 0;
  for (const ring of outline ?? []) {
    let previous = ring.at(-1);
    for (const point of ring) {
      if (previous) across += Math.abs(point.x - previous.x) * cos + Math.abs(point.y - previous.y) * sin;
      previous = point;
    }
  }
  return Math.ceil(across / (slatWidth + gap) / 2);
}
