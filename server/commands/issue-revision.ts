import { dryingHoursOfSign } from "#shared/bonds/drying-hours-of-sign.ts";
import { canIssue } from "#shared/lifecycle/job-states.ts";
import { letterToIssue } from "#shared/lifecycle/revision-row.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { newId } from "../db/new-id.ts";
import { freezeDrawing } from "../drawing/draw.ts";
import type { FreezeInput, Frozen } from "../drawing/drawing-worker.ts";
import { AppError, notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { enqueue } from "../jobs/queue.ts";
import { Revision } from "../models/revision.ts";
import { Shop } from "../models/shop.ts";
import { fontHashes } from "../pdf/font-hashes.ts";
import { isStaff, type Staff } from "../policies/actor.ts";
import { revisionPolicy } from "../policies/revision.ts";
import { artworkHashes } from "../queries/artwork-hashes.ts";
import { dryFitInput } from "../queries/dry-fit-input.ts";
import { findJob } from "../queries/find-job.ts";
import { notesToFreeze } from "../queries/list-notes.ts";
import { setAsidesToFreeze } from "../queries/list-set-asides.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { photoHashes } from "../queries/photo-hashes.ts";
import { draftToJudge } from "./draft-to-judge.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/**
 * Freezes the saved draft of that very version as the next letter and sets the queue to draw its PDF.
 * Refuses when the draft has moved on, when the dry fit has stops that nobody set aside, and while another revision is being prepared.
 */
export async function issueRevision(
  context: Context,
  { jobId, mockupVersion, message }: { jobId: string; mockupVersion: number; message: string },
): Promise<{ loaded: LoadedJob; revision: Revision }> {
  const { actor, transaction, now } = context;
  const loaded = await findJob(context, jobId, { lock: true });
  const { job, facts, revisions } = loaded;
  if (!isStaff(actor) || !revisionPolicy.issue(actor, facts))
    throw notAllowed("Revisions are issued by owners and makers.");
  if (!canIssue(job.state, revisions)) {
    const preparing = revisions.find(({ state }) => state === "preparing");
    throw wrongState(
      preparing
        ? `${preparing.letter} is still being drawn. Wait for it.`
        : `A job that is “${job.state}” takes no new revision.`,
    );
  }
  const document = await draftToJudge(context, {
    loaded,
    mockupVersion,
    whenStale: "The mockup was saved again since. Look at it once more before you issue it.",
  });
  const letter = letterToIssue(revisions);
  const { text, sha256 } = await freeze(context, { loaded, actor, document, letter });
  const frozen = {
    state: "preparing",
    message,
    snapshot: text,
    snapshotSha256: sha256,
    dryingHours: Math.ceil(dryingHoursOfSign(document)),
    issuedBy: actor.personId,
    requestedAt: now,
    failure: null,
  } as const;
  const draft = await Revision.findOne({ where: { jobId, shopId: job.shopId, state: "draft" }, transaction });
  const revision = draft
    ? await draft.update(frozen, { transaction })
    : await Revision.create(
        { id: newId(), shopId: job.shopId, jobId, letter, sequence: revisions.length + 1, ...frozen },
        { transaction },
      );
  await enqueue(transaction, "render-proof", { revisionId: revision.id });
  await logEvent(context, { shopId: job.shopId, jobId, kind: "revision preparing", data: { letter } });
  await signalJob(context, job, { kind: "revision", id: revision.id, shopOnly: true });
  return { loaded: await refreshJob(context, job), revision };
}

async function freeze(
  context: Context,
  { loaded, actor, document, letter }: { loaded: LoadedJob; actor: Staff; document: MockupDocument; letter: string },
): Promise<Frozen> {
  const { job, client } = loaded;
  const shop = await Shop.findByPk(job.shopId, { transaction: context.transaction, rejectOnEmpty: true });
  if (document.layers.every(({ pieces }) => pieces.length === 0))
    throw wrongState("The mockup has no pieces yet. Bring in artwork first.");
  const { limits, context: dryFit } = await dryFitInput(context, { shop, job, document });
  const input: FreezeInput = {
    titleBlock: {
      owner: shop.name,
      client: client.name,
      title: job.title,
      number: job.number,
      revision: letter,
      date: context.now.toISOString().slice(0, 10),
      createdBy: actor.name,
      documentType: "Proof drawing",
      unit: shop.unit,
    },
    document,
    notes: await notesToFreeze(context, job.id),
    words: job.brief.words,
    limits,
    dryFit,
    setAsides: await setAsidesToFreeze(context, job.id),
    paper: shop.paper,
    artworkHashes: await artworkHashes(context, { shopId: job.shopId, document }),
    photoHashes: await photoHashes(context, { shopId: job.shopId, document }),
    fontHashes: { ...fontHashes(), ...letteringHashes(document) },
  };
  const frozen = await freezeDrawing(input, { shopId: shop.id });
  const { stops } = frozen;
  if (stops.length > 0) {
    throw new AppError("dry_fit_stops", {
      detail: `${stops.length === 1 ? "One stop keeps" : `${stops.length} stops keep`} this from being issued: ${stops[0]?.text ?? ""}`,
      extra: { findings: stops },
    });
  }
  return frozen;
}

/** The hash of the face of each lettering, as it was when its outlines were taken. */
const letteringHashes = ({ lettering }: MockupDocument): Record<string, string> =>
  Object.fromEntries(lettering.map(({ face, fontSha256 }) => [face, fontSha256]));
