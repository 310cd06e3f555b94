import type { Revision as RevisionView } from "#shared/contracts/revisions.ts";
import type { ReadContext } from "../http/context.ts";
import { Certificate } from "../models/certificate.ts";
import { Decision } from "../models/decision.ts";
import { Person } from "../models/person.ts";
import type { Revision } from "../models/revision.ts";
import { StoredFile } from "../models/stored-file.ts";
import { presentRevision } from "../presenters/revision.ts";
import type { LoadedJob } from "./load-jobs.ts";

/** Revisions of a loaded job with file, issuer and decision, in four queries for the lot; same order. */
export async function revisionViews(
  context: ReadContext,
  loaded: LoadedJob,
  revisions: readonly Revision[],
): Promise<RevisionView[]> {
  const { transaction } = context;
  const files = await StoredFile.findAll({
    where: { id: revisions.flatMap(({ pdfFileId }) => pdfFileId ?? []) },
    transaction,
  });
  const people = await Person.findAll({
    where: { id: [...new Set(revisions.map(({ issuedBy }) => issuedBy))] },
    attributes: ["id", "name"],
    transaction,
  });
  const decisions = await Decision.findAll({ where: { revisionId: revisions.map(({ id }) => id) }, transaction });
  const certificates = await Certificate.findAll({ where: { decisionId: decisions.map(({ id }) => id) }, transaction });
  return revisions.map((revision) => {
    const decision = decisions.find(({ revisionId }) => revisionId === revision.id) ?? null;
    return presentRevision(context.actor, loaded, revision, {
      pdf: files.find(({ id }) => id === revision.pdfFileId) ?? null,
      issuer: people.find(({ id }) => id === revision.issuedBy)?.name ?? "",
      decision,
      hasCertificate: certificates.some(({ decisionId }) => decisionId === decision?.id),
    });
  });
}

export async function revisionView(context: ReadContext, loaded: LoadedJob, revision: Revision): Promise<RevisionView> {
  const [view] = await revisionViews(context, loaded, [revision]);
  if (!view) throw new Error("One revision gives one view.");
  return view;
}
