import { queryOptions } from "@tanstack/react-query";
import { inspectLink } from "#shared/contracts/account.ts";
import { call } from "@/lib/api-client.ts";

/** What a link is for. Looking never spends it. */
export const linkQuery = (token: string) =>
  queryOptions({
    queryKey: ["link", token],
    queryFn: ({ signal }) => call(inspectLink, { body: { token }, signal }),
    staleTime: 0,
  });
