/** A sheet as it lies before the reader. */
export type SheetSize = { readonly widthMm: number; readonly heightMm: number };

/** One field along an edge of the frame. */
export type ZoneField = { readonly label: string; readonly fromMm: number; readonly toMm: number };

/** Fields are 50 mm long and are counted from the sheet's middle (ISO 5457). */
const fieldMm = 50;
/** The frame leaves 20 mm at the left, where a sheet is filed, and 10 mm elsewhere (ISO 5457). */
export const frameMarginMm = { left: 20, top: 10, right: 10, bottom: 10 } as const;

/** Letters run from the top down, I and O are not used (ISO 5457). */
const rowLetters = "ABCDEFGHJKLMNPQRSTUVWXYZ";

/** The frame's box on the sheet: the space that may be drawn on. */
export function frameOf({ widthMm, heightMm }: SheetSize): { x: number; y: number; width: number; height: number } {
  const { left, top, right, bottom } = frameMarginMm;
  return { x: left, y: top, width: Math.max(0, widthMm - left - right), height: Math.max(0, heightMm - top - bottom) };
}

/** Fields across the sheet, numbered from the left. The first and the last take what is over up to the frame. */
export function columnFields(sheet: SheetSize): ZoneField[] {
  const frame = frameOf(sheet);
  return fields(sheet.widthMm, frame.x, frame.x + frame.width, (index) => String(index + 1));
}

/** Fields down the sheet, lettered from the top. */
export function rowFields(sheet: SheetSize): ZoneField[] {
  const frame = frameOf(sheet);
  return fields(sheet.heightMm, frame.y, frame.y + frame.height, rowLetter);
}

/**
 * The zone of a point of the sheet in mm, as "B4". Points between frame and edge count to the nearest field; a point
 * off the sheet has none. A point on a line between two fields belongs to the later one.
 */
export function zoneOf(point: { readonly x: number; readonly y: number }, sheet: SheetSize): string | null {
  const inside = point.x >= 0 && point.y >= 0 && point.x <= sheet.widthMm && point.y <= sheet.heightMm;
  if (!inside) return null;
  const column = columnFields(sheet).findLast((field, index) => index === 0 || point.x >= field.fromMm);
  const row = rowFields(sheet).findLast((field, index) => index === 0 || point.y >= field.fromMm);
  return row && column ? `${row.label}${column.label}` : null;
}

/**
 * An even number of fields, as many as come nearest to 50 mm each: A4 6 × 4, A3 8 × 6, A0 24 × 16, as ISO 5457 lists
 * them.
 */
function fieldCount(sideMm: number): number {
  return 2 * Math.max(1, Math.round(sideMm / 2 / fieldMm));
}

function fields(sideMm: number, frameFrom: number, frameTo: number, label: (index: number) => string): ZoneField[] {
  const count = fieldCount(sideMm);
  return Array.from({ length: count }, (_, index) => {
    const from = sideMm / 2 + (index - count / 2) * fieldMm;
    return {
      label: label(index),
      fromMm: index === 0 ? frameFrom : from,
      toMm: index === count - 1 ? frameTo : from + fieldMm,
    };
  });
}

function rowLetter(index: number): string {
  const letter = rowLetters[index % rowLetters.length] ?? "";
  return index < rowLetters.length ? letter : `${rowLetters[Math.floor(index / rowLetters.length) - 1] ?? ""}${letter}`;
}
