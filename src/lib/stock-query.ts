import { queryOptions } from "@tanstack/react-query";
import { listStock, type StockItem } from "#shared/contracts/stock.ts";
import { allPages } from "./all-pages.ts";
import { call } from "./api-client.ts";
import { keys } from "./query-keys.ts";

/** Everything the shop has on hand. */
export const stockQuery = (shop: string) =>
  queryOptions({
    queryKey: [...keys.stock(shop), "all"],
    queryFn: ({ signal }): Promise<StockItem[]> =>
      allPages((cursor) => call(listStock, { params: { shop }, query: { limit: 100, cursor }, signal })),
    staleTime: 60_000,
  });
