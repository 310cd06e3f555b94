import { queryOptions } from "@tanstack/react-query";
import { type JobMail, listJobMails } from "#shared/contracts/outgoing-mail.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

/** Every mail about a job, newest first. */
export const jobMailsQuery = (shop: string, jobId: string) =>
  pagesQuery([...keys.job(shop, jobId), "mails"] as const, (cursor, signal) =>
    call(listJobMails, { params: { shop, jobId }, query: { limit: 8, ...(cursor ? { cursor } : {}) }, signal }),
  );

/** Those that were refused and that nobody has sent again. */
export const refusedMailsQuery = (shop: string, jobId: string) =>
  queryOptions({
    queryKey: [...keys.job(shop, jobId), "refused mails"],
    queryFn: ({ signal }): Promise<{ items: JobMail[] }> =>
      call(listJobMails, { params: { shop, jobId }, query: { only: "refused", limit: 20 }, signal }),
  });
