import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { StockItem } from "../models/stock-item.ts";
import { readCursor } from "./page.ts";

/** Up to `limit + 1` items on hand, by kind and name. */
export async function listStock(
  { shop, transaction }: ReadContext,
  { cursor, limit, kind }: { cursor?: string | undefined; limit: number; kind?: StockItem["kind"] | undefined },
): Promise<StockItem[]> {
  const after = readCursor(cursor, 3);
  const place = literal(`("StockItem"."kind", lower("StockItem"."name"), "StockItem"."id") > (:kind, :name, :id)`);
  return StockItem.findAll({
    where: {
      [Op.and]: [{ shopId: shop?.id ?? "", retiredAt: null, ...(kind ? { kind } : {}) }, ...(after ? [place] : [])],
    },
    order: ["kind", literal(`lower("StockItem"."name")`), "id"],
    limit: limit + 1,
    replacements: after ? { kind: after[0], name: after[1], id: after[2] } : {},
    transaction,
  });
}
