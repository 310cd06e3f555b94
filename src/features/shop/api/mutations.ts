import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { changeShop } from "#shared/contracts/shop.ts";
import { call } from "@/lib/api-client.ts";
import { meQuery, shopQuery } from "@/lib/me.ts";

export function useChangeShop(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeShop.body>) => call(changeShop, { params: { shop }, body }),
    onSuccess: (changed) => {
      client.setQueryData(shopQuery(shop).queryKey, changed);
      return client.invalidateQueries({ queryKey: meQuery.queryKey });
    },
  });
}
