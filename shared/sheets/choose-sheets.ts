import type { CutShape } from "./cut-shape.ts";
import type { Filler, Filling, Item, OpenField } from "./filler.ts";
import type { StockSheet } from "./nesting.ts";
import type { SheetField } from "./sheet-field.ts";

/** A kind of sheet with the fields that each of its sheets gives. */
export type SheetKind = { readonly stock: StockSheet; readonly fields: readonly SheetField[] };

export type ChosenSheets = { readonly open: readonly OpenField[]; readonly filling: Filling };

/** An offcut counts for this share of its area when sheets are compared: filled half as well it is as good. */
const offcutShare = 0.5;

/**
 * Takes sheets from stock one by one until everything lies on one: each time the smallest that holds all the rest, and
 * while there is none the one that is filled best. Offcuts count half. Each sheet is filled once, without a search.
 */
export function chooseSheets(
  items: readonly Item[],
  kinds: readonly SheetKind[],
  shapes: readonly CutShape[],
  filler: Filler,
  control: { readonly seed: number; readonly shouldStop: () => boolean },
): ChosenSheets {
  const taken = kinds.map(() => 0);
  const open: OpenField[] = [];
  const laid: Filling["laid"][number][] = [];
  let rest = items;
  while (rest.length > 0 && !control.shouldStop()) {
    let best: { kind: number; filling: Filling; isAll: boolean; value: number; fields: OpenField[] } | null = null;
    for (const [index, kind] of kinds.entries()) {
      const { stock, fields } = kind;
      const number = (taken[index] ?? 0) + 1;
      if (stock.quantity !== null && number > stock.quantity) continue;
      const sheet = fields.map((field) => ({ field, sheet: number }));
      const filling = filler.fill(rest, sheet, { ...control, probes: 0, onProgress: () => undefined });
      if (filling.laid.length === 0) continue;
      const countsMm2 = countedMm2(kind);
      const isAll = filling.left.length === 0;
      const value = isAll ? -countsMm2 : areaOf(filling, shapes) / countsMm2;
      if (!best || (isAll && !best.isAll) || (isAll === best.isAll && value > best.value))
        best = { kind: index, filling, isAll, value, fields: sheet };
    }
    if (!best) break;
    taken[best.kind] = (taken[best.kind] ?? 0) + 1;
    for (const copy of best.filling.laid) laid.push({ ...copy, on: open.length + copy.on });
    open.push(...best.fields);
    rest = best.filling.left;
  }
  return { open, filling: { laid, left: rest } };
}

/** What a sheet counts when sheets are compared: its area, of an offcut half of it, mm². */
export function countedMm2({ stock, fields }: SheetKind): number {
  return fields.reduce((sum, { areaMm2 }) => sum + areaMm2, 0) * (stock.isOffcut ? offcutShare : 1);
}

/** Area of what a filling lays, mm². */
export function areaOf({ laid }: Filling, shapes: readonly CutShape[]): number {
  return laid.reduce((sum, { item }) => sum + (shapes[item.shape]?.areaMm2 ?? 0), 0);
}
