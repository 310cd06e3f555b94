import type { Transaction } from "sequelize";

/** Every job the queue runs, with what it is given: ids only, so that it reads what is true when it runs. */
export type JobPayloads = {
  "import-artwork": { artworkId: string };
  "render-proof": { revisionId: string };
  "make-certificate": { decisionId: string };
  "send-mail": { mailId: string };
  remind: Record<string, never>;
};
export type JobName = keyof JobPayloads;

/** What may take long. Jobs of these kinds carry their name as a flag, by which the queue passes them over while one is under way. */
export const heavyJobs: ReadonlySet<string> = new Set<JobName>(["import-artwork", "render-proof"]);

/**
 * How often a job is tried, with pauses that grow from seconds to six hours. Mail is tried for four days (RFC 5321, 4.5.4.1): a mail
 * server may be away for a weekend. For what people wait for on a page an hour says that it will not be.
 */
const mostTries: Readonly<Record<JobName, number>> = {
  "import-artwork": 8,
  "render-proof": 8,
  "make-certificate": 8,
  "send-mail": 25,
  remind: 8,
};

/**
 * Adds a job in the very transaction of the change that causes it: rolled back together, committed together.
 * The key makes asking twice the same as asking once. `inSeconds` is counted by the database's clock, as the queue counts.
 * Of what is due the lowest `priority` comes first, and of one priority what was asked first.
 */
export async function enqueue<N extends JobName>(
  transaction: Transaction,
  name: N,
  payload: JobPayloads[N],
  { inSeconds = 0, priority = 0 }: { readonly inSeconds?: number; readonly priority?: number } = {},
): Promise<void> {
  const key = `${name}:${Object.values(payload).join(":")}`;
  await sequelizeOf(transaction).query(
    `select graphile_worker.add_job($1::text, payload := $2::json, flags := $3::text[], job_key := $4::text, max_attempts := $5::int,
       run_at := now() + make_interval(secs => $6::float8), priority := $7::int)`,
    {
      bind: [
        name,
        JSON.stringify(payload),
        heavyJobs.has(name) ? [name] : null,
        key,
        mostTries[name],
        inSeconds,
        priority,
      ],
      transaction,
    },
  );
}

/** Sequelize hands its instance to each transaction; its types do not say so. */
function sequelizeOf(transaction: Transaction): import("sequelize").Sequelize {
  return (transaction as Transaction & { sequelize: import("sequelize").Sequelize }).sequelize;
}
