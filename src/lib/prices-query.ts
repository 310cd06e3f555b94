import { queryOptions } from "@tanstack/react-query";
import { getPrices } from "#shared/contracts/prices.ts";
import { call } from "./api-client.ts";
import { keys } from "./query-keys.ts";

/** What the shop pays and asks. Only for those who may see it. */
export const pricesQuery = (shop: string) =>
  queryOptions({
    queryKey: keys.prices(shop),
    queryFn: ({ signal }) => call(getPrices, { params: { shop }, signal }),
  });
