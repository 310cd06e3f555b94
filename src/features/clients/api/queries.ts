import { queryOptions } from "@tanstack/react-query";
import { getClient, listClients } from "#shared/contracts/clients.ts";
import { listJobs } from "#shared/contracts/jobs.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const clientsQuery = (shop: string, q: string) =>
  pagesQuery([...keys.clients(shop), q] as const, (cursor, signal) =>
    call(listClients, { params: { shop }, query: { ...(q ? { q } : {}), ...(cursor ? { cursor } : {}) }, signal }),
  );

export const clientQuery = (shop: string, clientId: string) =>
  queryOptions({
    queryKey: keys.client(shop, clientId),
    queryFn: ({ signal }) => call(getClient, { params: { shop, clientId }, signal }),
  });

export const clientJobsQuery = (shop: string, clientId: string) =>
  pagesQuery([...keys.jobs(shop), { clientId }] as const, (cursor, signal) =>
    call(listJobs, { params: { shop }, query: { clientId, sort: "newest", ...(cursor ? { cursor } : {}) }, signal }),
  );
