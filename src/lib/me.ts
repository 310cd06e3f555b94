import { queryOptions } from "@tanstack/react-query";
import { whoAmI } from "#shared/contracts/account.ts";
import { getShop } from "#shared/contracts/shop.ts";
import { call } from "./api-client.ts";

/** Who is signed in, and where. */
export const meQuery = queryOptions({
  queryKey: ["me"],
  queryFn: ({ signal }) => call(whoAmI, { signal }),
  staleTime: 60_000,
});

/** The shop as the reader sees it, with what they may do there. */
export const shopQuery = (shop: string) =>
  queryOptions({
    queryKey: ["shop", shop],
    queryFn: ({ signal }) => call(getShop, { params: { shop }, signal }),
    staleTime: 60_000,
  });
