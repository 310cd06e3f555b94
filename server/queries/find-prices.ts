import type { ReadContext } from "../http/context.ts";
import { PriceBook } from "../models/price-book.ts";

/** The shop's price book with who saved it; null until it has one. */
export function findPrices(
  { transaction }: Pick<ReadContext, "transaction">,
  shopId: string,
): Promise<PriceBook | null> {
  return PriceBook.findByPk(shopId, { include: ["saver"], transaction });
}
