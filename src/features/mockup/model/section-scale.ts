import type { Figures } from "#shared/stack/figures.ts";

/** Paper mm that the section needs beside the depth itself: the wall's hatching, and balloons with their heights. */
const besidePaperMm = 36;

/**
 * How much larger depth is drawn than height, so that the stack fills a window `widthPx` wide that shows `scale` px for a mm
 * of height. Rounded down to a tenth, since the screen states it; never under a tenth.
 */
export function depthScaleFor(
  { figures, gap }: { figures: Figures; gap: number },
  { widthPx, scale, paperScale }: { widthPx: number; scale: number; paperScale: number },
): number {
  const free = widthPx / scale - besidePaperMm * paperScale;
  const deep = figures.depth.nominal + gap;
  return Math.max(0.1, Math.floor((free / Math.max(1, deep)) * 10) / 10);
}
