import { type Actor, isInsider, isStaff } from "./actor.ts";

type ShopFacts = { readonly shopId: string };
const within = (actor: Actor, { shopId }: ShopFacts): boolean => isInsider(actor) && actor.shopId === shopId;

export const shopPolicy = {
  see: within,
  change: (actor: Actor, shop: ShopFacts): boolean => within(actor, shop) && isStaff(actor, "owner"),
  /** Mail that the local sink caught holds links that sign people in. */
  seeOutgoingMail: (actor: Actor, shop: ShopFacts & { readonly keepsMail: boolean }): boolean =>
    shop.keepsMail && within(actor, shop) && isStaff(actor, "owner"),
};
