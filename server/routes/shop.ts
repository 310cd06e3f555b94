import * as contract from "#shared/contracts/shop.ts";
import { changeShop } from "../commands/change-shop.ts";
import { notAllowed, notFound } from "../http/app-error.ts";
import { shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { Shop } from "../models/shop.ts";
import { shopPolicy } from "../policies/shop.ts";
import { presentShop } from "../presenters/shop.ts";

export function registerShopRoutes(routes: Routes): void {
  const keepsMail = routes.services.mailSink !== null;

  read(routes, contract.getShop, async (context) => {
    const { actor, transaction } = context;
    const shop = await Shop.findByPk(shopIdOf(context), { transaction });
    if (!shop || !shopPolicy.see(actor, { shopId: shop.id })) throw notFound("shop");
    return presentShop(actor, shop, { keepsMail });
  });

  write(routes, contract.changeShop, async (context, { body }) => {
    const shopId = shopIdOf(context);
    if (!shopPolicy.change(context.actor, { shopId })) throw notAllowed("Only an owner changes the shop.");
    return presentShop(context.actor, await changeShop(context, { shopId, changes: body }), { keepsMail });
  });
}
