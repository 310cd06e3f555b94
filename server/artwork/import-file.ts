import { artworkLimits } from "#shared/artwork/limits.ts";
import { artworkRefusal, type RefusalCode } from "#shared/artwork/refusals.ts";
import { firstChoices, type TraceChoices } from "#shared/tracing/trace-choices.ts";
import { workerInTurn } from "../threads/worker-in-turn.ts";
import type { ImportedFile, ImportQuestion } from "./import-bytes.ts";
import { type ArtworkKind, sniffArtwork } from "./sniff-artwork.ts";

export type ImportOptions = {
  /** How a picture is traced: as at first unless said otherwise. */
  readonly choices?: TraceChoices;
  /** Milliseconds a file may take: 5,000 for a drawing and 60,000 for a picture unless said otherwise. */
  readonly timeMs?: number;
  /** Hears what went wrong on our side when a file is refused with import.failed. */
  readonly onFault?: (message: string) => void;
};

const refusedKinds: Readonly<Partial<Record<ArtworkKind, RefusalCode>>> = {
  empty: "file.empty",
  unknown: "file.unknown",
};

const program = {
  bundle: "import-worker.mjs",
  source: "../artwork/import-worker.ts",
  memoryMb: artworkLimits.memoryMb,
} as const;
// WebAssembly memory never shrinks, so a worker is replaced after this many files.
const worker = workerInTurn<ImportQuestion, ImportedFile>(program, { questionsEach: 100 });

/**
 * A drawing or a picture as pieces, or why it can't be taken. The work is done in a worker thread, one file at a time, which is ended
 * when it takes too long, runs out of memory or breaks. Never rejects for what is in the file; the same bytes always give the same outcome.
 */
export async function importFile(bytes: Uint8Array, options: ImportOptions = {}): Promise<ImportedFile> {
  if (bytes.length > artworkLimits.fileBytes) return refused("file.too-large");
  const { kind } = sniffArtwork(bytes);
  const code = refusedKinds[kind];
  if (code) return refused(code);
  // A copy of its own: a view into a larger buffer would send all of that along.
  const copy = Uint8Array.from(bytes);
  const isPicture = kind === "png" || kind === "jpeg";
  const usualMs = isPicture ? artworkLimits.pictureTimeMs : artworkLimits.timeMs;
  const question = { bytes: copy, choices: options.choices ?? firstChoices };
  const told = await worker.ask(question, { timeMs: options.timeMs ?? usualMs, transfer: [copy.buffer] });
  if (told.kind === "answer") return told.answer;
  if (told.kind === "late") return refused(isPicture ? "picture.too-slow" : "import.too-slow");
  options.onFault?.(told.message);
  return refused("import.failed");
}

/** Ends the worker that waits for the next file, if there is one. */
export const stopImporting = (): Promise<void> => worker.stop();

const refused = (code: RefusalCode): ImportedFile => ({ ok: false, refusal: artworkRefusal(code) });
