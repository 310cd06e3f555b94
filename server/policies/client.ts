import { type Actor, isStaff } from "./actor.ts";

type ShopFacts = { readonly shopId: string };
const ofShop = (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor) && actor.shopId === shopId;

/** Clients and their contacts belong to the shop's staff, whatever their role. */
export const clientPolicy = {
  list: (actor: Actor): boolean => isStaff(actor),
  see: ofShop,
  add: (actor: Actor): boolean => isStaff(actor),
  change: ofShop,
};
