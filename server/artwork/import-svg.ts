import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { artworkLimits } from "#shared/artwork/limits.ts";
import { artworkRefusal, type RefusalCode } from "#shared/artwork/refusals.ts";
import { workerInTurn } from "../threads/worker-in-turn.ts";
import { type ArtworkKind, sniffArtwork } from "./sniff-artwork.ts";

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
  unknown: "file.unknown",
};

const program = {
  bundle: "import-worker.mjs",
  source: "../artwork/import-worker.ts",
  memoryMb: artworkLimits.memoryMb,
} as const;
// WebAssembly memory never shrinks, so a worker is replaced after this many files.
const worker = workerInTurn<Uint8Array, ImportOutcome>(program, { questionsEach: 100 });

/**
 * An SVG file as pieces, or why it can't be taken. The work is done in a worker thread, one file at a time, which is ended
 * when it takes too long, runs out of memory or breaks. Never rejects for what is in the file; the same bytes always give the same outcome.
 */
export async function importSvg(bytes: Uint8Array, options: ImportOptions = {}): Promise<ImportOutcome> {
  if (bytes.length > artworkLimits.fileBytes) return refused("file.too-large");
  const code = refusedKinds[sniffArtwork(bytes).kind];
  if (code) return refused(code);
  // A copy of its own: a view into a larger buffer would send all of that along.
  const copy = Uint8Array.from(bytes);
  const told = await worker.ask(copy, { timeMs: options.timeMs ?? artworkLimits.timeMs, transfer: [copy.buffer] });
  if (told.kind === "answer") return told.answer;
  if (told.kind === "late") return refused("import.too-slow");
  options.onFault?.(told.message);
  return refused("import.failed");
}

/** Ends the worker that waits for the next file, if there is one. */
export const stopImporting = (): Promise<void> => worker.stop();

const refused = (code: RefusalCode): ImportOutcome => ({ ok: false, refusal: artworkRefusal(code) });
