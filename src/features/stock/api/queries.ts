import { listStock, type StockItem } from "#shared/contracts/stock.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const stockQuery = (shop: string, kind: StockItem["kind"]) =>
  pagesQuery([...keys.stock(shop), kind] as const, (cursor, signal) =>
    call(listStock, { params: { shop }, query: { kind, ...(cursor ? { cursor } : {}) }, signal }),
  );
