import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { setTrueSize } from "#shared/contracts/artworks.ts";
import { issueRevision } from "#shared/contracts/revisions.ts";
import { setAsideFinding, takeBackSetAside } from "#shared/contracts/set-asides.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";
import { mockupQueries } from "./queries.ts";

/** Issues the saved draft of one version as the next revision. */
export function useIssueRevision(shop: string, jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { mockupVersion: number; message: string }) =>
      call(issueRevision, { params: { shop, jobId }, body }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
        client.invalidateQueries({ queryKey: keys.jobs(shop) }),
        client.invalidateQueries({ queryKey: revisionKeys.ofJob(shop, jobId) }),
      ]),
  });
}

/** Sets a finding of the saved draft aside. Whoever was first, the list is read anew: it may have been someone else. */
export function useSetAside(shop: string, jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof setAsideFinding.body>) =>
      call(setAsideFinding, { params: { shop, jobId }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
  });
}

/** Lets a finding that was set aside stand again. */
export function useTakeBack(shop: string, jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (setAsideId: string) => call(takeBackSetAside, { params: { shop, jobId, setAsideId } }),
    onSettled: () => client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
  });
}

/** Sets an artwork's true size by its page's width; its pieces are read anew. */
export function useSetArtworkWidth(shop: string, jobId: string, artworkId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (lengthMm: number) =>
      call(setTrueSize, { params: { shop, artworkId }, body: { side: "width", lengthMm } }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
        client.invalidateQueries({ queryKey: mockupQueries.pieces(shop, artworkId).queryKey }),
      ]),
  });
}
