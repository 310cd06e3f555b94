import type { z } from "zod";
import { listJobs } from "#shared/contracts/jobs.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export type JobFilter = Omit<z.input<typeof listJobs.query>, "cursor" | "limit">;

/** Jobs that match, page by page. */
export const jobsQuery = (shop: string, filter: JobFilter) =>
  pagesQuery([...keys.jobs(shop), filter] as const, (cursor, signal) =>
    call(listJobs, { params: { shop }, query: { ...filter, ...(cursor ? { cursor } : {}) }, signal }),
  );
