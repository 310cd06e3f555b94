import { type Actor, contactAt, isStaff } from "./actor.ts";

/** What policies need to know of a job. */
export type JobFacts = {
  readonly shopId: string;
  readonly clientId: string;
  /** Whether a revision that its client may see exists. */
  readonly shown: boolean;
};

const ofShop = (actor: Actor, job: JobFacts): boolean => isStaff(actor) && actor.shopId === job.shopId;
const ofClient = (actor: Actor, job: JobFacts): boolean =>
  actor.kind === "contact" && actor.shopId === job.shopId && contactAt(actor, job.clientId) !== null;

export const jobPolicy = {
  list: (actor: Actor): boolean => actor.kind === "staff" || actor.kind === "contact",
  see: (actor: Actor, job: JobFacts): boolean => ofShop(actor, job) || (ofClient(actor, job) && job.shown),
  open: (actor: Actor): boolean => isStaff(actor),
  editBrief: ofShop,
  /** Building, handing over, holding and cancelling belong to those who build. */
  move: (actor: Actor, job: JobFacts): boolean => ofShop(actor, job) && isStaff(actor, "owner", "maker"),
  seeLog: ofShop,
  giveConsent: (actor: Actor, job: JobFacts): boolean => ofClient(actor, job) && job.shown,
};
