import { col, fn, Op, where } from "sequelize";
import { mostDraftBytes, mostDrafts } from "#shared/contracts/named-drafts.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { newId } from "../db/new-id.ts";
import { AppError, notAllowed, notFound, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { NamedDraft } from "../models/named-draft.ts";
import { isStaff } from "../policies/actor.ts";
import { namedDraftPolicy } from "../policies/named-draft.ts";
import { findJob } from "../queries/find-job.ts";
import { findNamedDraft } from "../queries/find-named-draft.ts";
import { measureDrafts } from "../queries/list-named-drafts.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";
import { refuseForeignPhoto } from "./refuse-foreign-photo.ts";
import { refuseForeignArtwork } from "./save-mockup.ts";

/** Keeps a state of the mockup under a name. Refused in words when the job has its fill of drafts. */
export async function keepDraft(
  context: Context,
  { jobId, name, document }: { jobId: string; name: string; document: MockupDocument },
): Promise<NamedDraft> {
  const { actor, transaction, now } = context;
  const { job } = await jobToChange(context, jobId);
  if (!isStaff(actor)) throw notFound("draft");
  const { shopId, clientId } = job;
  await refuseForeignArtwork(context, { shopId, clientId, document });
  await refuseForeignPhoto(context, { shopId, clientId, document });
  const text = JSON.stringify(document);
  const kept = await measureDrafts(context, { shopId, jobId });
  if (kept.count >= mostDrafts)
    throw wrongState(`A job keeps ${mostDrafts} drafts, and this one has them. Remove one that nobody returns to.`);
  if (kept.bytes + Buffer.byteLength(text) > mostDraftBytes)
    throw wrongState("The drafts of this job fill the room they have. Remove one that nobody returns to.");
  await refuseUsedName(context, { jobId, name });
  const draft = await NamedDraft.create(
    { id: newId(), shopId, jobId, name, document: text, keptBy: actor.personId, keptAt: now },
    { transaction },
  );
  await logEvent(context, { shopId, jobId, kind: "draft kept", data: { name } });
  return findNamedDraft(context, { jobId, draftId: draft.id });
}

/** The job, locked, for someone who may change its drafts. */
export async function jobToChange(context: Context, jobId: string): Promise<LoadedJob> {
  const loaded = await findJob(context, jobId, { lock: true });
  if (!namedDraftPolicy.see(context.actor, loaded.facts)) throw notFound("draft");
  if (!namedDraftPolicy.change(context.actor, loaded.facts))
    throw notAllowed("Drafts of the mockup are kept by owners and makers.");
  return loaded;
}

/** Two drafts of one name could not be told apart. The caller holds the job. */
export async function refuseUsedName(
  { shop, transaction }: Context,
  { jobId, name, exceptId = null }: { jobId: string; name: string; exceptId?: string | null },
): Promise<void> {
  // Compared by the database, whose index of names has the last word on capitals.
  const used = await NamedDraft.findOne({
    where: {
      [Op.and]: [
        { shopId: shop?.id ?? "", jobId, removedAt: null, ...(exceptId === null ? {} : { id: { [Op.ne]: exceptId } }) },
        where(fn("lower", col("name")), fn("lower", name)),
      ],
    },
    attributes: ["id"],
    transaction,
  });
  if (used) throw new AppError("already_exists", { detail: "A draft of this job has that name. Choose another one." });
}
