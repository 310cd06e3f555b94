import { regionAreaMm2 } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Polygon, Region } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { bedCuts } from "./bed-cuts.ts";
import type { CuttingRules, StockSheet } from "./nesting.ts";

/** A sheet, or a part of one, as it lies on the machine. */
export type SheetField = {
  readonly stock: StockSheet;
  readonly part: number;
  readonly parts: number;
  readonly region: Region;
  readonly areaMm2: number;
  /** Around the region. */
  readonly box: Box;
  /** Where pieces may lie, as far as a box can say it: the box without the margin. */
  readonly inner: Box;
  /** Where a piece's grown outline may lie; null for a rectangle, where `inner` says all. */
  readonly allowed: Region | null;
  /** Sheets are filled along their longer side, so that what is left is as square as it can be. */
  readonly along: "x" | "y";
};

/** A sheet's fields, or the sentence that says why it is not used. */
export type FieldsOfSheet =
  | { readonly ok: true; readonly fields: readonly SheetField[]; readonly remark: string | null }
  | { readonly ok: false; readonly remark: string };

/** The fields of a sheet whose outline went through the kernel's union: one when it goes on the bed, else as many as it must be cut into. */
export function fieldsOfSheet(stock: StockSheet, region: Region, rules: CuttingRules, kernel: Kernel): FieldsOfSheet {
  const box = boxOfRegion(region);
  if (!box) return { ok: false, remark: `${stock.name} has no area.` };
  const cuts = bedCuts(stock.name, box, isRectangle(region, box), rules);
  if (!cuts.ok) return cuts;
  const fields = cuts.boxes.flatMap((part, index): SheetField[] => {
    const partRegion = cuts.boxes.length === 1 ? region : [corners(part)];
    const field = fieldOf(stock, partRegion, part, rules, kernel);
    return field ? [{ ...field, part: index + 1, parts: cuts.boxes.length }] : [];
  });
  if (fields.length === 0) return { ok: false, remark: `Inside its margin ${stock.name} has no room for anything.` };
  return { ok: true, fields, remark: cuts.remark };
}

function fieldOf(
  stock: StockSheet,
  region: Region,
  box: Box,
  { marginMm, kerfMm, spacingMm }: CuttingRules,
  kernel: Kernel,
): Omit<SheetField, "part" | "parts"> | null {
  const along = box.width >= box.height ? "x" : "y";
  const shared = { stock, region, areaMm2: regionAreaMm2(region), box, along } as const;
  if (isRectangle(region, box)) {
    const inner = {
      x: box.x + marginMm,
      y: box.y + marginMm,
      width: box.width - 2 * marginMm,
      height: box.height - 2 * marginMm,
    };
    return inner.width > 0 && inner.height > 0 ? { ...shared, inner, allowed: null } : null;
  }
  const halfGap = (kerfMm + spacingMm) / 2;
  const inner = boxOfRegion(kernel.offset(region, -marginMm, "round"));
  // Grown outlines reach half a gap over their pieces. A margin smaller than that counts as half a gap at odd-shaped sheets.
  const allowed = kernel.offset(region, -Math.max(0, marginMm - halfGap), "round");
  return inner ? { ...shared, inner, allowed } : null;
}

/** Whether the region is one axis-parallel rectangle: what covers its whole box. */
function isRectangle(region: Region, box: Box): boolean {
  const perimeter = box.width + box.height;
  return region.length === 1 && box.width * box.height - regionAreaMm2(region) < lengthToleranceMm * perimeter;
}

function corners({ x, y, width, height }: Box): Polygon {
  return [
    { x, y },
    { x: x + width, y },
    { x: x + width, y: y + height },
    { x, y: y + height },
  ];
}
