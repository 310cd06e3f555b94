import { queryOptions } from "@tanstack/react-query";
import type { whoAmI } from "#shared/contracts/account.ts";
import { type AddressOf, addresses } from "#shared/contracts/addresses.ts";
import type { getShop } from "#shared/contracts/shop.ts";
import { call } from "./api-client.ts";

const me: AddressOf<typeof whoAmI> = addresses.whoAmI;
const shopAt: AddressOf<typeof getShop> = addresses.getShop;

/** Who is signed in, and where. */
export const meQuery = queryOptions({
  queryKey: ["me"],
  queryFn: ({ signal }) => call(me, { signal }),
  staleTime: 60_000,
});

/** The shop as the reader sees it, with what they may do there. */
export const shopQuery = (shop: string) =>
  queryOptions({
    queryKey: ["shop", shop],
    queryFn: ({ signal }) => call(shopAt, { params: { shop }, signal }),
    staleTime: 60_000,
  });
