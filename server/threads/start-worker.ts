import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { Worker } from "node:worker_threads";

export type WorkerProgram = {
  /** Its bundle's file beside this file's own bundle. */
  readonly bundle: string;
  /** Its source, from this folder. */
  readonly source: string;
  /** Megabytes its JavaScript objects may take before it is ended. */
  readonly memoryMb: number;
};

/** Starts a worker thread: its bundle when there is one, else its source, which a worker can only run under tsx. */
export function startWorker({ bundle, source, memoryMb }: WorkerProgram): Worker {
  const options = { resourceLimits: { maxOldGenerationSizeMb: memoryMb } };
  const bundled = new URL(`./${bundle}`, import.meta.url);
  return existsSync(fileURLToPath(bundled))
    ? new Worker(bundled, options)
    : startFromSource(new URL(source, import.meta.url), options);
}

function startFromSource(source: URL, options: { resourceLimits: { maxOldGenerationSizeMb: number } }): Worker {
  const path = JSON.stringify(source.href);
  // Evaluated code finds packages from the working directory, which in development and tests is the project's.
  const start = `import("tsx/esm/api").then(({ register }) => { register(); return import(${path}); });`;
  // A parent's own loaders would register a second time in the worker.
  return new Worker(start, { ...options, eval: true, execArgv: [] });
}
