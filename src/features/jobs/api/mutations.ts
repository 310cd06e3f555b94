import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import { openAnotherLike } from "#shared/contracts/another-like.ts";
import { addClient } from "#shared/contracts/clients.ts";
import * as contract from "#shared/contracts/jobs.ts";
import { withdrawRevision } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

/** Keeps the changed job and refreshes what shows it: its own parts and every list it stands in. */
function useKeepJob(shop: string) {
  const client = useQueryClient();
  return (job: contract.Job) => {
    client.setQueryData(keys.job(shop, job.id), job);
    return Promise.all([
      client.invalidateQueries({ queryKey: keys.job(shop, job.id) }),
      client.invalidateQueries({ queryKey: keys.jobs(shop) }),
    ]);
  };
}

export type NewJob = {
  readonly client: { readonly id: string } | { readonly name: string };
  readonly title: string;
  readonly dueOn: string | null;
};

/** Opens a job; for a client that is not there yet, adds the client first. */
export function useOpenJob(shop: string) {
  const client = useQueryClient();
  const keep = useKeepJob(shop);
  return useMutation({
    mutationFn: async ({ client: whom, title, dueOn }: NewJob) => {
      const clientId =
        "id" in whom ? whom.id : (await call(addClient, { params: { shop }, body: { name: whom.name } })).id;
      return call(contract.openJob, { params: { shop }, body: { clientId, title, dueOn } });
    },
    onSuccess: keep,
    // The client may have been added even if the job then was refused.
    onSettled: () => client.invalidateQueries({ queryKey: keys.clients(shop) }),
  });
}

/** Opens a job of the same format, stack and hardware as an earlier one. */
export function useOpenAnotherLike(shop: string, jobId: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof openAnotherLike.body>) =>
      call(openAnotherLike, { params: { shop, jobId }, body }),
    onSuccess: useKeepJob(shop),
  });
}

export function useChangeJob(shop: string, jobId: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof contract.changeJob.body>) =>
      call(contract.changeJob, { params: { shop, jobId }, body }),
    onSuccess: useKeepJob(shop),
  });
}

export type JobMove = z.output<typeof contract.moveJob.body>["to"];

export function useMoveJob(shop: string, jobId: string) {
  return useMutation({
    mutationFn: (body: { to: JobMove; reason: string }) => call(contract.moveJob, { params: { shop, jobId }, body }),
    onSuccess: useKeepJob(shop),
  });
}

export function useSetConsent(shop: string, jobId: string) {
  const client = useQueryClient();
  const keep = useKeepJob(shop);
  return useMutation({
    mutationFn: (given: boolean) => call(contract.setConsent, { params: { shop, jobId }, body: { given } }),
    onSuccess: (job) => Promise.all([keep(job), client.invalidateQueries({ queryKey: keys.portfolio(shop) })]),
  });
}

export function useWithdrawRevision(shop: string, jobId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ revisionId, reason }: { revisionId: string; reason: string }) =>
      call(withdrawRevision, { params: { shop, revisionId }, body: { reason } }),
    onSuccess: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: keys.job(shop, jobId) }),
        client.invalidateQueries({ queryKey: keys.jobs(shop) }),
      ]),
  });
}
