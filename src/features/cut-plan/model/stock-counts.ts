import type { StockItem } from "#shared/contracts/stock.ts";
import type { CountedParts } from "#shared/cut-plan/to-buy.ts";

/** How many of each standoff and screw are on hand. */
export function countedParts(items: readonly StockItem[]): CountedParts {
  return {
    hardware: items.flatMap((item) =>
      item.kind === "hardware" ? [{ hardware: { ...item.hardware, stockId: item.id }, quantity: item.quantity }] : [],
    ),
    screws: items.flatMap((item) => (item.kind === "screw" ? [{ screw: item.screw, quantity: item.quantity }] : [])),
  };
}
