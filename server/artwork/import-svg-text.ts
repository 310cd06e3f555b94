import { guardSvg } from "#shared/artwork/guard-svg.ts";
import { importDrawing } from "#shared/artwork/import-drawing.ts";
import type { ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import type { WarningCode } from "#shared/artwork/warnings.ts";
import { loadKernel } from "./load-kernel.ts";
import { simplifySvg } from "./simplify-svg.ts";

/**
 * The pieces of a drawing in SVG, with what is to be said beside what its own reading finds. Throws ArtworkRefused with
 * the reason when it can't be taken.
 */
export async function importSvgText(
  text: string,
  said: ReadonlySet<WarningCode> = new Set(),
): Promise<ImportedArtwork> {
  const guarded = guardSvg(text);
  const { simplified, warnings } = await simplifySvg(guarded);
  const kernel = await loadKernel();
  return importDrawing(simplified, { root: guarded.root, warnings: new Set([...warnings, ...said]) }, kernel);
}
