import { nameOfEntry, type StockEntry } from "#shared/contracts/stock-entry.ts";
import type { StockItem } from "../models/stock-item.ts";

type Stored = Pick<StockItem, "kind" | "name" | "properties" | "quantity">;

/** An entry as the table keeps it. The material or part names no item: which one it is says the row. */
export function storedStock(entry: StockEntry): Stored {
  const name = nameOfEntry(entry);
  switch (entry.kind) {
    case "acrylic": {
      const { kind, acrylic, thicknessesMm, sheets } = entry;
      return {
        kind,
        name,
        properties: { acrylic: { kind, stockId: null, ...acrylic }, thicknessesMm, sheets },
        quantity: null,
      };
    }
    case "wood": {
      const { kind, wood, thicknessesMm } = entry;
      return { kind, name, properties: { wood: { kind, stockId: null, ...wood }, thicknessesMm }, quantity: null };
    }
    case "hardware": {
      const { kind, hardware, quantity } = entry;
      return { kind, name, properties: { hardware: { ...hardware, stockId: null } }, quantity };
    }
    case "screw":
      return { kind: "screw", name, properties: { screw: entry.screw }, quantity: entry.quantity };
    case "adhesive":
      return { kind: "adhesive", name, properties: { adhesive: { ...entry.adhesive, stockId: null } }, quantity: null };
  }
}
