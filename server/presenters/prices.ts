import type { Prices } from "#shared/contracts/prices.ts";
import { priceBookSchema } from "#shared/cost/price-book.ts";
import type { PriceBook } from "../models/price-book.ts";
import type { Actor } from "../policies/actor.ts";
import { pricesPolicy } from "../policies/prices.ts";

/** The shop's prices; no book, version 0, while it has saved none. */
export function presentPrices(actor: Actor, shopId: string, kept: PriceBook | null): Prices {
  return {
    version: kept?.version ?? 0,
    book: kept ? priceBookSchema.parse(kept.book) : null,
    savedAt: kept?.savedAt.toISOString() ?? null,
    savedBy: kept?.saver?.name ?? null,
    can: { change: pricesPolicy.change(actor, { shopId }) },
  };
}
