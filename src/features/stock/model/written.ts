import type { StockItem } from "#shared/contracts/stock.ts";
import type { StockEntry, StockKind } from "#shared/contracts/stock-entry.ts";

/** What is being written: a number is null while its field is empty, NaN while it can't be read. */
export type Written<T> = T extends number
  ? number | null
  : T extends readonly (infer Element)[]
    ? readonly Written<Element>[]
    : T extends object
      ? { readonly [K in keyof T]: Written<T[K]> }
      : T;

export type WrittenEntry = Written<StockEntry>;
export type WrittenOf<K extends StockKind> = Extract<WrittenEntry, { readonly kind: K }>;
export type WrittenHardware = WrittenOf<"hardware">["hardware"];
export type WrittenScrew = WrittenOf<"screw">["screw"];
export type WrittenSheet = WrittenOf<"acrylic">["sheets"][number];

/** An item as a form begins with it. */
export function entryOf(item: StockItem): StockEntry {
  switch (item.kind) {
    case "acrylic": {
      const { kind, stockId: _, ...acrylic } = item.acrylic;
      return { kind, acrylic, thicknessesMm: item.thicknessesMm, sheets: item.sheets };
    }
    case "wood": {
      const { kind, stockId: _, ...wood } = item.wood;
      return { kind, wood, thicknessesMm: item.thicknessesMm };
    }
    case "hardware": {
      const { stockId: _, ...hardware } = item.hardware;
      return { kind: "hardware", hardware, quantity: item.quantity };
    }
    case "screw":
      return { kind: "screw", screw: item.screw, quantity: item.quantity };
    case "adhesive": {
      const { stockId: _, ...adhesive } = item.adhesive;
      return { kind: "adhesive", adhesive };
    }
  }
}

/** As it is sent: a stud without a spacer stands on itself. */
export function readyEntry(entry: WrittenEntry): WrittenEntry {
  if (entry.kind !== "hardware" || entry.hardware.kind !== "blindStud" || entry.hardware.barrelLength !== 0)
    return entry;
  return { ...entry, hardware: { ...entry.hardware, barrelDiameter: entry.hardware.studDiameter } };
}
