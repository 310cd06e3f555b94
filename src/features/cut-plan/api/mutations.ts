import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { changeSaws } from "#shared/contracts/saws.ts";
import { call } from "@/lib/api-client.ts";
import { sawsQuery } from "@/lib/saws-query.ts";

export function useChangeSaws(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeSaws.body>) => call(changeSaws, { params: { shop }, body }),
    onSuccess: (saved) => client.setQueryData(sawsQuery(shop).queryKey, saved),
  });
}
