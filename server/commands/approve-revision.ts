import { asksAtApproval } from "#shared/lifecycle/note-states.ts";
import { acknowledgementsOf } from "#shared/mockup/acknowledgements.ts";
import { invalid, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { enqueue } from "../jobs/queue.ts";
import { Note } from "../models/note.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";
import { type Decidable, findDecidable, recordDecision } from "./decide.ts";
import { logEvent } from "./log-event.ts";
import { mailShop } from "./mail-the-other-side.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

export type Approval = {
  readonly revisionId: string;
  readonly typedName: string;
  readonly acknowledgedIds: readonly string[];
  readonly pdfSha256: string;
  readonly settledNoteIds: readonly string[];
  readonly consentToPortfolio: boolean;
};

/** Approves the very PDF that was shown: everything read back is ticked, every open "must change" note is settled by name. */
export async function approveRevision(context: Context, approval: Approval): Promise<void> {
  const { transaction, now } = context;
  const decidable = await findDecidable(context, approval.revisionId);
  const { revision, loaded, contact } = decidable;
  const { job } = loaded;
  if (approval.pdfSha256 !== decidable.pdfSha256)
    throw wrongState("The PDF you were shown is not the one that was issued. Open the sheet again.");
  const acknowledged = acknowledgedTexts(decidable, approval.acknowledgedIds);
  await settleNotes(context, decidable, approval.settledNoteIds);
  const earlier = loaded.revisions.find(({ state }) => state === "approved");
  await earlier?.update({ state: "superseded" }, { transaction });
  await revision.update({ state: "approved" }, { transaction });
  const decision = await recordDecision(context, decidable, {
    kind: "approved",
    typedName: approval.typedName,
    acknowledgements: JSON.stringify(acknowledged),
    summary: "",
  });
  if (approval.consentToPortfolio && job.consentAt === null) {
    await job.update({ consentAt: now, consentBy: contact.contactId }, { transaction });
    await logEvent(context, { shopId: job.shopId, jobId: job.id, kind: "consent given", data: {} });
  }
  await enqueue(transaction, "make-certificate", { decisionId: decision.id });
  await logEvent(context, {
    shopId: job.shopId,
    jobId: job.id,
    kind: "revision approved",
    data: { letter: revision.letter, typedName: approval.typedName },
  });
  await mailShop(context, loaded, { kind: "approved", data: { revisionId: revision.id } });
  await signalJob(context, job, { kind: "revision", id: revision.id });
  await refreshJob(context, job);
}

function acknowledgedTexts({ revision, loaded }: Decidable, ids: readonly string[]): string[] {
  const { document, figures, words, titleBlock } = snapshotOf(revision);
  const asked = acknowledgementsOf({ document, figures, words, unit: titleBlock.unit });
  const missing = asked.filter(({ id }) => !ids.includes(id));
  if (missing.length > 0) {
    throw invalid(missing.map(({ text }) => ({ pointer: "/acknowledgedIds", detail: `Confirm this first: ${text}` })));
  }
  if (ids.some((id) => !asked.some((one) => one.id === id))) {
    throw invalid([
      { pointer: "/acknowledgedIds", detail: `Revision ${revision.letter} of ${loaded.job.number} does not ask that.` },
    ]);
  }
  return asked.map(({ text }) => text);
}

async function settleNotes(
  context: Context,
  { loaded, revision }: Decidable,
  settledNoteIds: readonly string[],
): Promise<void> {
  const { transaction } = context;
  const open = await Note.findAll({
    where: { shopId: revision.shopId, jobId: loaded.job.id, state: "open" },
    order: ["number"],
    transaction,
  });
  const asking = open.filter(asksAtApproval);
  const left = asking.filter(({ id }) => !settledNoteIds.includes(id));
  if (left.length > 0) {
    throw wrongState(
      `Note ${left.map(({ number }) => number).join(", ")} says “must change” and is open. Settle it, or ask for a revision.`,
      {
        openNoteIds: left.map(({ id }) => id),
      },
    );
  }
  for (const note of asking) {
    await note.update({ state: "settled" }, { transaction });
    await logEvent(context, {
      shopId: note.shopId,
      jobId: note.jobId,
      kind: "note settled",
      data: { number: note.number },
    });
  }
}
