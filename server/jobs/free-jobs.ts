import type { WorkerEvents } from "graphile-worker";
import pg from "pg";
import type { Logger } from "pino";

/** The first half of the advisory locks' keys; any number that nothing else of ours uses. */
const lockSpace = 4600;
const lookEveryMs = 5_000;

/**
 * Gives jobs back that a killed process held; the queue itself would wait four hours. Each process holds an advisory
 * lock named after its workers, which the database drops with the connection, so a held job whose holder's lock is
 * free belongs to nobody alive. Looks at once and then every few seconds.
 */
export async function freeJobsOfTheDead({
  connectionString,
  events,
  log,
}: {
  connectionString: string;
  events: WorkerEvents;
  log: Logger;
}): Promise<{ readonly end: () => Promise<void> }> {
  const client = new pg.Client({ connectionString });
  client.on("error", (error) => log.error({ err: error }, "The queue's lock connection was lost"));
  await client.connect();

  // Jobs are held in the name of a process's pool of workers, not of the single worker.
  let own: Promise<unknown> = Promise.resolve();
  events.on("pool:create", ({ workerPool }) => {
    own = client
      .query("select pg_advisory_lock($1, hashtext($2))", [lockSpace, workerPool.id])
      .catch((error: unknown) => log.error({ err: error }, "The queue could not say that it lives"));
  });

  async function look(): Promise<void> {
    await own;
    const { rows } = await client.query<{ holder: string }>(
      // A worker that has just begun may not have its own lock yet.
      "select distinct locked_by as holder from graphile_worker.jobs where locked_at < now() - interval '2 seconds'",
    );
    for (const { holder } of rows) {
      const { rows: answers } = await client.query<{ dead: boolean }>(
        `select not exists (
           select from pg_locks
           where locktype = 'advisory' and database = (select oid from pg_database where datname = current_database())
             and classid = $1::oid and objid = (hashtext($2)::bigint & 4294967295)::oid
         ) as dead`,
        [lockSpace, holder],
      );
      if (!answers[0]?.dead) continue;
      await client.query("select graphile_worker.force_unlock_workers($1::text[])", [[holder]]);
      log.warn({ holder }, "Took back jobs from a worker that is gone");
    }
  }

  await look();
  const timer = setInterval(() => {
    look().catch((error: unknown) => log.error({ err: error }, "The queue could not look for held jobs"));
  }, lookEveryMs);
  return {
    async end() {
      clearInterval(timer);
      await client.end();
    },
  };
}
