import { queryOptions } from "@tanstack/react-query";
import { getClient, listClients } from "#shared/contracts/clients.ts";
import { getJob, listEvents } from "#shared/contracts/jobs.ts";
import { listRevisions } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const jobQuery = (shop: string, jobId: string) =>
  queryOptions({
    queryKey: keys.job(shop, jobId),
    queryFn: ({ signal }) => call(getJob, { params: { shop, jobId }, signal }),
  });

export const revisionsQuery = (shop: string, jobId: string) =>
  pagesQuery([...keys.job(shop, jobId), "revisions"] as const, (cursor, signal) =>
    call(listRevisions, { params: { shop, jobId }, query: cursor ? { cursor } : {}, signal }),
  );

export const eventsQuery = (shop: string, jobId: string) =>
  pagesQuery([...keys.job(shop, jobId), "events"] as const, (cursor, signal) =>
    call(listEvents, { params: { shop, jobId }, query: { limit: 12, ...(cursor ? { cursor } : {}) }, signal }),
  );

/** Clients to choose from when a job is opened: those whose name or contact matches. */
export const clientChoicesQuery = (shop: string, q: string) =>
  queryOptions({
    queryKey: [...keys.clients(shop), "choices", q],
    queryFn: ({ signal }) =>
      call(listClients, { params: { shop }, query: { limit: 100, ...(q ? { q } : {}) }, signal }),
  });

/** The client of a job, for its contacts. */
export const jobClientQuery = (shop: string, clientId: string) =>
  queryOptions({
    queryKey: keys.client(shop, clientId),
    queryFn: ({ signal }) => call(getClient, { params: { shop, clientId }, signal }),
  });
