import type { Transaction } from "sequelize";
import {
  standardAcrylics,
  standardAdhesives,
  standardHardware,
  standardWoods,
} from "#shared/materials/standard-stock.ts";
import { newId } from "../db/new-id.ts";
import { StockItem } from "../models/stock-item.ts";

/** Puts the generic stock list on a shop's shelf, so that a new shop has something to draw with. */
export async function loadStandardStock({
  shopId,
  counted = null,
  now,
  transaction,
}: {
  shopId: string;
  /** How many of each standoff are on hand; a new shop has not counted yet. */
  counted?: number | null;
  now: Date;
  transaction: Transaction;
}): Promise<void> {
  const base = () => ({ id: newId(), shopId, createdAt: now });
  await StockItem.bulkCreate(
    [
      ...standardAcrylics.map(({ acrylic, thicknessesMm }) => ({
        ...base(),
        kind: "acrylic" as const,
        name: acrylic.name,
        properties: { acrylic, thicknessesMm },
      })),
      ...standardWoods.map(({ wood, thicknessesMm }) => ({
        ...base(),
        kind: "wood" as const,
        name: wood.name,
        properties: { wood, thicknessesMm },
      })),
      ...standardHardware.map((hardware) => ({
        ...base(),
        kind: "hardware" as const,
        name: hardware.name,
        properties: { hardware },
        quantity: counted,
      })),
      ...standardAdhesives.map((adhesive) => ({
        ...base(),
        kind: "adhesive" as const,
        name: adhesive.name,
        properties: { adhesive },
      })),
    ],
    { transaction },
  );
}
