import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { makeShareLink, revokeShareLink } from "#shared/contracts/portfolio.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

export function useMakeShareLink(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof makeShareLink.body>) => call(makeShareLink, { params: { shop }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.shareLinks(shop) }),
  });
}

export function useRevokeShareLink(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (linkId: string) => call(revokeShareLink, { params: { shop, linkId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.shareLinks(shop) }),
  });
}
