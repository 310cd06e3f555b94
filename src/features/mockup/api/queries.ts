import { queryOptions } from "@tanstack/react-query";
import { type Artwork, getArtworkPieces, listArtworks } from "#shared/contracts/artworks.ts";
import { getJob } from "#shared/contracts/jobs.ts";
import { getMockup } from "#shared/contracts/mockups.ts";
import { listSetAsides, type SetAside } from "#shared/contracts/set-asides.ts";
import { allPages } from "@/lib/all-pages.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

export const mockupQueries = {
  /** Read once when the mockup is opened: from there on the screen holds the draft and saves it. */
  ofJob: (shop: string, jobId: string) =>
    queryOptions({
      // Not below the job: what refreshes a job must not fetch a draft anew that is being worked on.
      queryKey: ["mockup", shop, jobId],
      queryFn: ({ signal }) => call(getMockup, { params: { shop, jobId }, signal }),
      staleTime: Number.POSITIVE_INFINITY,
      gcTime: 0,
      refetchOnWindowFocus: false,
      refetchOnReconnect: false,
    }),
  job: (shop: string, jobId: string) =>
    queryOptions({
      queryKey: keys.job(shop, jobId),
      queryFn: ({ signal }) => call(getJob, { params: { shop, jobId }, signal }),
    }),
  setAsides: (shop: string, jobId: string) =>
    queryOptions({
      queryKey: [...keys.job(shop, jobId), "set-asides"],
      queryFn: ({ signal }): Promise<SetAside[]> =>
        allPages((cursor) => call(listSetAsides, { params: { shop, jobId }, query: { limit: 100, cursor }, signal })),
    }),
  artworks: (shop: string, jobId: string) =>
    queryOptions({
      queryKey: [...keys.job(shop, jobId), "artworks", "all"],
      queryFn: ({ signal }): Promise<Artwork[]> =>
        allPages((cursor) => call(listArtworks, { params: { shop, jobId }, query: { limit: 100, cursor }, signal })),
    }),
  pieces: (shop: string, artworkId: string) =>
    queryOptions({
      queryKey: ["artwork", shop, artworkId, "pieces"],
      queryFn: ({ signal }) => call(getArtworkPieces, { params: { shop, artworkId }, signal }),
    }),
};
