import { changedEntries } from "#shared/cost/changed-entries.ts";
import type { PriceBook as Book } from "#shared/cost/price-book.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";
import { notAllowed, notFound, stale } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { PriceBook } from "../models/price-book.ts";
import { Shop } from "../models/shop.ts";
import { pricesPolicy } from "../policies/prices.ts";
import { presentPrices } from "../presenters/prices.ts";
import { findPrices } from "../queries/find-prices.ts";
import { logEvent } from "./log-event.ts";

/**
 * Sets the shop's price book if it was changed from the newest version; otherwise answers `stale` with the newer one. The log
 * says which entries changed and keeps no amounts, since it is read by more people than prices are.
 */
export async function changePrices(
  context: Context,
  { shopId, version, book }: { shopId: string; version: number; book: Book },
): Promise<PriceBook | null> {
  const { actor, transaction, now } = context;
  if (actor.kind !== "staff" || !pricesPolicy.see(actor, { shopId })) throw notFound("prices");
  if (!pricesPolicy.change(actor, { shopId })) throw notAllowed("Only an owner sets the shop's prices.");
  // Before the first book there is no row of it to lock.
  await Shop.findByPk(shopId, { lock: transaction.LOCK.UPDATE, transaction, rejectOnEmpty: true });
  const kept = await findPrices(context, shopId);
  if (version !== (kept?.version ?? 0)) {
    throw stale(
      "Someone saved other prices while you were changing them. Keep theirs or yours.",
      presentPrices(actor, shopId, kept),
    );
  }
  const entries = changedEntries(kept?.book ?? emptyPriceBook(book.currency), book);
  if (kept && entries.length === 0) return kept;
  const saved = { version: version + 1, book, savedBy: actor.personId, savedAt: now };
  if (kept) await kept.update(saved, { transaction });
  else await PriceBook.create({ shopId, ...saved }, { transaction });
  await logEvent(context, { shopId, kind: "prices changed", data: { entries } });
  return findPrices(context, shopId);
}
