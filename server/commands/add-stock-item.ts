import type { StockEntry } from "#shared/contracts/stock-entry.ts";
import { newId } from "../db/new-id.ts";
import { type Context, shopIdOf } from "../http/context.ts";
import { StockItem } from "../models/stock-item.ts";
import { loadStandardStock } from "./load-standard-stock.ts";
import { logEvent } from "./log-event.ts";
import { refuseStock, withFreeName } from "./refuse-stock.ts";
import { storedStock } from "./stored-stock.ts";

export async function addStockItem(context: Context, entry: StockEntry): Promise<StockItem> {
  refuseStock(context);
  const { now, transaction } = context;
  const shopId = shopIdOf(context);
  const stored = storedStock(entry);
  const row = { id: newId(), shopId, ...stored, createdAt: now };
  const item = await withFreeName(stored, StockItem.create(row, { transaction }));
  await logEvent(context, { shopId, kind: "stock added", data: { name: item.name } });
  return item;
}

/** Adds what is missing of the usual list; says how many that were. */
export async function addUsualStock(context: Context): Promise<number> {
  refuseStock(context);
  const { now, transaction } = context;
  const shopId = shopIdOf(context);
  // Two presses at once must not both find the same names missing.
  await context.services.sequelize.query("select pg_advisory_xact_lock(hashtext('usual stock'))", { transaction });
  const count = await loadStandardStock({ shopId, now, transaction });
  if (count > 0) await logEvent(context, { shopId, kind: "usual stock added", data: { count } });
  return count;
}
