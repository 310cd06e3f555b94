import type { JobState } from "#shared/lifecycle/job-states.ts";
import { canDecide, canWithdraw, type RevisionState, visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { type Actor, contactAt, isStaff } from "./actor.ts";

export type RevisionFacts = {
  readonly shopId: string;
  readonly clientId: string;
  readonly state: RevisionState;
  readonly approverIds: readonly string[];
};

const ofShop = (actor: Actor, revision: RevisionFacts): boolean => isStaff(actor) && actor.shopId === revision.shopId;
const ofClient = (actor: Actor, revision: RevisionFacts): boolean =>
  actor.kind === "contact" && actor.shopId === revision.shopId && contactAt(actor, revision.clientId) !== null;

/** A contact of the client whom the brief names as approver. Nobody approves on a client's behalf. */
export const isApprover = (actor: Actor, revision: RevisionFacts): boolean => {
  const contact = ofClient(actor, revision) ? contactAt(actor, revision.clientId) : null;
  return contact !== null && revision.approverIds.includes(contact.contactId);
};

/** While a job is stopped, or once it is over, nobody decides on its revisions. */
export const takesDecisions = (job: JobState): boolean =>
  job !== "on hold" && job !== "cancelled" && job !== "handed over" && job !== "closed";

const mayIssue = (actor: Actor, job: { readonly shopId: string }): boolean =>
  isStaff(actor, "owner", "maker") && actor.shopId === job.shopId;

export const revisionPolicy = {
  see: (actor: Actor, revision: RevisionFacts): boolean =>
    ofShop(actor, revision) || (ofClient(actor, revision) && visibleToClient(revision.state)),
  /** What a shop builds from never goes to a client. */
  build: ofShop,
  issue: mayIssue,
  withdraw: mayIssue,
  mayWithdrawNow: (actor: Actor, revision: RevisionFacts): boolean =>
    mayIssue(actor, revision) && canWithdraw(revision.state),
  decide: isApprover,
  mayDecideNow: (actor: Actor, revision: RevisionFacts): boolean =>
    isApprover(actor, revision) && canDecide(revision.state),
};
