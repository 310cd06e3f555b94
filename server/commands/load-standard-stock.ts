import type { Transaction } from "sequelize";
import {
  standardAcrylics,
  standardAdhesives,
  standardHardware,
  standardScrews,
  standardWoods,
} from "#shared/materials/standard-stock.ts";
import { newId } from "../db/new-id.ts";
import { StockItem } from "../models/stock-item.ts";

type StockRow = Pick<StockItem, "kind" | "name" | "properties">;

const usualRows: readonly StockRow[] = [
  ...standardAcrylics.map(({ acrylic, thicknessesMm, sheets }) => ({
    kind: "acrylic" as const,
    name: acrylic.name,
    properties: { acrylic, thicknessesMm, sheets },
  })),
  ...standardWoods.map(({ wood, thicknessesMm }) => ({
    kind: "wood" as const,
    name: wood.name,
    properties: { wood, thicknessesMm },
  })),
  ...standardHardware.map((hardware) => ({ kind: "hardware" as const, name: hardware.name, properties: { hardware } })),
  ...standardScrews.map((screw) => ({ kind: "screw" as const, name: screw.name, properties: { screw } })),
  ...standardAdhesives.map((adhesive) => ({
    kind: "adhesive" as const,
    name: adhesive.name,
    properties: { adhesive },
  })),
];

/**
 * Puts what is missing of the generic stock list on a shop's shelf, so that it has something to draw with; says how many
 * that were. A name that the shop knows, in stock or taken out, is left as it is.
 */
export async function loadStandardStock({
  shopId,
  counted = null,
  now,
  transaction,
}: {
  shopId: string;
  /** How many of each standoff and screw are on hand; a new shop has not counted yet. */
  counted?: number | null;
  now: Date;
  transaction: Transaction;
}): Promise<number> {
  const known = await StockItem.findAll({ where: { shopId }, attributes: ["kind", "name"], transaction });
  const names = new Set(known.map(placeOf));
  const missing = usualRows.filter((row) => !names.has(placeOf(row)));
  await StockItem.bulkCreate(
    missing.map((row) => ({
      ...row,
      id: newId(),
      shopId,
      quantity: row.kind === "hardware" || row.kind === "screw" ? counted : null,
      createdAt: now,
    })),
    { transaction },
  );
  return missing.length;
}

/** A name stands once in its kind, whatever its capitals. */
const placeOf = ({ kind, name }: Pick<StockRow, "kind" | "name">): string => `${kind} ${name.toLowerCase()}`;
