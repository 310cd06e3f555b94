import { failIssue } from "../commands/fail-issue.ts";
import { finishIssue } from "../commands/finish-issue.ts";
import { drawProof } from "../drawing/draw.ts";
import type { Services } from "../http/context.ts";
import { Revision } from "../models/revision.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";
import type { Attempt } from "./tasks.ts";

/**
 * Draws the PDF of a revision that is being prepared. Drawing is the same each time, so a drawing that fails is not tried again: the revision
 * returns to draft and says so. A database or disk that fails is tried again; after the last try the revision returns to draft too,
 * since it would be "preparing" for ever.
 */
export async function renderProofOfRevision(
  services: Services,
  { revisionId }: { revisionId: string },
  { isLast }: Attempt,
): Promise<void> {
  const revision = await Revision.findOne({ where: { id: revisionId, state: "preparing" } });
  if (!revision) return;
  const outcome = await drawn(revision);
  if (!outcome.ok) services.log.error({ err: outcome.error, revisionId }, "The PDF of a revision could not be drawn");
  if (!outcome.ok) return fail(services, revisionId, reasons.notDrawn);
  try {
    await services.sequelize.transaction((transaction) =>
      finishIssue({ services, transaction, now: new Date() }, { revisionId, pdf: outcome.pdf }),
    );
  } catch (error) {
    if (!isLast) throw error;
    services.log.error({ err: error, revisionId }, "The PDF of a revision could not be kept");
    await fail(services, revisionId, reasons.notKept);
  }
}

const reasons = {
  notDrawn: "The drawing could not be made into a PDF. Nothing went out; issue it again or ask for help.",
  notKept: "The PDF could not be kept on the server's disk. Nothing went out; issue it again or ask for help.",
} as const;

function fail(services: Services, revisionId: string, reason: string): Promise<void> {
  return services.sequelize.transaction((transaction) =>
    failIssue({ services, transaction, now: new Date() }, { revisionId, reason }),
  );
}

type Drawn = { readonly ok: true; readonly pdf: Uint8Array } | { readonly ok: false; readonly error: unknown };

async function drawn(revision: Revision): Promise<Drawn> {
  try {
    return { ok: true, pdf: await drawProof(snapshotOf(revision), revision.snapshotSha256 ?? "") };
  } catch (error) {
    return { ok: false, error };
  }
}
