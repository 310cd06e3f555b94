import { notAllowed, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { SetAside } from "../models/set-aside.ts";
import { setAsidePolicy } from "../policies/set-aside.ts";
import { findJob } from "../queries/find-job.ts";
import { logEvent } from "./log-event.ts";
import { findingName } from "./set-aside-finding.ts";

/** Takes a set-aside back, so that its finding stands again. Taking it back once more changes nothing. */
export async function takeBackSetAside(
  context: Context,
  { jobId, setAsideId }: { jobId: string; setAsideId: string },
): Promise<void> {
  const { actor, transaction, now } = context;
  const { job, facts } = await findJob(context, jobId, { lock: true });
  if (!setAsidePolicy.see(actor, facts)) throw notFound("set-aside");
  const row = await SetAside.findOne({ where: { id: setAsideId, shopId: job.shopId, jobId }, transaction });
  if (!row) throw notFound("set-aside");
  if (!setAsidePolicy.takeBack(actor, facts)) throw notAllowed("Set-asides are taken back by owners and makers.");
  if (row.takenBackAt !== null) return;
  await row.update({ takenBackBy: actor.personId, takenBackName: actor.name, takenBackAt: now }, { transaction });
  await logEvent(context, {
    shopId: job.shopId,
    jobId,
    kind: "set-aside taken back",
    data: { finding: findingName(row.finding) },
  });
}
