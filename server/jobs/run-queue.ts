import { EventEmitter } from "node:events";
import {
  type JobHelpers,
  parseCronItems,
  Logger as QueueLogger,
  run,
  type TaskList,
  type WorkerEvents,
} from "graphile-worker";
import pg from "pg";
import type { Logger } from "pino";
import { appDatabaseUrl } from "../env.ts";
import type { Services } from "../http/context.ts";
import { withoutSecrets } from "../http/without-secrets.ts";
import { freeJobsOfTheDead } from "./free-jobs.ts";
import { heavyJobs, type JobName } from "./queue.ts";
import { type Task, tasks } from "./tasks.ts";

/** One more than there are kinds of heavy work, so that mails find a free hand however much one shop brings. */
const concurrency = heavyJobs.size + 1;
/** What is done by the clock. Every quarter of an hour it is nine in the morning somewhere; several processes agree on who does it. */
const clockwork = [
  { task: "remind" satisfies JobName, match: "*/15 * * * *", options: { jobKey: "remind", maxAttempts: 3 } },
];
/** What the queue tells of jobs is said below in our own words, so here it is for finding faults in the queue itself. */
const levels = { error: "error", warning: "warn", info: "debug", debug: "trace" } as const;

export type RunningQueue = {
  /** Takes no more jobs, finishes those it has, and lets go. */
  readonly stop: () => Promise<void>;
};

/** Works on the queue inside this process, a few jobs at a time. */
export async function runQueue(services: Services): Promise<RunningQueue> {
  const log = services.log.child({ part: "queue" });
  const connectionString = appDatabaseUrl(services.env);
  const pool = new pg.Pool({ connectionString, max: concurrency + 2 });
  const lost = (error: Error): void => log.error({ err: error }, "The queue lost a connection");
  pool.on("error", lost);
  pool.on("connect", (client) => client.on("error", lost));
  const events: WorkerEvents = new EventEmitter();
  events.on("job:error", ({ job, error }) => {
    const fields = { err: error, task: job.task_identifier, attempt: job.attempts, of: job.max_attempts };
    if (job.attempts >= job.max_attempts) log.error(fields, "A job failed for good");
    else log.warn(fields, "A job failed and will be tried again");
  });
  const { taskList, underWay } = watched(taskListOf(services, log), heavyJobs);
  const presence = await freeJobsOfTheDead({ connectionString, events, log });
  const runner = await run({
    pgPool: pool,
    concurrency,
    noHandleSignals: true,
    pollInterval: 2_000,
    parsedCronItems: parseCronItems(clockwork),
    forbiddenFlags: underWay,
    taskList,
    logger: new QueueLogger(() => (level, message) => log[levels[level]](withoutSecrets(message))),
    events,
  });
  return {
    async stop() {
      await runner.stop();
      await presence.end();
      await pool.end();
    },
  };
}

/** The same tasks, and which of the watched ones are under way. */
export function watched(
  tasks: TaskList,
  names: ReadonlySet<string>,
): { readonly taskList: TaskList; readonly underWay: () => string[] } {
  const running: string[] = [];
  const watch = (name: string, task: TaskList[string]): TaskList[string] =>
    names.has(name)
      ? async (payload, helpers) => {
          running.push(name);
          try {
            return await task?.(payload, helpers);
          } finally {
            running.splice(running.indexOf(name), 1);
          }
        }
      : task;
  return {
    taskList: Object.fromEntries(Object.entries(tasks).map(([name, task]) => [name, watch(name, task)])),
    underWay: () => [...new Set(running)],
  };
}

/** The tasks as the queue wants them; each success is logged. */
export function taskListOf(services: Services, log: Logger): TaskList {
  return Object.fromEntries(
    Object.entries(tasks).map(([name, task]) => [
      name,
      async (payload: unknown, { job }: JobHelpers) => {
        const began = performance.now();
        // The queue's payloads are only ever written by enqueue(), which checks them by type.
        await (task as Task<JobName>)(services, payload as never, { isLast: job.attempts >= job.max_attempts });
        log.info({ task: name, payload, ms: Math.round(performance.now() - began) }, "A job is done");
      },
    ]),
  );
}
