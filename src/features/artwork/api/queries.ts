import { listArtworks } from "#shared/contracts/artworks.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const artworksQuery = (shop: string, jobId: string) =>
  pagesQuery([...keys.job(shop, jobId), "artworks"] as const, (cursor, signal) =>
    call(listArtworks, { params: { shop, jobId }, query: cursor ? { cursor } : {}, signal }),
  );
