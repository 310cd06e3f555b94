import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { changeLimits } from "#shared/contracts/limits.ts";
import { call } from "@/lib/api-client.ts";
import { limitsQuery } from "@/lib/limits-query.ts";

export function useChangeLimits(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeLimits.body>) => call(changeLimits, { params: { shop }, body }),
    onSuccess: (saved) => client.setQueryData(limitsQuery(shop).queryKey, saved),
  });
}
