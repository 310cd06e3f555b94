import pg from "pg";
import type { Logger } from "pino";

/** What the database tells every process of. */
export type Told =
  | { readonly of: "job"; readonly jobId: string }
  /** Something of what a person may do has changed. */
  | { readonly of: "person"; readonly personId: string }
  /** The connection was away for a while: anything may have been missed. */
  | { readonly of: "anything" };

const channels = { job_signals: "job", standings: "person" } as const;

/** How long to wait before trying again, ms: from the first to the longest. */
const firstPauseMs = 100;
const longestPauseMs = 5_000;

/**
 * Listens to PostgreSQL's notifications on a connection of its own, for as long as it takes: a connection that breaks is made again, and
 * then `anything` is told. Resolves once it listens. `close` ends it.
 */
export async function listenToDatabase(
  url: string,
  { log, onTold }: { readonly log: Logger; readonly onTold: (told: Told) => void },
): Promise<{ close: () => Promise<void> }> {
  let client: pg.Client | null = null;
  let isClosed = false;
  let pauseMs = firstPauseMs;
  let again: NodeJS.Timeout | undefined;

  function lost(broken: pg.Client, error?: Error): void {
    if (client !== broken) return;
    client = null;
    if (isClosed) return;
    log.warn({ err: error, pauseMs }, "The connection that listens to the database broke");
    again = setTimeout(() => void retry(), pauseMs);
    pauseMs = Math.min(longestPauseMs, pauseMs * 2);
  }

  async function retry(): Promise<void> {
    try {
      await connect();
      onTold({ of: "anything" });
    } catch (error) {
      log.warn({ err: error }, "The database can't be listened to yet");
      again = setTimeout(() => void retry(), pauseMs);
      pauseMs = Math.min(longestPauseMs, pauseMs * 2);
    }
  }

  async function connect(): Promise<void> {
    const made = new pg.Client({ connectionString: url, keepAlive: true });
    made.on("error", (error) => lost(made, error));
    made.on("end", () => lost(made));
    made.on("notification", ({ channel, payload = "" }) => {
      if (channel === "job_signals") onTold({ of: channels.job_signals, jobId: payload });
      if (channel === "standings") onTold({ of: channels.standings, personId: payload });
    });
    await made.connect();
    if (isClosed) {
      await made.end();
      return;
    }
    client = made;
    for (const channel of Object.keys(channels)) await made.query(`listen ${channel}`);
    pauseMs = firstPauseMs;
  }

  await connect();
  return {
    async close() {
      isClosed = true;
      clearTimeout(again);
      const open = client;
      client = null;
      await open?.end();
    },
  };
}
