import { queryOptions } from "@tanstack/react-query";
import { getLimits } from "#shared/contracts/limits.ts";
import { call } from "./api-client.ts";
import { keys } from "./query-keys.ts";

/** The limits that the shop's dry fit keeps to. */
export const limitsQuery = (shop: string) =>
  queryOptions({
    queryKey: keys.limits(shop),
    queryFn: ({ signal }) => call(getLimits, { params: { shop }, signal }),
  });
