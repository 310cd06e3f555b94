import { z } from "zod";
import { type StockItem as StockItemView, stockItemSchema } from "#shared/contracts/stock.ts";
import type { StockItem } from "../models/stock-item.ts";

/** A stock item with its material or part, which then names this very item as where it came from. A screw names none. */
export function presentStockItem({
  id,
  name,
  kind,
  properties,
  quantity,
  version,
  retiredAt,
}: StockItem): StockItemView {
  const held = z.object({}).loose().parse(properties[kind]);
  return stockItemSchema.parse({
    id,
    name,
    version,
    retiredAt: retiredAt?.toISOString() ?? null,
    kind,
    [kind]: kind === "screw" ? held : { ...held, stockId: id },
    ...(kind === "acrylic" || kind === "wood" ? { thicknessesMm: properties.thicknessesMm } : {}),
    ...(kind === "acrylic" ? { sheets: properties.sheets } : {}),
    ...(kind === "hardware" || kind === "screw" ? { quantity } : {}),
  });
}
