import pg from "pg";
import { expect } from "vitest";
import type { TestDatabase } from "./database.ts";
import { runSql } from "./run-sql.ts";

/** Holds a job's row as a slow request would, so that a test can line up others behind it. */
export async function holdJob(
  { ownerUrl }: TestDatabase,
  jobId: string,
): Promise<{
  /** Waits until so many transactions wait for a lock. */
  waiters: (count: number) => Promise<void>;
  /** Lets the first of them go on. */
  release: () => Promise<void>;
}> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  await client.query("begin");
  await client.query("select from jobs where id = $1 for update", [jobId]);
  // Asked on a connection of its own: within one transaction the answer would never change.
  const waiting = async (): Promise<number> => {
    const pids = await runSql(
      ownerUrl,
      "select distinct pid from pg_locks where not granted and pid in (select pid from pg_stat_activity where datname = current_database())",
    );
    return pids.length;
  };
  return {
    waiters: (count) => expect.poll(waiting, { timeout: 20_000 }).toBe(count),
    async release() {
      await client.query("commit");
      await client.end();
    },
  };
}
