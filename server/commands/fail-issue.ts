import type { Context } from "../http/context.ts";
import { Job } from "../models/job.ts";
import { Revision } from "../models/revision.ts";
import { logSystemEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/** The PDF could not be drawn: the revision is a draft again, with the reason, and what was out stays out. */
export async function failIssue(
  context: Pick<Context, "services" | "transaction" | "now">,
  { revisionId, reason }: { revisionId: string; reason: string },
): Promise<void> {
  const { transaction } = context;
  const known = await Revision.findByPk(revisionId, { attributes: ["id", "jobId"], transaction, rejectOnEmpty: true });
  const job = await Job.findByPk(known.jobId, { transaction, lock: true, rejectOnEmpty: true });
  const revision = await Revision.findOne({ where: { id: revisionId, state: "preparing" }, transaction });
  if (!revision) return;
  await revision.update({ state: "draft", failure: reason }, { transaction });
  await logSystemEvent(context, {
    shopId: job.shopId,
    jobId: job.id,
    kind: "revision failed",
    data: { letter: revision.letter, reason },
  });
  await signalJob(context, job, { kind: "revision", id: revisionId, shopOnly: true });
  await refreshJob(context, job);
}
