import type { Brief } from "#shared/contracts/jobs.ts";
import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import type { DryFitContext } from "#shared/dry-fit/rule.ts";
import type { ReadContext } from "../http/context.ts";
import type { Shop } from "../models/shop.ts";
import { presentStockItem } from "../presenters/stock-item.ts";
import { wholeStock } from "./list-stock.ts";

/** What the dry fit knows besides the sign: the shop's unit and stock, and what the brief says. */
export async function dryFitContext(
  context: Pick<ReadContext, "transaction">,
  { shop, brief }: { shop: Shop; brief: Brief },
): Promise<DryFitContext> {
  return {
    unit: shop.unit,
    place: brief.place ?? "inside",
    walkway: brief.walkway,
    overhead: brief.overhead,
    electrical: brief.electrical,
    words: brief.words,
    stock: stockOfItems((await wholeStock(context, shop.id)).map(presentStockItem)),
  };
}
