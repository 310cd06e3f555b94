import * as contract from "#shared/contracts/limits.ts";
import { changeLimits } from "../commands/change-limits.ts";
import { notFound } from "../http/app-error.ts";
import { shopIdOf } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { limitsPolicy } from "../policies/limits.ts";
import { presentLimits } from "../presenters/limits.ts";
import { findLimits } from "../queries/find-limits.ts";

export function registerLimitRoutes(routes: Routes): void {
  read(routes, contract.getLimits, async (context) => {
    const shopId = shopIdOf(context);
    if (!limitsPolicy.see(context.actor, { shopId })) throw notFound("limits");
    return presentLimits(context.actor, shopId, await findLimits(context, shopId));
  });

  write(routes, contract.changeLimits, async (context, { body }) => {
    const shopId = shopIdOf(context);
    return presentLimits(context.actor, shopId, await changeLimits(context, { shopId, ...body }));
  });
}
