import { notAllowed } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { contactAt } from "../policies/actor.ts";
import { jobPolicy } from "../policies/job.ts";
import { findJob } from "../queries/find-job.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";

/** The client lets the shop show the piece, or takes that back; links then stop showing it at once. */
export async function setConsent(context: Context, jobId: string, { given }: { given: boolean }): Promise<LoadedJob> {
  const loaded = await findJob(context, jobId, { lock: true });
  const { job, facts } = loaded;
  const contact = contactAt(context.actor, job.clientId);
  if (!contact || !jobPolicy.giveConsent(context.actor, facts)) throw notAllowed("Only the client gives this consent.");
  if ((job.consentAt !== null) === given) return loaded;
  await job.update(
    { consentAt: given ? context.now : null, consentBy: given ? contact.contactId : null },
    { transaction: context.transaction },
  );
  await logEvent(context, {
    shopId: job.shopId,
    jobId,
    kind: given ? "consent given" : "consent taken back",
    data: {},
  });
  return loaded;
}
