import { notFound } from "../http/app-error.ts";
import { type Context, shopIdOf } from "../http/context.ts";
import { StockItem } from "../models/stock-item.ts";

/** An item of the shop, in stock or not, held until the transaction ends. */
export async function lockStockItem(context: Context, itemId: string): Promise<StockItem> {
  const { transaction } = context;
  const item = await StockItem.findOne({
    where: { id: itemId, shopId: shopIdOf(context) },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  if (!item) throw notFound("item");
  return item;
}
