import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { changePrices } from "#shared/contracts/prices.ts";
import { call } from "@/lib/api-client.ts";
import { pricesQuery } from "@/lib/prices-query.ts";

export function useChangePrices(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changePrices.body>) => call(changePrices, { params: { shop }, body }),
    onSuccess: (saved) => client.setQueryData(pricesQuery(shop).queryKey, saved),
  });
}
