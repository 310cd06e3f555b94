import { measureSign } from "#shared/cost/measure-sign.ts";
import { drawElevation } from "#shared/drawing/elevation.ts";
import { rules } from "#shared/dry-fit/index.ts";
import type { RuleInput } from "#shared/dry-fit/rule.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import type { GrainCache } from "./grain-cache.ts";
import type { DryFit, Picture, PictureInput } from "./picture-messages.ts";

/**
 * Figures of a document and, when all is wanted, its elevation and findings: what the screen shows, from the code that
 * draws the proof.
 */
export function drawPicture(
  { document, context, limits, paperScale, dimensions, what }: PictureInput,
  { kernel, grain }: { kernel: Kernel; grain: GrainCache },
): Picture {
  const figures = computeFigures(document, kernel);
  if (what === "figures") return { figures, drawing: null };
  const texture = grain.find(document);
  const elevation = drawElevation({
    document,
    figures,
    kernel,
    unit: context.unit,
    dimensions,
    paperScale,
    wall: true,
    ...(texture ? { texture } : {}),
  });
  grain.keep(document, elevation);
  const dryFit = fitOf({ document, figures, limits, context, kernel });
  const brads = { trim: limits.bradTrimMm, barrel: limits.footBradMm };
  const measures = measureSign({ document, figures, kernel, brads });
  return { figures, drawing: { elevation, dryFit, measures } };
}

function fitOf(input: RuleInput): DryFit {
  const findings = runDryFit(input);
  const found = new Set(findings.map(({ rule }) => rule));
  return {
    findings,
    fine: rules.filter(({ number }) => !found.has(number)).length,
  };
}
