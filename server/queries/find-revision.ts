import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Revision } from "../models/revision.ts";
import { type RevisionFacts, revisionPolicy } from "../policies/revision.ts";
import { findJob } from "./find-job.ts";
import { type LoadedJob, revisionColumns } from "./load-jobs.ts";

export type LoadedRevision = { readonly revision: Revision; readonly loaded: LoadedJob; readonly facts: RevisionFacts };

/** What policies ask about a revision of a loaded job. */
export function revisionFacts(loaded: LoadedJob, revision: Pick<Revision, "state">): RevisionFacts {
  return {
    shopId: loaded.job.shopId,
    clientId: loaded.job.clientId,
    state: revision.state,
    approverIds: loaded.approvers.map(({ contactId }) => contactId),
  };
}

/**
 * The revision of this shop that the actor may see, else "not found". With `lock` the job's row is locked first and the
 * revision read after it.
 */
export async function findRevision(
  context: ReadContext,
  revisionId: string,
  { lock = false, withSnapshot = false }: { lock?: boolean; withSnapshot?: boolean } = {},
): Promise<LoadedRevision> {
  const { shop, transaction, actor } = context;
  const where = { id: revisionId, shopId: shop?.id ?? "" };
  const known = shop ? await Revision.findOne({ where, attributes: ["id", "jobId"], transaction }) : null;
  if (!known) throw notFound("revision");
  const loaded = await findJob(context, known.jobId, { lock });
  const revision = await Revision.findOne({
    where,
    ...(withSnapshot ? {} : { attributes: revisionColumns }),
    transaction,
    rejectOnEmpty: true,
  });
  const facts = revisionFacts(loaded, revision);
  if (!revisionPolicy.see(actor, facts)) throw notFound("revision");
  return { revision, loaded, facts };
}
