import { forTheClient } from "../dry-fit/for-the-client.ts";
import type { Limits } from "../dry-fit/limits.ts";
import type { DryFitContext } from "../dry-fit/rule.ts";
import { runDryFit } from "../dry-fit/run-dry-fit.ts";
import { type FrozenSetAside, matchSetAsides, openFindings, setAsidesInForce } from "../dry-fit/set-aside.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { rememberingKernel } from "../geometry/remembering-kernel.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { engineVersion, type FrozenNote, type Snapshot, type TitleBlock } from "../mockup/snapshot.ts";
import { computeFigures } from "../stack/compute-figures.ts";
import { paperScaleOfSheet } from "./board-zones.ts";
import { drawElevation } from "./elevation.ts";
import { drawSection } from "./section.ts";
import { drawSheets, type Paper } from "./sheet.ts";

/** Everything a revision freezes, computed from one document at one moment. */
export function buildSnapshot({
  titleBlock,
  document,
  notes,
  words,
  limits,
  dryFit,
  setAsides,
  paper,
  artworkHashes,
  photoHashes = {},
  fontHashes,
  kernel: given,
}: {
  titleBlock: TitleBlock;
  document: MockupDocument;
  notes: readonly FrozenNote[];
  words: string;
  limits: Limits;
  dryFit: DryFitContext;
  /** All of the job; those that are bound to what is found are frozen. */
  setAsides: readonly FrozenSetAside[];
  paper: Paper;
  artworkHashes: Readonly<Record<string, string>>;
  photoHashes?: Readonly<Record<string, string>>;
  fontHashes: Readonly<Record<string, string>>;
  kernel: Kernel;
}): Snapshot {
  const { unit } = titleBlock;
  // Sheets, elevation and picture show the same wood and ask for the same geometry.
  const kernel = rememberingKernel(given);
  const figures = computeFigures(document, kernel);
  const findings = runDryFit({ document, figures, limits, context: dryFit, kernel });
  const standings = matchSetAsides(findings, setAsides);
  // What was set aside, and what is about the making, is the shop's affair: the sheets, which go to the client, are drawn without it.
  const sheets = drawSheets({
    titleBlock,
    document,
    figures,
    findings: forTheClient(openFindings(standings)),
    notes,
    words,
    unit,
    paper,
    kernel,
  });
  const paperScale = sheets[0] ? paperScaleOfSheet(sheets[0]) : 1;
  const view = { document, figures, kernel, unit, paperScale };
  return {
    engineVersion,
    titleBlock,
    document,
    figures,
    findings,
    setAside: setAsidesInForce(standings),
    notes,
    words,
    drawing: {
      elevation: drawElevation({ ...view, dimensions: true, wall: false }),
      section: drawSection({ document, figures, unit, paperScale, depthScale: 1 }),
      picture: drawElevation({ ...view, dimensions: false, wall: true }),
      sheets,
    },
    artworkHashes,
    photoHashes,
    fontHashes,
  };
}
