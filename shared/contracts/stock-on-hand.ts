import type { Stock } from "../materials/stock.ts";
import type { StockItem } from "./stock.ts";

/** The shop's stock as the dry fit looks at it, in the order of the list; each part names its item. */
export function stockOfItems(items: readonly StockItem[]): Stock {
  return {
    acrylics: items.flatMap((item) =>
      item.kind === "acrylic"
        ? [{ acrylic: { ...item.acrylic, stockId: item.id }, thicknessesMm: item.thicknessesMm, sheets: item.sheets }]
        : [],
    ),
    woods: items.flatMap((item) =>
      item.kind === "wood" ? [{ wood: { ...item.wood, stockId: item.id }, thicknessesMm: item.thicknessesMm }] : [],
    ),
    hardware: items.flatMap((item) =>
      item.kind === "hardware" ? [{ hardware: { ...item.hardware, stockId: item.id }, quantity: item.quantity }] : [],
    ),
    screws: items.flatMap((item) => (item.kind === "screw" ? [item.screw] : [])),
    adhesives: items.flatMap((item) => (item.kind === "adhesive" ? [{ ...item.adhesive, stockId: item.id }] : [])),
  };
}
