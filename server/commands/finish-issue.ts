import { stateAfterLater } from "#shared/lifecycle/revision-states.ts";
import type { Context } from "../http/context.ts";
import { Job } from "../models/job.ts";
import { Revision } from "../models/revision.ts";
import { loadJobs } from "../queries/load-jobs.ts";
import { logSystemEvent } from "./log-event.ts";
import { mailApprovers } from "./mail-the-other-side.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";
import { storeBytes } from "./store-file.ts";

/**
 * The PDF stands: the revision is out, what was out before is superseded, and only now mail goes to the approvers.
 * Done twice it changes nothing the second time.
 */
export async function finishIssue(
  context: Pick<Context, "services" | "transaction" | "now">,
  { revisionId, pdf }: { revisionId: string; pdf: Uint8Array },
): Promise<void> {
  const { transaction, now } = context;
  const known = await Revision.findByPk(revisionId, { attributes: ["id", "jobId"], transaction, rejectOnEmpty: true });
  const job = await Job.findByPk(known.jobId, { transaction, lock: true, rejectOnEmpty: true });
  const [loaded] = await loadJobs(context, [job]);
  const revision = loaded?.revisions.find(({ id }) => id === revisionId);
  if (!loaded || revision?.state !== "preparing") return;
  const file = await storeBytes(context, { shopId: job.shopId, bytes: pdf, mediaType: "application/pdf" });
  for (const earlier of loaded.revisions) {
    const state = stateAfterLater(earlier.state, "issued");
    if (earlier.id !== revisionId && state !== earlier.state) await earlier.update({ state }, { transaction });
  }
  await revision.update({ state: "issued", pdfFileId: file.id, issuedAt: now }, { transaction });
  await logSystemEvent(context, {
    shopId: job.shopId,
    jobId: job.id,
    kind: "revision issued",
    data: { letter: revision.letter },
  });
  await mailApprovers(context, loaded, { kind: "proof issued", data: { revisionId } });
  await signalJob(context, job, { kind: "revision", id: revisionId });
  await refreshJob(context, job);
}
