import type { z } from "zod";
import type { changeShop as contract } from "#shared/contracts/shop.ts";
import { notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Shop } from "../models/shop.ts";
import { logEvent } from "./log-event.ts";

const fieldWords: Readonly<Record<string, string>> = {
  jobPrefix: "job numbers",
  timeZone: "time zone",
  buildDays: "days to build",
  freightDays: "days on the road",
};

/** Changes the given fields of the shop. A new prefix counts for jobs opened from now on. */
export async function changeShop(
  context: Context,
  { shopId, changes }: { shopId: string; changes: z.output<typeof contract.body> },
): Promise<Shop> {
  const { transaction } = context;
  const shop = await Shop.findByPk(shopId, { lock: transaction.LOCK.UPDATE, transaction });
  if (!shop) throw notFound("shop");
  shop.set(Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined)));
  const fields = shop.changed();
  if (!fields) return shop;
  await shop.save({ transaction });
  await logEvent(context, {
    shopId,
    kind: "shop changed",
    data: { fields: fields.map((field) => fieldWords[field] ?? field) },
  });
  return shop;
}
