import { type Actor, isStaff } from "./actor.ts";

type ShopFacts = { readonly shopId: string };
type MemberFacts = ShopFacts & {
  readonly role: "owner" | "maker" | "rep";
  /** How many owners the shop has now. */
  readonly owners: number;
};

const isOwner = (actor: Actor, { shopId }: ShopFacts): boolean => isStaff(actor, "owner") && actor.shopId === shopId;
/** A shop is never left without an owner. */
const isLastOwner = ({ role, owners }: MemberFacts): boolean => role === "owner" && owners <= 1;

export const teamPolicy = {
  see: isOwner,
  invite: isOwner,
  changeRole: (actor: Actor, member: MemberFacts): boolean => isOwner(actor, member) && !isLastOwner(member),
  remove: (actor: Actor, member: MemberFacts): boolean => isOwner(actor, member) && !isLastOwner(member),
};
