import { type Actor, isStaff } from "./actor.ts";

type ShopFacts = { readonly shopId: string };

/** Limits decide what may be issued, so they are the owner's; all who read a dry fit may see what it keeps to. */
export const limitsPolicy = {
  see: (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor) && actor.shopId === shopId,
  change: (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor, "owner") && actor.shopId === shopId,
};
