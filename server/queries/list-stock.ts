import { literal, Op, type WhereOptions } from "sequelize";
import { z } from "zod";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { StockItem } from "../models/stock-item.ts";
import { places, readCursor } from "./page.ts";

type Wanted = {
  readonly cursor?: string | undefined;
  readonly limit: number;
  readonly kind?: StockKind | undefined;
  /** A part of the name. */
  readonly q?: string | undefined;
  readonly state: "in stock" | "retired";
};

const byName = literal(`lower("StockItem"."name")`);

/** Up to `limit + 1` items by kind and name. */
export async function listStock(context: ReadContext, { cursor, limit, kind, q, state }: Wanted): Promise<StockItem[]> {
  const after = readCursor(cursor, z.tuple([places.id]));
  const shopId = shopIdOf(context);
  const wanted = q?.trim();
  const conditions: WhereOptions[] = [
    { shopId, retiredAt: state === "retired" ? { [Op.ne]: null } : null, ...(kind ? { kind } : {}) },
  ];
  if (wanted) conditions.push(literal(`"StockItem"."name" ilike :q`));
  if (after) {
    conditions.push(
      literal(`("StockItem"."kind", lower("StockItem"."name"), "StockItem"."id") > (
        select before.kind, lower(before.name), before.id from stock_items before where before.shop_id = :shopId and before.id = :id)`),
    );
  }
  return StockItem.findAll({
    where: { [Op.and]: conditions },
    order: ["kind", byName, "id"],
    limit: limit + 1,
    replacements: { shopId, id: after?.[0] ?? null, q: `%${(wanted ?? "").replace(/[\\%_]/g, "\\$&")}%` },
    transaction: context.transaction,
  });
}

/** Everything in stock, in the list's order. */
export function wholeStock({ transaction }: Pick<ReadContext, "transaction">, shopId: string): Promise<StockItem[]> {
  return StockItem.findAll({ where: { shopId, retiredAt: null }, order: ["kind", byName, "id"], transaction });
}
