import { z } from "zod";
import { priceBookSchema } from "../cost/price-book.ts";
import { inShop, instant, nothing } from "./common.ts";
import { endpoint } from "./endpoint.ts";

/** What the shop pays and asks. For its owners and makers; nothing of it goes to reps, clients or guests. */
export const pricesSchema = z.strictObject({
  /** 0 before the shop saved a book. */
  version: z.int().min(0),
  book: priceBookSchema.nullable(),
  savedAt: instant.nullable(),
  savedBy: z.string().nullable(),
  can: z.strictObject({ change: z.boolean() }),
});
export type Prices = z.infer<typeof pricesSchema>;

export const getPrices = endpoint({
  method: "GET",
  path: "/api/shops/:shop/prices",
  summary: "The shop's price book",
  params: inShop,
  query: nothing,
  body: nothing,
  result: pricesSchema,
});

/** `version` is the one the change began from. A newer one answers `stale` with the newer book in `extra.newer`. */
export const changePrices = endpoint({
  method: "PUT",
  path: "/api/shops/:shop/prices",
  summary: "Set the shop's price book as a whole",
  params: inShop,
  query: nothing,
  body: z.strictObject({ version: z.int().min(0), book: priceBookSchema }),
  result: pricesSchema,
});
