import * as contract from "#shared/contracts/prices.ts";
import { changePrices } from "../commands/change-prices.ts";
import { notFound } from "../http/app-error.ts";
import { shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { pricesPolicy } from "../policies/prices.ts";
import { presentPrices } from "../presenters/prices.ts";
import { findPrices } from "../queries/find-prices.ts";

export function registerPriceRoutes(routes: Routes): void {
  read(routes, contract.getPrices, async (context) => {
    const shopId = shopIdOf(context);
    if (!pricesPolicy.see(context.actor, { shopId })) throw notFound("prices");
    return presentPrices(context.actor, shopId, await findPrices(context, shopId));
  });

  write(routes, contract.changePrices, async (context, { body }) => {
    const shopId = shopIdOf(context);
    return presentPrices(context.actor, shopId, await changePrices(context, { shopId, ...body }));
  });
}
