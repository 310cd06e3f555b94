import type { Kernel } from "../geometry/kernel.ts";
import { standardAcrylics, standardStandoffs } from "../materials/standard-stock.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import type { Finding, Severity } from "./finding.ts";
import type { Limits } from "./limits.ts";
import type { DryFitContext, Rule } from "./rule.ts";
import { bed } from "./rules/bed.ts";
import { colourAgainstArtwork } from "./rules/colour-against-artwork.ts";
import { grip } from "./rules/grip.ts";
import { holeToEdge } from "./rules/hole-to-edge.ts";
import { holeWindow } from "./rules/hole-window.ts";
import { locate } from "./rules/locate.ts";
import { mixedSupport } from "./rules/mixed-support.ts";
import { outsideBoard } from "./rules/outside-board.ts";
import { screwInBarrel } from "./rules/screw-in-barrel.ts";
import { thinStroke } from "./rules/thin-stroke.ts";
import { unsupported } from "./rules/unsupported.ts";

/** Every rule there is. A new one is added here and nowhere else. */
export const rules: readonly Rule[] = [
  unsupported,
  mixedSupport,
  thinStroke,
  holeWindow,
  holeToEdge,
  grip,
  screwInBarrel,
  locate,
  bed,
  colourAgainstArtwork,
  outsideBoard,
];

/** A shop that works in mm, inside, with the standard stock. */
export const usualContext: DryFitContext = {
  unit: "mm",
  place: "inside",
  acrylics: standardAcrylics.map(({ acrylic }) => acrylic),
  barrels: standardStandoffs,
};

const rank: Readonly<Record<Severity, number>> = { stop: 0, caution: 1, remark: 2 };

/**
 * Every rule on one sign. `figures` are the document's own. Stops first, then cautions, then remarks; within them by rule, and then from the
 * top of the board down and from left to right.
 */
export function runDryFit(
  document: MockupDocument,
  figures: Figures,
  limits: Limits,
  context: DryFitContext,
  kernel: Kernel,
): Finding[] {
  const input = { document, figures, limits, context, kernel };
  return rules.flatMap((rule) => rule.check(input)).toSorted(compareFindings);
}

function compareFindings(a: Finding, b: Finding): number {
  return (
    rank[a.severity] - rank[b.severity] ||
    a.rule - b.rule ||
    (a.where?.y ?? 0) - (b.where?.y ?? 0) ||
    (a.where?.x ?? 0) - (b.where?.x ?? 0) ||
    compareTexts(a.layerKey ?? "", b.layerKey ?? "") ||
    compareTexts(a.pieceIds[0] ?? a.holeId ?? "", b.pieceIds[0] ?? b.holeId ?? "")
  );
}

function compareTexts(a: string, b: string): number {
  if (a === b) return 0;
  return a < b ? -1 : 1;
}
