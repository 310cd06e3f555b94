import { type Actor, isStaff } from "./actor.ts";

type ShopFacts = { readonly shopId: string };

/** Who stands at the saw says how it cuts; all staff may read it. */
export const sawsPolicy = {
  see: (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor) && actor.shopId === shopId,
  change: (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor, "owner", "maker") && actor.shopId === shopId,
};
