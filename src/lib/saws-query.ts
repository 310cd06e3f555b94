import { queryOptions } from "@tanstack/react-query";
import { getSaws } from "#shared/contracts/saws.ts";
import { call } from "./api-client.ts";
import { keys } from "./query-keys.ts";

/** How the shop cuts. */
export const sawsQuery = (shop: string) =>
  queryOptions({
    queryKey: keys.saws(shop),
    queryFn: ({ signal }) => call(getSaws, { params: { shop }, signal }),
  });
