import { type Actor, isStaff } from "./actor.ts";

export const portfolioPolicy = {
  see: (actor: Actor): boolean => isStaff(actor),
  share: (actor: Actor): boolean => isStaff(actor, "owner", "rep"),
};
