import type { Finding } from "#shared/dry-fit/finding.ts";
import { maySetAside } from "#shared/dry-fit/set-aside.ts";
import { type Actor, isStaff, type Staff } from "./actor.ts";
import type { JobFacts } from "./job.ts";

const ofShop = (actor: Actor, job: JobFacts): actor is Staff => isStaff(actor) && actor.shopId === job.shopId;
const draws = (actor: Actor, job: JobFacts): actor is Staff & { readonly role: "owner" | "maker" } =>
  ofShop(actor, job) && isStaff(actor, "owner", "maker");

/** What is set aside, and why, never leaves the shop. */
export const setAsidePolicy = {
  see: ofShop,
  setAside: draws,
  setAsideThis: (actor: Actor, job: JobFacts, finding: Pick<Finding, "rule" | "severity">): boolean =>
    draws(actor, job) && maySetAside(actor.role, finding),
  takeBack: draws,
};
