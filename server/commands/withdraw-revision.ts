import { canWithdraw } from "#shared/lifecycle/revision-states.ts";
import { notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { revisionPolicy } from "../policies/revision.ts";
import { findRevision } from "../queries/find-revision.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/** Takes an issued revision back before it is decided on. What it superseded stays superseded. */
export async function withdrawRevision(
  context: Context,
  { revisionId, reason }: { revisionId: string; reason: string },
): Promise<void> {
  const { revision, loaded, facts } = await findRevision(context, revisionId, { lock: true });
  if (!revisionPolicy.withdraw(context.actor, facts)) throw notAllowed("Owners and makers withdraw a revision.");
  if (!canWithdraw(revision.state))
    throw wrongState(`Revision ${revision.letter} is ${revision.state} and can't be withdrawn.`);
  await revision.update({ state: "withdrawn", withdrawnReason: reason }, { transaction: context.transaction });
  await logEvent(context, {
    shopId: revision.shopId,
    jobId: revision.jobId,
    kind: "revision withdrawn",
    data: { letter: revision.letter, reason },
  });
  await signalJob(context, loaded.job, { kind: "revision", id: revisionId });
  await refreshJob(context, loaded.job);
}
