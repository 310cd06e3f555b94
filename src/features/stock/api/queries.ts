import { queryOptions } from "@tanstack/react-query";
import { listStock, type StockItem } from "#shared/contracts/stock.ts";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

/** A kind of stock by name, or of those whose name has `q` in it. */
export const stockQuery = (shop: string, { kind, q }: { readonly kind: StockKind; readonly q: string }) =>
  pagesQuery([...keys.stock(shop), kind, q] as const, (cursor, signal) =>
    call(listStock, {
      params: { shop },
      query: { kind, ...(q ? { q } : {}), ...(cursor ? { cursor } : {}) },
      signal,
    }),
  );

/** What is no longer in stock, of every kind. */
export const retiredStockQuery = (shop: string) =>
  pagesQuery([...keys.stock(shop), "retired"] as const, (cursor, signal) =>
    call(listStock, { params: { shop }, query: { state: "retired", ...(cursor ? { cursor } : {}) }, signal }),
  );

/** More screws than anybody chooses from in a list. */
const mostScrews = 100;

/** The screws in stock, to choose from. */
export const screwsQuery = (shop: string) =>
  queryOptions({
    queryKey: [...keys.stock(shop), "screws"] as const,
    queryFn: async ({ signal }) => {
      const { items } = await call(listStock, {
        params: { shop },
        query: { kind: "screw", limit: mostScrews },
        signal,
      });
      return items.filter((item): item is Extract<StockItem, { kind: "screw" }> => item.kind === "screw");
    },
  });
