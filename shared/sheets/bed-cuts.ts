import type { Box } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { formatSize } from "../units/format-length.ts";
import type { CuttingRules } from "./nesting.ts";

/** The parts in which a sheet goes on the bed, or the sentence that says why it does not. */
export type BedCuts =
  | { readonly ok: true; readonly boxes: readonly Box[]; readonly remark: string | null }
  | { readonly ok: false; readonly remark: string };

/**
 * Cuts a sheet for the bed, straight across and a kerf wide, in parts as large as the bed takes them. Sheets that are no
 * rectangle are not cut up: where to cut them is for somebody who sees them.
 */
export function bedCuts(name: string, sheet: Box, isRectangle: boolean, { bed, kerfMm }: CuttingRules): BedCuts {
  if (!bed) return { ok: true, boxes: [sheet], remark: null };
  const lying = cutBoxes(sheet, bed.widthMm, bed.heightMm, kerfMm);
  const turned = cutBoxes(sheet, bed.heightMm, bed.widthMm, kerfMm);
  const boxes = turned.length < lying.length ? turned : lying;
  if (boxes.length === 1) return { ok: true, boxes: [sheet], remark: null };
  const larger = `${name} (${formatSize(sheet.width, sheet.height, "mm")}) is larger than the bed (${formatSize(bed.widthMm, bed.heightMm, "mm")})`;
  if (bed.larger === "refuse") return { ok: false, remark: `${larger} and is not used.` };
  if (!isRectangle) return { ok: false, remark: `${larger} and no rectangle: cut it smaller by hand first.` };
  if (boxes.length > mostParts) return { ok: false, remark: `${larger} and would have to be cut into too many parts.` };
  return { ok: true, boxes, remark: `${larger}: it is cut into ${boxes.length} parts first.` };
}

/** More parts than this are a mistake in the sizes. */
const mostParts = 64;

function cutBoxes(sheet: Box, widthMm: number, heightMm: number, kerfMm: number): Box[] {
  const columns = cutLengths(sheet.width, widthMm, kerfMm);
  const rows = cutLengths(sheet.height, heightMm, kerfMm);
  return rows.flatMap((row) =>
    columns.map((column) => ({
      x: sheet.x + column.from,
      y: sheet.y + row.from,
      width: column.length,
      height: row.length,
    })),
  );
}

function cutLengths(whole: number, longest: number, kerf: number): { from: number; length: number }[] {
  const lengths: { from: number; length: number }[] = [];
  for (let from = 0; from < whole - lengthToleranceMm && lengths.length <= mostParts; from += longest + kerf)
    lengths.push({ from, length: Math.min(longest, whole - from) });
  return lengths;
}
