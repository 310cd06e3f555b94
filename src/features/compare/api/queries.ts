import { queryOptions } from "@tanstack/react-query";
import { compareRevisions, listRevisions, type Revision } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";

/** A job has as many revisions as it has letters, so all of them are read, page after page. */
async function readRevisions(shop: string, jobId: string, signal: AbortSignal): Promise<Revision[]> {
  const all: Revision[] = [];
  let cursor: string | undefined;
  do {
    const page = await call(listRevisions, { params: { shop, jobId }, query: { limit: 100, cursor }, signal });
    all.push(...page.items);
    cursor = page.next ?? undefined;
  } while (cursor !== undefined);
  return all;
}

export const compareQueries = {
  revisions: (shop: string, jobId: string) =>
    queryOptions({
      queryKey: revisionKeys.ofJob(shop, jobId),
      queryFn: ({ signal }) => readRevisions(shop, jobId, signal),
    }),
  /** Issued drawings never change, so what was compared stays as it is. */
  pair: (shop: string, jobId: string, before: string, after: string) =>
    queryOptions({
      queryKey: revisionKeys.compare(shop, jobId, before, after),
      queryFn: ({ signal }) => call(compareRevisions, { params: { shop, jobId }, query: { before, after }, signal }),
      staleTime: 300_000,
    }),
};
