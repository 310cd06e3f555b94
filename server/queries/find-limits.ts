import { readLimits } from "#shared/dry-fit/check-limits.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import type { ReadContext } from "../http/context.ts";
import { ShopLimits } from "../models/shop-limits.ts";

/** The shop's own limits with who saved them; null while it keeps to the defaults. */
export function findLimits(
  { transaction }: Pick<ReadContext, "transaction">,
  shopId: string,
): Promise<ShopLimits | null> {
  return ShopLimits.findByPk(shopId, { include: ["saver"], transaction });
}

/** The limits that the dry fit of a shop keeps to. */
export async function limitsOf(context: Pick<ReadContext, "transaction">, shopId: string): Promise<Limits> {
  return readLimits((await findLimits(context, shopId))?.own ?? {});
}
