import type { ArtworkRefusal, ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import { ArtworkRefused, artworkRefusal } from "#shared/artwork/refusals.ts";
import { firstChoices, type TraceChoices } from "#shared/tracing/trace-choices.ts";
import { tracePicture } from "#shared/tracing/trace-picture.ts";
import type { TraceRecord } from "#shared/tracing/traced-picture.ts";
import { decodeSvg } from "./decode-svg.ts";
import { importPdf } from "./import-pdf.ts";
import { importSvgText } from "./import-svg-text.ts";
import { readPicture } from "./read-picture.ts";
import { sniffArtwork } from "./sniff-artwork.ts";

/** A file, and how to trace it if it is a picture. */
export type ImportQuestion = { readonly bytes: Uint8Array; readonly choices: TraceChoices };

/** What a file became; `trace` says how, when it is a picture. */
export type ImportedFile =
  | { readonly ok: true; readonly artwork: ImportedArtwork; readonly trace: TraceRecord | null }
  | { readonly ok: false; readonly refusal: ArtworkRefusal };

/** Works a file out in this thread, with no limit of time: the worker calls it. Faults of our own are thrown. */
export async function importBytes(bytes: Uint8Array, choices: TraceChoices = firstChoices): Promise<ImportedFile> {
  try {
    const { kind } = sniffArtwork(bytes);
    if (kind === "png" || kind === "jpeg") {
      const { artwork, record } = tracePicture(await readPicture(bytes), choices);
      return { ok: true, artwork, trace: record };
    }
    const artwork = kind === "pdf" ? await importPdf(bytes) : await importSvgText(decodeSvg(bytes));
    return { ok: true, artwork, trace: null };
  } catch (error) {
    if (error instanceof ArtworkRefused) return { ok: false, refusal: artworkRefusal(error.code) };
    throw error;
  }
}
