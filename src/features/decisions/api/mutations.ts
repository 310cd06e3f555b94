import { useMutation, useQueryClient } from "@tanstack/react-query";
import { approveRevision, askForRevision, type Revision } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";
import type { Approval } from "../model/approval.ts";

function useDecisionLanding(shop: string) {
  const client = useQueryClient();
  return (revision: Revision) => {
    client.setQueryData(revisionKeys.revision(shop, revision.id), revision);
    // A decision settles notes, and moves the job wherever it is listed.
    return Promise.all([
      client.invalidateQueries({ queryKey: revisionKeys.notes(shop, revision.id) }),
      client.invalidateQueries({ queryKey: ["shop", shop, "job"] }),
      client.invalidateQueries({ queryKey: ["shop", shop, "jobs"] }),
    ]);
  };
}

export function useApprove(shop: string, revision: Pick<Revision, "id">) {
  const onSuccess = useDecisionLanding(shop);
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
    onSuccess,
  });
}

export function useAskForRevision(shop: string, revision: Pick<Revision, "id">) {
  const onSuccess = useDecisionLanding(shop);
  return useMutation({
    mutationFn: (summary: string) =>
      call(askForRevision, { params: { shop, revisionId: revision.id }, body: { summary } }),
    onSuccess,
  });
}
