import type { Brief } from "#shared/contracts/jobs.ts";
import { invalid, notAllowed } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Contact } from "../models/contact.ts";
import { JobApprover } from "../models/job-approver.ts";
import { jobPolicy } from "../policies/job.ts";
import { findJob } from "../queries/find-job.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

export type JobChange = {
  readonly title?: string | undefined;
  readonly dueOn?: string | null | undefined;
  readonly brief?: Partial<Brief> | undefined;
  readonly approverIds?: readonly string[] | undefined;
};

/** The fields of the brief as the log names them. */
const briefWords: Readonly<Record<keyof Brief, string>> = {
  widthMm: "width",
  heightMm: "height",
  place: "place",
  wall: "wall",
  viewingDistanceMm: "viewing distance",
  lighting: "lighting",
  quantity: "quantity",
  brandColours: "brand colours",
  about: "what it is about",
  walkway: "whether people pass it",
  overhead: "whether it hangs overhead",
  electrical: "whether it has electrical parts",
  words: "words",
};

/** Changes title, due day, brief and approvers; what is not named stays. The log names what is other than before. */
export async function changeJob(context: Context, jobId: string, change: JobChange): Promise<LoadedJob> {
  const { transaction, actor } = context;
  const { job, facts, approvers } = await findJob(context, jobId, { lock: true });
  if (!jobPolicy.editBrief(actor, facts)) throw notAllowed("The brief is the shop's to change.");
  const given = Object.fromEntries(Object.entries(change.brief ?? {}).filter(([, value]) => value !== undefined));
  const next = {
    title: change.title ?? job.title,
    dueOn: change.dueOn === undefined ? job.dueOn : change.dueOn,
    brief: { ...job.brief, ...given },
  };
  const names = Object.keys(briefWords) as (keyof Brief)[];
  const fields = names.filter((name) => next.brief[name] !== job.brief[name]).map((name) => briefWords[name]);
  if (next.title !== job.title) fields.push("title");
  if (next.dueOn !== job.dueOn) fields.push("due day");
  await job.update(next, { transaction });
  if (change.approverIds) {
    const contactIds = [...new Set(change.approverIds)].sort();
    await setApprovers(context, { shopId: job.shopId, clientId: job.clientId, jobId, contactIds });
    if (approvers.map(({ contactId }) => contactId).join() !== contactIds.join()) fields.push("approvers");
  }
  if (fields.length > 0) await logEvent(context, { shopId: job.shopId, jobId, kind: "job changed", data: { fields } });
  if (fields.length > 0) await signalJob(context, job, { kind: "job", id: jobId });
  return refreshJob(context, job);
}

async function setApprovers(
  { transaction }: Context,
  { shopId, clientId, jobId, contactIds }: { shopId: string; clientId: string; jobId: string; contactIds: string[] },
): Promise<void> {
  const known = await Contact.findAll({ where: { id: contactIds, shopId, clientId, endedAt: null }, transaction });
  if (known.length !== contactIds.length) {
    throw invalid([{ pointer: "/approverIds", detail: "Only contacts of this job's client can approve." }]);
  }
  await JobApprover.destroy({ where: { jobId, shopId }, transaction });
  await JobApprover.bulkCreate(
    contactIds.map((contactId) => ({ jobId, contactId, shopId })),
    { transaction },
  );
}
