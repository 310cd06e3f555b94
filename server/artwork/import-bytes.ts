import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { ArtworkRefused, artworkRefusal } from "#shared/artwork/refusals.ts";
import { decodeSvg } from "./decode-svg.ts";
import { importPdf } from "./import-pdf.ts";
import { importSvgText } from "./import-svg-text.ts";
import { sniffArtwork } from "./sniff-artwork.ts";

/** Works a drawing out in this thread, with no limit of time: the worker calls it. Faults of our own are thrown. */
export async function importBytes(bytes: Uint8Array): Promise<ImportOutcome> {
  try {
    if (sniffArtwork(bytes).kind === "pdf") return { ok: true, artwork: await importPdf(bytes) };
    return { ok: true, artwork: await importSvgText(decodeSvg(bytes)) };
  } catch (error) {
    if (error instanceof ArtworkRefused) return { ok: false, refusal: artworkRefusal(error.code) };
    throw error;
  }
}
