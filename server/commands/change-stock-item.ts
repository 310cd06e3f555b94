import type { StockEntry } from "#shared/contracts/stock-entry.ts";
import { canonicalJson } from "../files/canonical-json.ts";
import { invalid, stale } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import type { StockItem } from "../models/stock-item.ts";
import { presentStockItem } from "../presenters/stock-item.ts";
import { lockStockItem } from "../queries/find-stock-item.ts";
import { logEvent } from "./log-event.ts";
import { refuseStock, withFreeName } from "./refuse-stock.ts";
import { storedStock } from "./stored-stock.ts";

type Begun = { readonly itemId: string; readonly version: number };

/** Changes an item as a whole, if the change began from how it is now. Drawings keep what was copied into them. */
export async function changeStockItem(
  context: Context,
  { entry, ...begun }: Begun & { entry: StockEntry },
): Promise<StockItem> {
  const item = await newestItem(context, begun);
  const { shopId, kind, name, properties, quantity, version } = item;
  if (entry.kind !== kind)
    throw invalid([{ pointer: "/entry/kind", detail: "An item keeps its kind. Add another one instead." }]);
  const stored = storedStock(entry);
  if (canonicalJson({ kind, name, properties, quantity }) === canonicalJson(stored)) return item;
  await withFreeName(stored, item.update({ ...stored, version: version + 1 }, { transaction: context.transaction }));
  await logEvent(context, { shopId, kind: "stock changed", data: { name: item.name } });
  return item;
}

/** Says how many of a standoff or screw are on hand; null takes a count back. */
export async function countStockItem(
  context: Context,
  { quantity, ...begun }: Begun & { quantity: number | null },
): Promise<StockItem> {
  const item = await newestItem(context, begun);
  const { shopId, kind, name, quantity: before, version } = item;
  if (kind !== "hardware" && kind !== "screw")
    throw invalid([{ pointer: "/quantity", detail: "Only standoffs and screws are counted by the piece." }]);
  if (before === quantity) return item;
  await item.update({ quantity, version: version + 1 }, { transaction: context.transaction });
  await logEvent(context, { shopId, kind: "stock counted", data: { name, from: before, to: quantity } });
  return item;
}

/** Takes an item out of stock or brings it back. It stays, since drawings name it. */
export async function setStockState(
  context: Context,
  { itemId, state }: { itemId: string; state: "in stock" | "retired" },
): Promise<StockItem> {
  refuseStock(context);
  const { transaction, now } = context;
  const item = await lockStockItem(context, itemId);
  const retire = state === "retired";
  if (retire === (item.retiredAt !== null)) return item;
  await withFreeName(item, item.update({ retiredAt: retire ? now : null, version: item.version + 1 }, { transaction }));
  const { shopId, name } = item;
  await logEvent(context, { shopId, kind: retire ? "stock taken out" : "stock brought back", data: { name } });
  return item;
}

async function newestItem(context: Context, { itemId, version }: Begun): Promise<StockItem> {
  refuseStock(context);
  const item = await lockStockItem(context, itemId);
  if (item.version !== version)
    throw stale(
      "Someone changed this while you were at it. Take what they saved, or save yours over it.",
      presentStockItem(item),
    );
  return item;
}
