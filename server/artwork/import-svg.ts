import type { Worker } from "node:worker_threads";
import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { artworkLimits } from "#shared/artwork/limits.ts";
import { artworkRefusal, type RefusalCode } from "#shared/artwork/refusals.ts";
import type { WorkerAnswer } from "./import-worker.ts";
import { type ArtworkKind, sniffArtwork } from "./sniff-artwork.ts";
import { startImportWorker } from "./start-import-worker.ts";

export type ImportOptions = {
  /** Milliseconds a file may take, 5,000 unless said otherwise. */
  readonly timeMs?: number;
  /** Hears what went wrong on our side when a file is refused with import.failed. */
  readonly onFault?: (message: string) => void;
};

const refusedKinds: Readonly<Partial<Record<ArtworkKind, RefusalCode>>> = {
  empty: "file.empty",
  png: "file.png",
  jpeg: "file.jpeg",
  pdf: "file.pdf",
  unknown: "file.unknown",
};

/** WebAssembly memory never shrinks, so a worker is replaced after this many files. */
const filesPerWorker = 100;
const startMs = 20_000;

let idle: { readonly worker: Worker; readonly files: number } | undefined;
let queue: Promise<unknown> = Promise.resolve();

/**
 * An SVG file as pieces, or why it can't be taken. The work is done in a worker thread, one file at a time, which is ended
 * when it takes too long, runs out of memory or breaks. Never rejects for what is in the file; the same bytes always give the same outcome.
 */
export function importSvg(bytes: Uint8Array, options: ImportOptions = {}): Promise<ImportOutcome> {
  if (bytes.length > artworkLimits.fileBytes) return Promise.resolve(refused("file.too-large"));
  const code = refusedKinds[sniffArtwork(bytes).kind];
  if (code) return Promise.resolve(refused(code));
  const turn = queue.then(() => importInWorker(bytes, options));
  // A failed turn must not stop the ones behind it; its own caller hears of it.
  queue = turn.catch(() => undefined);
  return turn;
}

/** Ends the worker that waits for the next file, if there is one. */
export async function stopImporting(): Promise<void> {
  await queue;
  const waiting = idle;
  idle = undefined;
  await waiting?.worker.terminate();
}

async function importInWorker(bytes: Uint8Array, options: ImportOptions): Promise<ImportOutcome> {
  const { worker, files } = idle ?? { worker: await startedWorker(), files: 0 };
  idle = undefined;
  const answer = await askWorker(worker, bytes, options.timeMs ?? artworkLimits.timeMs);
  if (answer.kind === "outcome" && !answer.spent && files + 1 < filesPerWorker) idle = { worker, files: files + 1 };
  else await worker.terminate();
  if (answer.kind === "outcome") return answer.outcome;
  if (answer.kind === "late") return refused("import.too-slow");
  options.onFault?.(answer.message);
  return refused("import.failed");
}

type Answer = Exclude<WorkerAnswer, { kind: "ready" }> | { readonly kind: "late" };

/** Sends the file and waits for the answer, the worker's end or the end of the time. */
async function askWorker(worker: Worker, bytes: Uint8Array, timeMs: number): Promise<Answer> {
  // A copy of its own: a view into a larger buffer would send all of that along.
  const copy = Uint8Array.from(bytes);
  worker.postMessage(copy, [copy.buffer]);
  const answer = await nextAnswer(worker, timeMs);
  return answer.kind === "ready" ? { kind: "fault", message: "The artwork worker started twice." } : answer;
}

/** A worker that has loaded its code, so that a file's time does not pay for the start. Rejects when it can't start. */
async function startedWorker(): Promise<Worker> {
  const worker = startImportWorker();
  // An idle worker may still die; unheard, that would end the process.
  worker.on("error", () => forget(worker));
  worker.on("exit", () => forget(worker));
  const answer = await nextAnswer(worker, startMs);
  if (answer.kind === "ready") return worker;
  await worker.terminate();
  throw new Error(answer.kind === "fault" ? answer.message : "The artwork worker did not start.");
}

function forget(worker: Worker): void {
  if (idle?.worker === worker) idle = undefined;
}

/** The worker's next message. Only while one is awaited does the worker keep the process alive. */
function nextAnswer(worker: Worker, timeMs: number): Promise<WorkerAnswer | { readonly kind: "late" }> {
  return new Promise((resolve) => {
    const settle = (answer: WorkerAnswer | { readonly kind: "late" }) => {
      clearTimeout(timer);
      worker.off("message", settle).off("error", onError).off("exit", onExit);
      worker.unref();
      resolve(answer);
    };
    const onError = (error: Error) => settle({ kind: "fault", message: error.message });
    const onExit = (code: number) => settle({ kind: "fault", message: `The artwork worker ended with code ${code}.` });
    const timer = setTimeout(() => settle({ kind: "late" }), timeMs);
    worker.on("message", settle).on("error", onError).on("exit", onExit);
    worker.ref();
  });
}

const refused = (code: RefusalCode): ImportOutcome => ({ ok: false, refusal: artworkRefusal(code) });
