import type { Revision as RevisionView } from "#shared/contracts/revisions.ts";
import { revisionOut } from "#shared/lifecycle/revision-row.ts";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import type { Decision } from "../models/decision.ts";
import type { Revision } from "../models/revision.ts";
import type { StoredFile } from "../models/stored-file.ts";
import { type Actor, isStaff } from "../policies/actor.ts";
import { notePolicy } from "../policies/note.ts";
import { revisionPolicy, takesDecisions } from "../policies/revision.ts";
import { revisionFacts } from "../queries/find-revision.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";

/** What belongs to a revision beside its row. */
export type RevisionParts = {
  readonly pdf: StoredFile | null;
  readonly issuer: string;
  readonly decision: Decision | null;
  readonly hasCertificate: boolean;
};

export function presentRevision(
  actor: Actor,
  loaded: LoadedJob,
  revision: Revision,
  parts: RevisionParts,
): RevisionView {
  const facts = revisionFacts(loaded, revision);
  const out = revisionOut(loaded.revisions);
  const { decision, pdf } = parts;
  return {
    id: revision.id,
    jobId: revision.jobId,
    letter: revision.letter,
    state: revision.state,
    message: revision.message,
    issuedAt: revision.issuedAt?.toISOString() ?? null,
    issuedBy: parts.issuer,
    snapshotSha256: revision.snapshotSha256,
    pdfSha256: pdf?.sha256 ?? null,
    pdfByteSize: pdf?.byteSize ?? null,
    failure: isStaff(actor) ? revision.failure : null,
    decision: decision
      ? {
          kind: decision.kind,
          by: decision.byName,
          typedName: decision.typedName,
          summary: decision.summary,
          at: decision.decidedAt.toISOString(),
          hasCertificate: parts.hasCertificate,
        }
      : null,
    current:
      out && out.id !== revision.id && (isStaff(actor) || visibleToClient(out.state))
        ? { revisionId: out.id, letter: out.letter }
        : null,
    can: {
      note: notePolicy.add(actor, facts),
      decide: takesDecisions(loaded.job.state) && revisionPolicy.mayDecideNow(actor, facts),
      withdraw: revisionPolicy.mayWithdrawNow(actor, facts),
      download: pdf !== null,
    },
  };
}
