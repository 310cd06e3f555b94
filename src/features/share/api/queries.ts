import { queryOptions } from "@tanstack/react-query";
import { openShareLink } from "#shared/contracts/portfolio.ts";
import { call } from "@/lib/api-client.ts";

export const shareQueries = {
  /** Opened once for a visit: each opening is counted for the shop. */
  book: (token: string) =>
    queryOptions({
      queryKey: ["share", token],
      queryFn: ({ signal }) => call(openShareLink, { params: { token }, signal }),
      staleTime: Number.POSITIVE_INFINITY,
      refetchOnWindowFocus: false,
    }),
};
