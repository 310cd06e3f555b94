import * as contract from "#shared/contracts/saws.ts";
import { changeSaws } from "../commands/change-saws.ts";
import { notFound } from "../http/app-error.ts";
import { shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { sawsPolicy } from "../policies/saws.ts";
import { presentSaws } from "../presenters/saws.ts";
import { findSaws } from "../queries/find-saws.ts";

export function registerSawRoutes(routes: Routes): void {
  read(routes, contract.getSaws, async (context) => {
    const shopId = shopIdOf(context);
    if (!sawsPolicy.see(context.actor, { shopId })) throw notFound("saws");
    return presentSaws(context.actor, shopId, await findSaws(context, shopId));
  });

  write(routes, contract.changeSaws, async (context, { body }) => {
    const shopId = shopIdOf(context);
    return presentSaws(context.actor, shopId, await changeSaws(context, { shopId, ...body }));
  });
}
