import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import type { ReadContext } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { Contact } from "../models/contact.ts";
import type { Job } from "../models/job.ts";
import { JobApprover } from "../models/job-approver.ts";
import { Revision } from "../models/revision.ts";
import type { JobFacts } from "../policies/job.ts";

/** Everything of a revision but the frozen text, which can be megabytes. */
export const revisionColumns = { exclude: ["snapshot"] };

/** A job with what its policies, state and presenters ask about. Revisions oldest first. */
export type LoadedJob = {
  readonly job: Job;
  readonly client: Client;
  readonly approvers: readonly { readonly contactId: string; readonly name: string }[];
  readonly revisions: readonly Revision[];
  readonly facts: JobFacts;
};

/** Loads what belongs to jobs that were found already, in three queries for the lot; same order. */
export async function loadJobs(
  { transaction }: Pick<ReadContext, "transaction">,
  jobs: readonly Job[],
): Promise<LoadedJob[]> {
  const jobId = jobs.map(({ id }) => id);
  const clients = await Client.findAll({
    where: { id: [...new Set(jobs.map(({ clientId }) => clientId))] },
    transaction,
  });
  const approvers = await JobApprover.findAll({
    where: { jobId },
    include: [{ model: Contact, as: "contact", where: { endedAt: null } }],
    order: ["contactId"],
    transaction,
  });
  const revisions = await Revision.findAll({
    where: { jobId },
    attributes: revisionColumns,
    order: ["sequence"],
    transaction,
  });
  return jobs.map((job) => {
    const client = clients.find(({ id }) => id === job.clientId);
    if (!client) throw new Error(`Job ${job.id} has no client row.`);
    const own = revisions.filter((revision) => revision.jobId === job.id);
    return {
      job,
      client,
      approvers: approvers.flatMap(({ jobId: of, contactId, contact }) =>
        of === job.id && contact ? [{ contactId, name: contact.name }] : [],
      ),
      revisions: own,
      facts: { shopId: job.shopId, clientId: job.clientId, shown: own.some(({ state }) => visibleToClient(state)) },
    };
  });
}
