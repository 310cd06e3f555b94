import { existsSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { Worker } from "node:worker_threads";
import { artworkLimits } from "#shared/artwork/limits.ts";

/**
 * Starts the import worker: the bundle beside this file's own bundle when there is one, else the source, which a worker
 * can only run under tsx.
 */
export function startImportWorker(): Worker {
  const options = { resourceLimits: { maxOldGenerationSizeMb: artworkLimits.memoryMb } };
  const bundled = new URL("./import-worker.mjs", import.meta.url);
  return existsSync(fileURLToPath(bundled)) ? new Worker(bundled, options) : startFromSource(options);
}

function startFromSource(options: { resourceLimits: { maxOldGenerationSizeMb: number } }): Worker {
  const source = JSON.stringify(new URL("./import-worker.ts", import.meta.url).href);
  // Evaluated code finds packages from the working directory, which in development and tests is the project's.
  const start = `import("tsx/esm/api").then(({ register }) => { register(); return import(${source}); });`;
  // A parent's own loaders would register a second time in the worker.
  return new Worker(start, { ...options, eval: true, execArgv: [] });
}
