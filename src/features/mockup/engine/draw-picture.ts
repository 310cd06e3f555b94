import { drawElevation } from "#shared/drawing/elevation.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { rules } from "#shared/dry-fit/index.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import type { DryFit, Picture, PictureInput } from "./picture-messages.ts";

/** Figures, elevation and findings of a document: what the screen shows, from the code that draws the proof. */
export function drawPicture({ document, context, paperScale, dryFit }: PictureInput, kernel: Kernel): Picture {
  const figures = computeFigures(document, kernel);
  const elevation = drawElevation({
    document,
    figures,
    kernel,
    unit: context.unit,
    dimensions: true,
    paperScale,
    wall: true,
  });
  return {
    figures,
    elevation,
    dryFit: dryFit ? fitOf(runDryFit({ document, figures, limits: defaultLimits, context, kernel })) : null,
  };
}

function fitOf(findings: readonly Finding[]): DryFit {
  const found = new Set(findings.map(({ rule }) => rule));
  return { findings, fine: rules.filter(({ number }) => !found.has(number)).length };
}
