import { canSetJobState, type StaffState } from "#shared/lifecycle/job-states.ts";
import { notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { jobPolicy } from "../policies/job.ts";
import { findJob } from "../queries/find-job.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/**
 * Moves a job on after approval, holds it, takes it up again or cancels it. Taken up again, it is where it was held.
 * While a revision is being drawn a job is neither held nor cancelled: the mail that it is out would follow.
 */
export async function moveJob(
  context: Context,
  jobId: string,
  { to, reason }: { to: StaffState | "taken up again"; reason: string },
): Promise<LoadedJob> {
  const { job, facts, revisions } = await findJob(context, jobId, { lock: true });
  if (!jobPolicy.move(context.actor, facts)) throw notAllowed("Owners and makers move a job on.");
  const from = job.state;
  if (!canSetJobState(from, to)) throw wrongState(`A job that is “${from}” can't become “${to}”.`);
  const preparing = revisions.find((revision) => revision.state === "preparing");
  if (preparing && (to === "on hold" || to === "cancelled"))
    throw wrongState(`${preparing.letter} is being drawn. Wait until it is out.`);
  const state = to === "taken up again" ? (job.heldFrom ?? "mockup") : to;
  await job.update({ state, heldFrom: to === "on hold" ? holdable(from) : null }, { transaction: context.transaction });
  await logEvent(context, { shopId: job.shopId, jobId, kind: "job moved", data: { from, to, reason } });
  await signalJob(context, job, { kind: "job", id: jobId });
  return refreshJob(context, job);
}

function holdable(
  state: string,
): "brief" | "mockup" | "out for proof" | "revision asked" | "approved" | "in build" | "handed over" {
  switch (state) {
    case "brief":
    case "mockup":
    case "out for proof":
    case "revision asked":
    case "approved":
    case "in build":
    case "handed over":
      return state;
    default:
      throw new Error(`A job that is ${state} can't be held.`);
  }
}
