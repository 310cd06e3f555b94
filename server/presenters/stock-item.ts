import { z } from "zod";
import { type StockItem as StockItemView, stockItemSchema } from "#shared/contracts/stock.ts";
import type { StockItem } from "../models/stock-item.ts";

const carrier = z.enum(["acrylic", "wood", "hardware", "adhesive"]);

/** A stock item with its material or part, which then names this very item as where it came from. */
export function presentStockItem({ id, name, kind, properties, quantity }: StockItem): StockItemView {
  const material = carrier.parse(kind);
  const held = z.object({}).loose().parse(properties[material]);
  return stockItemSchema.parse({
    id,
    name,
    kind,
    [material]: { ...held, stockId: id },
    ...(kind === "acrylic" || kind === "wood" ? { thicknessesMm: properties.thicknessesMm } : {}),
    ...(kind === "hardware" ? { quantity } : {}),
  });
}
