import { queryOptions } from "@tanstack/react-query";
import { getJob } from "#shared/contracts/jobs.ts";
import { getMockup } from "#shared/contracts/mockups.ts";
import { getRevisionDocument } from "#shared/contracts/revision-documents.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

/** What is planned from: the revision that the client approved, or a draft that nobody agreed to. */
export type PlannedFrom =
  | { readonly kind: "approved"; readonly letter: string; readonly document: MockupDocument }
  | { readonly kind: "draft"; readonly version: number; readonly document: MockupDocument };

export const cutPlanQueries = {
  job: (shop: string, jobId: string) =>
    queryOptions({
      queryKey: keys.job(shop, jobId),
      queryFn: ({ signal }) => call(getJob, { params: { shop, jobId }, signal }),
    }),
  /** Read once when the page is opened, so that a plan does not change under the eyes of who reads it. */
  plannedFrom: (shop: string, { id: jobId, approved }: { id: string; approved: { revisionId: string } | null }) =>
    queryOptions({
      queryKey: ["cut plan", shop, jobId, approved?.revisionId ?? "draft"],
      queryFn: async ({ signal }): Promise<PlannedFrom> => {
        if (approved) {
          const { letter, document } = await call(getRevisionDocument, {
            params: { shop, revisionId: approved.revisionId },
            signal,
          });
          return { kind: "approved", letter, document };
        }
        const { version, document } = await call(getMockup, { params: { shop, jobId }, signal });
        return { kind: "draft", version, document };
      },
      staleTime: Number.POSITIVE_INFINITY,
      gcTime: 0,
      refetchOnWindowFocus: false,
      refetchOnReconnect: false,
    }),
};
