import { parentPort } from "node:worker_threads";
import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { importBytes } from "./import-bytes.ts";
import { isReaderBroken } from "./simplify-svg.ts";

/** What the worker answers: the outcome, or what went wrong on our side. After a fault, or when spent, it must not be used again. */
export type WorkerAnswer =
  | { readonly kind: "ready" }
  | { readonly kind: "outcome"; readonly outcome: ImportOutcome; readonly spent: boolean }
  | { readonly kind: "fault"; readonly message: string };

const port = parentPort;
if (!port) throw new Error("The artwork worker must be started as a worker thread.");

port.on("message", (bytes: Uint8Array) => {
  importBytes(bytes).then(
    (outcome) => port.postMessage({ kind: "outcome", outcome, spent: isReaderBroken() } satisfies WorkerAnswer),
    (error: unknown) =>
      port.postMessage({
        kind: "fault",
        message: error instanceof Error ? (error.stack ?? error.message) : String(error),
      } satisfies WorkerAnswer),
  );
});
port.postMessage({ kind: "ready" } satisfies WorkerAnswer);
