import type { Transaction } from "sequelize";
import type { SheetsOnHand } from "#shared/materials/stock.ts";
import { loadStandardStock } from "../../commands/load-standard-stock.ts";
import { StockItem } from "../../models/stock-item.ts";
import { newId } from "../new-id.ts";
import { birchPlywood } from "./demo-mockup.ts";

const whole = { widthMm: 1220, heightMm: 610 } as const;
const half = { widthMm: 610, heightMm: 610 } as const;

/** The colours that somebody counted last week; the other sheets nobody has. */
const countedSheets: Readonly<Record<string, readonly SheetsOnHand[]>> = {
  Midnight: [
    { thicknessMm: 3, ...whole, quantity: 2 },
    { thicknessMm: 4.5, ...whole, quantity: 1 },
    { thicknessMm: 4.5, ...half, quantity: 3 },
  ],
  Brass: [
    { thicknessMm: 3, ...half, quantity: 4 },
    { thicknessMm: 4.5, ...half, quantity: 2 },
  ],
  Chalk: [{ thicknessMm: 3, ...half, quantity: 1 }],
  Rust: [{ thicknessMm: 3, ...half, quantity: 0 }],
  Clear: [
    { thicknessMm: 3, ...whole, quantity: 5 },
    { thicknessMm: 6, ...whole, quantity: null },
  ],
};

/** The usual list on the demo shop's shelf, and plywood to lay slats on: standoffs and screws counted, and the sheets of a few colours. */
export async function loadDemoStock(on: { shopId: string; now: Date; transaction: Transaction }): Promise<void> {
  await loadStandardStock({ ...on, counted: 24 });
  const { shopId, now, transaction } = on;
  await StockItem.create(
    {
      id: newId(),
      shopId,
      kind: "wood",
      name: birchPlywood.name,
      properties: { wood: birchPlywood, thicknessesMm: [12, 15, 18] },
      createdAt: now,
    },
    { transaction },
  );
  for (const [name, sheets] of Object.entries(countedSheets)) {
    const item = await StockItem.findOne({
      where: { shopId, kind: "acrylic", name },
      transaction,
      rejectOnEmpty: true,
    });
    await item.update({ properties: { ...item.properties, sheets } }, { transaction });
  }
}
