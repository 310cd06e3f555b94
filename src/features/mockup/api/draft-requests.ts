import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { getDraft, keepDraft, listDrafts, removeDraft, renameDraft } from "#shared/contracts/named-drafts.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";

type OfJob = { readonly shop: string; readonly jobId: string };

const draftsKey = ({ shop, jobId }: OfJob) => ["drafts", shop, jobId] as const;

export const draftQueries = {
  list: (of: OfJob) =>
    pagesQuery([...draftsKey(of), "list"], (cursor, signal) =>
      call(listDrafts, { params: of, query: { limit: 20, cursor }, signal }),
    ),
  /** What a draft holds never changes. */
  one: (of: OfJob, draftId: string) =>
    queryOptions({
      queryKey: [...draftsKey(of), "one", draftId],
      queryFn: ({ signal }) => call(getDraft, { params: { ...of, draftId }, signal }),
      staleTime: Number.POSITIVE_INFINITY,
      gcTime: 60_000,
    }),
};

function useRefreshDrafts(of: OfJob) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: [...draftsKey(of), "list"] });
}

export function useKeepDraft(of: OfJob) {
  const refresh = useRefreshDrafts(of);
  return useMutation({
    mutationFn: (body: { name: string; document: MockupDocument }) => call(keepDraft, { params: of, body }),
    onSuccess: refresh,
  });
}

export function useRenameDraft(of: OfJob, draftId: string) {
  const refresh = useRefreshDrafts(of);
  return useMutation({
    mutationFn: (name: string) => call(renameDraft, { params: { ...of, draftId }, body: { name } }),
    onSuccess: refresh,
  });
}

/** Gone already is gone: the list is read anew either way. */
export function useRemoveDraft(of: OfJob, draftId: string) {
  const refresh = useRefreshDrafts(of);
  return useMutation({
    mutationFn: () => call(removeDraft, { params: { ...of, draftId } }),
    onSettled: refresh,
  });
}
