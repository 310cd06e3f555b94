import type { Logger } from "pino";
import { AppError } from "../http/app-error.ts";
import { listenToDatabase, type Told } from "./listen.ts";

/** Someone who looks at a job and is told when to look again. */
export type Watcher = {
  readonly jobId: string;
  readonly personId: string;
  /** Something may be new, or what the person may do may have changed. */
  readonly look: () => void;
  readonly end: () => void;
};

/** All in this process who look at jobs. */
export type Watchers = {
  /** Adds one; gives back how to leave. Refused when a person has too many open, or the process. */
  readonly add: (watcher: Watcher) => Promise<() => void>;
  /** Ends all of them and stops listening. */
  readonly close: () => Promise<void>;
};

/** More open pages than a person looks at; browsers hold about six to one server at a time. */
const mostOfPerson = 24;
const mostOfAll = 4_000;

const stopping = () => new AppError("too_many_requests", { detail: "The server is stopping. Try again in a moment." });

/** Begins to listen to the database with the first watcher. */
export function openWatchers(databaseUrl: string, log: Logger): Watchers {
  const watchers = new Set<Watcher>();
  let listening: ReturnType<typeof listenToDatabase> | null = null;
  let isClosed = false;

  function handleTold(told: Told): void {
    for (const watcher of watchers) {
      if (told.of === "job" && watcher.jobId !== told.jobId) continue;
      if (told.of === "person" && watcher.personId !== told.personId) continue;
      watcher.look();
    }
  }

  async function listen(): Promise<void> {
    listening ??= listenToDatabase(databaseUrl, { log, onTold: handleTold });
    try {
      await listening;
    } catch (error) {
      listening = null;
      throw error;
    }
  }

  return {
    async add(watcher) {
      if (isClosed) throw stopping();
      const own = [...watchers].filter(({ personId }) => personId === watcher.personId).length;
      if (own >= mostOfPerson || watchers.size >= mostOfAll)
        throw new AppError("too_many_requests", { detail: "Too many pages are open at once. Close some of them." });
      // Counted before the wait, so that many at once can't pass together.
      watchers.add(watcher);
      try {
        await listen();
        if (isClosed) throw stopping();
      } catch (error) {
        watchers.delete(watcher);
        throw error;
      }
      return () => {
        watchers.delete(watcher);
      };
    },
    async close() {
      isClosed = true;
      for (const watcher of watchers) watcher.end();
      watchers.clear();
      await (await listening?.catch(() => null))?.close();
    },
  };
}
