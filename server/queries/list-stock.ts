import { literal, Op } from "sequelize";
import { z } from "zod";
import type { ReadContext } from "../http/context.ts";
import { StockItem } from "../models/stock-item.ts";
import { places, readCursor } from "./page.ts";

/** Up to `limit + 1` items on hand, by kind and name. */
export async function listStock(
  { shop, transaction }: ReadContext,
  { cursor, limit, kind }: { cursor?: string | undefined; limit: number; kind?: StockItem["kind"] | undefined },
): Promise<StockItem[]> {
  const after = readCursor(cursor, z.tuple([places.id]));
  const place = literal(`("StockItem"."kind", lower("StockItem"."name"), "StockItem"."id") > (
    select before.kind, lower(before.name), before.id from stock_items before where before.shop_id = :shopId and before.id = :id)`);
  return StockItem.findAll({
    where: {
      [Op.and]: [{ shopId: shop?.id ?? "", retiredAt: null, ...(kind ? { kind } : {}) }, ...(after ? [place] : [])],
    },
    order: ["kind", literal(`lower("StockItem"."name")`), "id"],
    limit: limit + 1,
    replacements: { shopId: shop?.id ?? "", id: after?.[0] ?? null },
    transaction,
  });
}
