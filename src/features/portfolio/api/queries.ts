import { listPortfolioPieces, listShareLinks } from "#shared/contracts/portfolio.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const piecesQuery = (shop: string) =>
  pagesQuery(keys.portfolio(shop), (cursor, signal) =>
    call(listPortfolioPieces, { params: { shop }, query: cursor ? { cursor } : {}, signal }),
  );

export const shareLinksQuery = (shop: string) =>
  pagesQuery(keys.shareLinks(shop), (cursor, signal) =>
    call(listShareLinks, { params: { shop }, query: cursor ? { cursor } : {}, signal }),
  );
