import { type Actor, isStaff } from "./actor.ts";
import type { JobFacts } from "./job.ts";

const ofShop = (actor: Actor, job: JobFacts): boolean => isStaff(actor) && actor.shopId === job.shopId;

export const artworkPolicy = {
  see: ofShop,
  change: (actor: Actor, job: JobFacts): boolean => ofShop(actor, job) && isStaff(actor, "owner", "maker"),
};
