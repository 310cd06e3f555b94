import { failIssue } from "../commands/fail-issue.ts";
import { finishIssue } from "../commands/finish-issue.ts";
import type { Services } from "../http/context.ts";
import { Revision } from "../models/revision.ts";
import { renderProof } from "../pdf/proof.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";

/**
 * Draws the PDF of a revision that is being prepared. Drawing is the same each time, so a drawing that fails is not tried again: the revision
 * returns to draft and says so. A database or disk that fails is tried again.
 */
export async function renderProofOfRevision(services: Services, { revisionId }: { revisionId: string }): Promise<void> {
  const revision = await Revision.findOne({ where: { id: revisionId, state: "preparing" } });
  if (!revision) return;
  const outcome = await drawn(revision);
  if (!outcome.ok) services.log.error({ err: outcome.error, revisionId }, "The PDF of a revision could not be drawn");
  await services.sequelize.transaction(async (transaction) => {
    const context = { services, transaction, now: new Date() };
    if (outcome.ok) await finishIssue(context, { revisionId, pdf: outcome.pdf });
    else
      await failIssue(context, {
        revisionId,
        reason: "The drawing could not be made into a PDF. Nothing went out; issue it again or ask for help.",
      });
  });
}

type Drawn = { readonly ok: true; readonly pdf: Uint8Array } | { readonly ok: false; readonly error: unknown };

async function drawn(revision: Revision): Promise<Drawn> {
  try {
    return { ok: true, pdf: await renderProof(snapshotOf(revision), revision.snapshotSha256 ?? "") };
  } catch (error) {
    return { ok: false, error };
  }
}
