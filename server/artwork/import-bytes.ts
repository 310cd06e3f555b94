import { guardSvg } from "#shared/artwork/guard-svg.ts";
import { importDrawing } from "#shared/artwork/import-drawing.ts";
import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { ArtworkRefused, artworkRefusal } from "#shared/artwork/refusals.ts";
import { decodeSvg } from "./decode-svg.ts";
import { loadKernel } from "./load-kernel.ts";
import { simplifySvg } from "./simplify-svg.ts";

/** Works an SVG file out in this thread, with no limit of time: the worker calls it. Faults of our own are thrown. */
export async function importBytes(bytes: Uint8Array): Promise<ImportOutcome> {
  try {
    const guarded = guardSvg(decodeSvg(bytes));
    const { simplified, warnings } = await simplifySvg(guarded);
    const kernel = await loadKernel();
    return { ok: true, artwork: importDrawing(simplified, { root: guarded.root, warnings }, kernel) };
  } catch (error) {
    if (error instanceof ArtworkRefused) return { ok: false, refusal: artworkRefusal(error.code) };
    throw error;
  }
}
