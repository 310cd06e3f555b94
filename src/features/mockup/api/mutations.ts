import { useMutation, useQueryClient } from "@tanstack/react-query";
import { issueRevision } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";

/** Issues the saved draft of one version as the next revision. */
export function useIssueRevision(shop: string, jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { mockupVersion: number; message: string }) =>
      call(issueRevision, { params: { shop, jobId }, body }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
        client.invalidateQueries({ queryKey: keys.jobs(shop) }),
        client.invalidateQueries({ queryKey: revisionKeys.ofJob(shop, jobId) }),
      ]),
  });
}
