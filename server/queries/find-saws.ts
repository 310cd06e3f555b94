import type { ReadContext } from "../http/context.ts";
import { ShopSaws } from "../models/shop-saws.ts";

/** What the shop stated of how it cuts, with who saved it; null while it keeps to the defaults. */
export function findSaws({ transaction }: Pick<ReadContext, "transaction">, shopId: string): Promise<ShopSaws | null> {
  return ShopSaws.findByPk(shopId, { include: ["saver"], transaction });
}
