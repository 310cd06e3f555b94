import type { Figures } from "#shared/stack/figures.ts";
import type { BandWording } from "#shared/units/format-band.ts";

/** Paper mm that the section needs beside the depth itself: the wall's hatching, and balloons with their heights. */
const besidePaperMm: Readonly<Record<BandWording, number>> = { nominal: 36, "with bands": 51 };

/** Scales that are easily said, so that the screen can state its own. */
const steps = [12, 10, 8, 6, 5, 4, 3.5, 3, 2.5, 2, 1.5, 1.2, 1, 0.8, 0.6, 0.5, 0.4, 0.3, 0.2, 0.1];

/**
 * How much larger depth is drawn than height, so that the stack fills a window `widthPx` wide that shows `scale` px for a mm
 * of height: the largest step that fits, never under a tenth.
 */
export function depthScaleFor(
  { figures, gap }: { figures: Pick<Figures, "depth">; gap: number },
  {
    widthPx,
    scale,
    paperScale,
    heights = "nominal",
  }: { widthPx: number; scale: number; paperScale: number; heights?: BandWording },
): number {
  const free = widthPx / scale - besidePaperMm[heights] * paperScale;
  const deep = Math.max(1, figures.depth.nominal + gap);
  return steps.find((step) => step * deep <= free) ?? 0.1;
}
