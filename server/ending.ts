import type { Logger } from "pino";

/** Longer than any request or job should take, shorter than the patience of whoever stops us. */
const patienceMs = 9_000;

/**
 * On SIGTERM or SIGINT finishes what is running and ends the process: with 0 when all was finished, with 1 when it
 * took too long. A second signal ends it at once.
 */
export function onEnd(log: Logger, finish: () => Promise<void>): void {
  let isEnding = false;
  const end = (signal: string): void => {
    if (isEnding) process.exit(1);
    isEnding = true;
    log.info({ signal }, "Stopping");
    const late = setTimeout(() => {
      log.error("Stopping took too long");
      process.exit(1);
    }, patienceMs);
    finish().then(
      () => {
        clearTimeout(late);
        log.info("Stopped");
        process.exit(0);
      },
      (error: unknown) => {
        log.error({ err: error }, "Stopping failed");
        process.exit(1);
      },
    );
  };
  process.on("SIGTERM", end);
  process.on("SIGINT", end);
}
