import { revisionOut } from "#shared/lifecycle/revision-row.ts";
import { canDecide } from "#shared/lifecycle/revision-states.ts";
import { newId } from "../db/new-id.ts";
import { AppError, notAllowed, notFound, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Decision } from "../models/decision.ts";
import { StoredFile } from "../models/stored-file.ts";
import { type ContactActor, contactAt } from "../policies/actor.ts";
import { revisionPolicy, takesDecisions } from "../policies/revision.ts";
import { findRevision, type LoadedRevision } from "../queries/find-revision.ts";

/** A revision that the actor, one of its approvers, may decide on now; its job's row is locked. */
export type Decidable = LoadedRevision & {
  readonly actor: ContactActor;
  readonly contact: NonNullable<ReturnType<typeof contactAt>>;
  readonly pdfSha256: string;
};

/**
 * Finds what is to be decided and refuses everyone but a named approver, and every state but issued. A revision that was superseded a
 * moment ago is refused with the way to the one that is out now.
 */
export async function findDecidable(context: Context, revisionId: string): Promise<Decidable> {
  const { actor, transaction } = context;
  const found = await findRevision(context, revisionId, { lock: true, withSnapshot: true });
  const { revision, loaded, facts } = found;
  const contact = contactAt(actor, loaded.job.clientId);
  if (actor.kind !== "contact" || !contact || !revisionPolicy.decide(actor, facts)) {
    throw notAllowed("Only the approvers named in the brief decide on a revision.");
  }
  if (!takesDecisions(loaded.job.state)) throw wrongState(`This job is ${loaded.job.state}. Ask the shop.`);
  if (!canDecide(revision.state)) {
    const out = revisionOut(loaded.revisions);
    const current = out && out.id !== revision.id ? { revisionId: out.id, letter: out.letter } : null;
    throw wrongState(
      `Revision ${revision.letter} is ${revision.state} and takes no decision.${current ? ` Revision ${current.letter} is out now.` : ""}`,
      { current },
    );
  }
  const pdf = await StoredFile.findOne({
    where: { id: revision.pdfFileId ?? "", shopId: revision.shopId },
    transaction,
  });
  if (!pdf) throw notFound("revision");
  return { ...found, actor, contact, pdfSha256: pdf.sha256 };
}

/** Writes the decision for good. Two at the same moment: the second finds the state changed, and the database takes one row only. */
export function recordDecision(
  context: Context,
  { revision, actor, contact, pdfSha256 }: Decidable,
  said: Pick<Decision, "kind" | "typedName" | "acknowledgements" | "summary">,
): Promise<Decision> {
  if (!revision.snapshotSha256) throw new AppError("internal");
  return Decision.create(
    {
      id: newId(),
      shopId: revision.shopId,
      jobId: revision.jobId,
      revisionId: revision.id,
      contactId: contact.contactId,
      personId: actor.personId,
      byName: contact.name,
      pdfSha256,
      snapshotSha256: revision.snapshotSha256,
      address: context.address,
      agent: context.agent,
      decidedAt: context.now,
      ...said,
    },
    { transaction: context.transaction },
  );
}
