import { mkdtemp, rm } from "node:fs/promises";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { setTimeout } from "node:timers/promises";
import { Logger, runOnce } from "graphile-worker";
import pg from "pg";
import { createApp } from "#server/app.ts";
import { readEnvironment } from "#server/env.ts";
import type { Services } from "#server/http/context.ts";
import type { Registered } from "#server/http/route.ts";
import { taskListOf } from "#server/jobs/run-queue.ts";
import { createLog } from "#server/log.ts";
import { openServices } from "#server/services.ts";
import { createTestDatabase, type TestDatabase } from "./database.ts";
import { Visitor } from "./visitor.ts";

export type TestApp = {
  baseUrl: string;
  services: Services;
  database: TestDatabase;
  /** Every route of the application. */
  registered: readonly Registered[];
  /** What the application logged so far, a JSON line each. */
  logged: readonly string[];
  /** Someone with an empty cookie jar. */
  visitor: () => Visitor;
  /** Jobs waiting in the queue, as the database holds them. */
  queuedJobs: () => Promise<readonly { task: string; payload: Record<string, string>; lastError: string | null }[]>;
  /** Works on the queue until nothing is due. */
  runJobs: () => Promise<void>;
  stop: () => Promise<void>;
};

/**
 * The whole application on a free port of loopback, with a database, files and a mail sink of its own. The queue
 * stands still until runJobs(), so that a test sees the job rows. Rate limits are out of the way unless `env` says so.
 */
export async function startTestApp({
  poolMax = 1,
  env: overrides = {},
}: {
  poolMax?: number;
  env?: Record<string, string>;
} = {}): Promise<TestApp> {
  const database = await createTestDatabase({ poolMax });
  const folder = await mkdtemp(join(tmpdir(), "standproud-app-"));
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const baseUrl = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;

  const env = readEnvironment({
    NODE_ENV: "test",
    PUBLIC_URL: baseUrl,
    DATABASE_URL: database.ownerUrl,
    APP_DATABASE_URL: database.appUrl,
    AUTH_SECRET: "a secret for tests, of no worth to anybody",
    FILES_DIR: join(folder, "files"),
    MAIL_SINK_DIR: join(folder, "mail"),
    RATE_LIMIT_FACTOR: "1000",
    LOG_LEVEL: "info",
    ...overrides,
  });
  const logged: string[] = [];
  const log = createLog(env, { write: (line) => logged.push(line) });
  const { services, close } = await openServices(env, { log, poolMax });
  const { handler, registered } = createApp(services);
  server.on("request", handler);

  const pool = new pg.Pool({ connectionString: database.appUrl, max: 2 });
  // The database is dropped while idle connections are still open.
  pool.on("error", () => undefined);
  pool.on("connect", (client) => client.on("error", () => undefined));
  return {
    baseUrl,
    services,
    database,
    registered,
    logged,
    visitor: () => new Visitor(baseUrl),
    async queuedJobs() {
      const { rows } = await pool.query(
        `select task.identifier as task, job.payload, job.last_error as "lastError"
         from graphile_worker._private_jobs job join graphile_worker._private_tasks task on task.id = job.task_id
         order by job.id`,
      );
      return rows;
    },
    async runJobs() {
      await runOnce({
        pgPool: pool,
        taskList: taskListOf(services, log),
        parsedCronItems: [],
        noHandleSignals: true,
        // Failures are kept in the job's row, where tests read them.
        logger: new Logger(() => () => undefined),
      });
      // It resolves while the last job's row is still being written.
      for (let round = 0; round < 200; round += 1) {
        const { rows } = await pool.query("select 1 from graphile_worker.jobs where locked_at is not null limit 1");
        if (rows.length === 0) return;
        await setTimeout(10);
      }
      throw new Error("A job is held although nobody works on it.");
    },
    async stop() {
      await new Promise<void>((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      });
      await pool.end();
      await close();
      await database.drop();
      await rm(folder, { recursive: true, force: true });
    },
  };
}
