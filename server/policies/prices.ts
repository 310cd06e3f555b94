import { type Actor, isStaff } from "./actor.ts";

type ShopFacts = { readonly shopId: string };

/** What a sign costs the shop: the owner's to set, for those who make it to know. A rep quotes without it. */
export const pricesPolicy = {
  see: (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor, "owner", "maker") && actor.shopId === shopId,
  change: (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor, "owner") && actor.shopId === shopId,
};
