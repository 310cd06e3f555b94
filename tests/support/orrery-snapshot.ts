import { loadKernel } from "#server/artwork/load-kernel.ts";
import { drawElevation } from "#shared/drawing/elevation.ts";
import { drawSection } from "#shared/drawing/section.ts";
import { drawSheets, type Paper, paperScaleOf } from "#shared/drawing/sheet.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { engineVersion, type Snapshot } from "#shared/mockup/snapshot.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { orreryBooks, orreryFindings, orreryNotes, orreryTitleBlock } from "./orrery-books.ts";

/** What issuing "Orrery Books" would freeze, or another sign in its place. */
export async function orrerySnapshot(paper: Paper = "A3", document: MockupDocument = orreryBooks()): Promise<Snapshot> {
  const kernel = rememberingKernel(await loadKernel());
  const figures = computeFigures(document, kernel);
  const unit = "mm";
  const paperScale = paperScaleOf({ document, figures, paper, unit });
  const view = { document, figures, kernel, unit, paperScale } as const;
  const texts = { findings: orreryFindings, notes: orreryNotes, words: "ORRERY BOOKS" };
  return {
    engineVersion,
    titleBlock: orreryTitleBlock,
    document,
    figures,
    ...texts,
    drawing: {
      elevation: drawElevation({ ...view, dimensions: true, wall: false }),
      section: drawSection({ ...view, depthScale: 1 }),
      picture: drawElevation({ ...view, dimensions: false, wall: true }),
      sheets: drawSheets({ ...view, ...texts, titleBlock: orreryTitleBlock, paper }),
    },
    artworkHashes: {},
    fontHashes: {},
  };
}
