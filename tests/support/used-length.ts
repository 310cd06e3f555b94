import { boxOfRegion } from "#shared/geometry/box.ts";
import type { SheetLayout } from "#shared/sheets/nesting.ts";

/** How far the pieces of the last sheet reach along its longer side, from its beginning and with a margin behind them, mm. */
export function usedLengthMm(layout: SheetLayout, marginMm: number): number {
  const sheet = layout.sheets.at(-1);
  const box = sheet && boxOfRegion(sheet.region);
  if (!sheet?.usedBox || !box) return 0;
  const { usedBox } = sheet;
  const end = box.width >= box.height ? usedBox.x + usedBox.width - box.x : usedBox.y + usedBox.height - box.y;
  return end + marginMm;
}
