import { useMutation, useQueryClient } from "@tanstack/react-query";
import { approveRevision, askForRevision, type Revision } from "#shared/contracts/revisions.ts";
import { ApiProblem, call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";
import type { Approval } from "../model/approval.ts";

function useDecisionLanding(shop: string, { id }: Pick<Revision, "id">) {
  const client = useQueryClient();
  const read = (queryKey: readonly unknown[]) => client.invalidateQueries({ queryKey });
  return {
    onSuccess: (revision: Revision) => {
      client.setQueryData(revisionKeys.revision(shop, id), revision);
      // A decision settles notes, and moves the job wherever it is listed.
      return Promise.all([
        read(revisionKeys.notes(shop, id)),
        read(keys.job(shop, revision.jobId)),
        read(keys.jobs(shop)),
      ]);
    },
    // What stood in the way happened meanwhile: another letter, another note. The page must show it.
    onError: (error: Error) =>
      error instanceof ApiProblem && error.code === "wrong_state"
        ? Promise.all([read(revisionKeys.notes(shop, id)), read(revisionKeys.revision(shop, id))])
        : undefined,
  };
}

export function useApprove(shop: string, revision: Pick<Revision, "id">) {
  const landing = useDecisionLanding(shop, revision);
  return useMutation({
    mutationFn: ({
      acknowledgedIds,
      answers,
      typedName,
      consentToPortfolio,
      pdfSha256,
    }: Approval & { pdfSha256: string }) =>
      call(approveRevision, {
        params: { shop, revisionId: revision.id },
        body: {
          typedName,
          acknowledgedIds: [...acknowledgedIds],
          pdfSha256,
          settledNoteIds: Object.keys(answers).filter((id) => answers[id] === "settled"),
          consentToPortfolio,
        },
      }),
    ...landing,
  });
}

export function useAskForRevision(shop: string, revision: Pick<Revision, "id">) {
  const landing = useDecisionLanding(shop, revision);
  return useMutation({
    mutationFn: (summary: string) =>
      call(askForRevision, { params: { shop, revisionId: revision.id }, body: { summary } }),
    ...landing,
  });
}
