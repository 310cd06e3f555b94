import type { ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import { drawPage } from "#shared/artwork/pdf/draw-page.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";
import { importSvgText } from "./import-svg-text.ts";
import { readPdf } from "./read-pdf.ts";

/**
 * The pieces of a PDF's first page in its true size: its operations become an SVG text that goes the way of every SVG.
 * Throws ArtworkRefused with the reason when it can't be taken.
 */
export async function importPdf(bytes: Uint8Array): Promise<ImportedArtwork> {
  const { page, pages, warnings } = await readPdf(bytes);
  const drawn = drawPage(page);
  const said = new Set([...warnings, ...drawn.warnings]);
  try {
    const artwork = await importSvgText(drawn.svg, said);
    return pages === 1 ? artwork : { ...artwork, warnings: [otherPages(pages), ...artwork.warnings] };
  } catch (error) {
    const showsNothing = error instanceof ArtworkRefused && error.code === "svg.nothing-visible";
    throw showsNothing && said.has("image.left-out") ? new ArtworkRefused("pdf.only-pictures") : error;
  }
}

const otherPages = (pages: number) => ({
  code: "pdf.other-pages",
  text: `The PDF has ${pages} pages. The first one was taken; save another as a file of its own to bring it in.`,
});
