import { type Actor, isStaff } from "./actor.ts";

export const stockPolicy = {
  see: (actor: Actor): boolean => isStaff(actor),
};
