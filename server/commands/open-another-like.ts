import { briefLike } from "#shared/contracts/brief-like.ts";
import { anotherLike } from "#shared/mockup/another-like.ts";
import { artworkUsed } from "#shared/mockup/artwork-used.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import { newId } from "../db/new-id.ts";
import { invalid, notAllowed } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import type { Job } from "../models/job.ts";
import { MockupStart } from "../models/mockup-start.ts";
import { isStaff } from "../policies/actor.ts";
import { jobPolicy } from "../policies/job.ts";
import { findJob } from "../queries/find-job.ts";
import { findMockup } from "../queries/find-mockup.ts";
import { findMockupStart } from "../queries/find-mockup-start.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";
import { openJob } from "./open-job.ts";

type Wanted = {
  readonly jobId: string;
  readonly clientId: string;
  readonly title: string;
  readonly dueOn: string | null;
  readonly words: string;
  readonly artwork: boolean;
};

/**
 * Opens a job with format, stack and hardware of an earlier one. What its mockup begins with is laid out here and kept apart
 * from the mockup itself, which stays for owners and makers to draw: so a rep, too, may open the job.
 */
export async function openAnotherLike(
  context: Context,
  { jobId, clientId, title, dueOn, words, artwork }: Wanted,
): Promise<LoadedJob> {
  const { actor, transaction, now } = context;
  const { job, client } = await findJob(context, jobId);
  if (!isStaff(actor) || !jobPolicy.open(actor)) throw notAllowed("Jobs are opened by the shop.");
  const sameClient = clientId === job.clientId;
  if (artwork && !sameClient)
    throw invalid([{ pointer: "/artwork", detail: "Artwork stays with the client who gave it." }]);
  const document = await lastDocument(context, job);
  const lettering = document?.lettering.map((set) => set.words) ?? [];
  const oldWords = [job.title, client.name, job.brief.words, ...lettering];
  const brief = briefLike(job.brief, { sameClient, words: oldWords, newWords: words });
  const opened = await openJob(context, { clientId, title, dueOn, brief, personId: actor.personId });
  const { shopId } = job;
  if (document) {
    const moved = artwork ? await copyArtwork(context, { from: job, to: opened.job, document }) : null;
    const start = anotherLike(document, { sameClient, artwork: moved, words: oldWords, newId });
    await MockupStart.create(
      {
        jobId: opened.job.id,
        shopId,
        likeJobId: job.id,
        document: JSON.stringify(start),
        madeBy: actor.personId,
        madeAt: now,
      },
      { transaction },
    );
  }
  await logEvent(context, {
    shopId,
    jobId: opened.job.id,
    kind: "job opened like another",
    data: { like: job.number, artwork },
  });
  return opened;
}

/** The mockup as it was saved last, or as it was laid out for a job that was itself opened like another. */
async function lastDocument(context: Context, { id: jobId, shopId }: Job): Promise<MockupDocument | null> {
  const mockup = await findMockup(context, { shopId, jobId });
  if (!mockup) return findMockupStart(context, { shopId, jobId });
  const read = readDocument(JSON.parse(mockup.document));
  if (!read.ok) throw new Error(`The saved mockup of job ${jobId} can't be read: ${read.reason}`);
  return read.document;
}

/** Of a copy nothing is under way, whatever is of its original. */
const noTrace = { traceAsked: null, traceFailure: null };

/** Puts the artwork of one job, and what else its pieces go back to, on another one of the same client; new ids by old ones. */
async function copyArtwork(
  { actor, transaction, now }: Context,
  { from, to, document }: { from: Job; to: Job; document: MockupDocument },
): Promise<ReadonlyMap<string, string>> {
  if (!isStaff(actor)) throw notAllowed("Jobs are opened by the shop.");
  const used = new Set(artworkUsed(document));
  const ready = await Artwork.findAll({
    where: { shopId: from.shopId, state: "ready" },
    include: [{ association: "job", where: { clientId: from.clientId }, required: true, attributes: [] }],
    attributes: { exclude: ["pieces"] },
    order: ["addedAt", "id"],
    transaction,
  });
  const wanted = ready.filter(({ id, jobId, removedAt }) => used.has(id) || (jobId === from.id && removedAt === null));
  const ids = new Map<string, string>();
  for (const { id } of wanted) {
    const row = await Artwork.findByPk(id, { transaction, rejectOnEmpty: true });
    const copy = newId();
    ids.set(id, copy);
    await Artwork.create(
      { ...row.get(), ...noTrace, id: copy, jobId: to.id, addedBy: actor.personId, addedAt: now, removedAt: null },
      { transaction },
    );
  }
  return ids;
}
