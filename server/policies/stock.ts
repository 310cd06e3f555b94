import { type Actor, isStaff } from "./actor.ts";

/** Stock is kept by those who cut and screw; reps see what there is. */
export const stockPolicy = {
  see: (actor: Actor): boolean => isStaff(actor),
  change: (actor: Actor): boolean => isStaff(actor, "owner", "maker"),
};
