import { useMutation, useQueryClient } from "@tanstack/react-query";
import * as contract from "#shared/contracts/artworks.ts";
import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

function useRefreshJob(shop: string, jobId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: keys.job(shop, jobId) });
}

export function useSetTrueSize(shop: string, jobId: string, artworkId: string) {
  return useMutation({
    mutationFn: (body: { side: "width" | "height"; lengthMm: number }) =>
      call(contract.setTrueSize, { params: { shop, artworkId }, body }),
    onSuccess: useRefreshJob(shop, jobId),
  });
}

export function useTraceArtwork(shop: string, jobId: string, artworkId: string) {
  return useMutation({
    mutationFn: (body: TraceChoices) => call(contract.traceArtwork, { params: { shop, artworkId }, body }),
    onSuccess: useRefreshJob(shop, jobId),
  });
}

export function useCancelTrace(shop: string, jobId: string, artworkId: string) {
  return useMutation({
    mutationFn: () => call(contract.cancelTrace, { params: { shop, artworkId } }),
    onSuccess: useRefreshJob(shop, jobId),
  });
}

export function useRemoveArtwork(shop: string, jobId: string) {
  return useMutation({
    mutationFn: (artworkId: string) => call(contract.removeArtwork, { params: { shop, artworkId } }),
    onSuccess: useRefreshJob(shop, jobId),
  });
}
