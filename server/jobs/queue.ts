import type { Transaction } from "sequelize";

/** Every job the queue runs, with what it is given: ids only, so that it reads what is true when it runs. */
export type JobPayloads = {
  "import-artwork": { artworkId: string };
  "render-proof": { revisionId: string };
  "make-certificate": { decisionId: string };
  "send-mail": { mailId: string };
};
export type JobName = keyof JobPayloads;

/** What may take long. Jobs of these kinds carry their name as a flag, by which the queue passes them over while one is under way. */
export const heavyJobs: ReadonlySet<string> = new Set<JobName>(["import-artwork", "render-proof"]);

/**
 * Adds a job in the very transaction of the change that causes it: rolled back together, committed together.
 * The key makes asking twice the same as asking once. Retried with growing pauses, 8 tries.
 */
export async function enqueue<N extends JobName>(
  transaction: Transaction,
  name: N,
  payload: JobPayloads[N],
): Promise<void> {
  const key = `${name}:${Object.values(payload).join(":")}`;
  await sequelizeOf(transaction).query(
    "select graphile_worker.add_job($1::text, payload := $2::json, flags := $3::text[], job_key := $4::text, max_attempts := 8)",
    { bind: [name, JSON.stringify(payload), heavyJobs.has(name) ? [name] : null, key], transaction },
  );
}

/** Sequelize hands its instance to each transaction; its types do not say so. */
function sequelizeOf(transaction: Transaction): import("sequelize").Sequelize {
  return (transaction as Transaction & { sequelize: import("sequelize").Sequelize }).sequelize;
}
