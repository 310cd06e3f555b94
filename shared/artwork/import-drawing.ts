import { boxContains, boxGrow } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { matrixMultiply, scaleMatrix } from "../geometry/transform.ts";
import { artworkPieces } from "./artwork-pieces.ts";
import { ArtworkBudget } from "./budget.ts";
import type { GuardedSvg } from "./guard-svg.ts";
import type { ImportedArtwork } from "./imported-artwork.ts";
import { clipLayer } from "./layer.ts";
import { artworkLimits } from "./limits.ts";
import { ArtworkRefused } from "./refusals.ts";
import { readSvgElements } from "./svg-element.ts";
import { readViewBox, viewportOf } from "./viewport.ts";
import { walkSvg } from "./walk-svg.ts";
import { artworkWarnings, type WarningCode } from "./warnings.ts";

/**
 * Small drawings are worked out at this length of their longer side: icons are often a few mm large and grow on the
 * sign, where their edges must still lie within the flattening tolerance. Larger ones are worked out at their own size.
 */
const workingLengthMm = 600;
/** Rounding in drawing programs puts edges this much outside the page without meaning it. */
const frameSlackMm = 0.05;

/**
 * The pieces of a drawing from its simplified form (groups, paths, clips, masks and gradients only, as resvg writes it)
 * and what the guard noted of the original. Same input, same output. Throws ArtworkRefused with the reason when it can't be taken.
 */
export function importDrawing(
  simplified: string,
  original: Pick<GuardedSvg, "root" | "warnings">,
  kernel: Kernel,
): ImportedArtwork {
  const { root, byId } = readSvgElements(simplified);
  // The walk counts too, but a drawing of far too many paths need not be walked first.
  if (simplified.split("<path ").length - 1 > artworkLimits.paths) throw new ArtworkRefused("svg.too-many-paths");
  const settled = readViewBox(root.attributes.viewBox);
  const viewport = settled && viewportOf(original.root, settled);
  if (!viewport) throw new ArtworkRefused("svg.no-size");
  const warnings = new Set<WarningCode>(original.warnings);
  if (viewport.warning) warnings.add(viewport.warning);

  const { widthMm, heightMm } = viewport;
  const workPerMm = Math.max(1, workingLengthMm / Math.max(widthMm, heightMm));
  const toWork = matrixMultiply(scaleMatrix(workPerMm), viewport.toMm);
  const drawn = walkSvg(root, toWork, { kernel, byId, warnings, budget: new ArtworkBudget() });

  const frame = { x: 0, y: 0, width: widthMm * workPerMm, height: heightMm * workPerMm };
  const inFrame = drawn.every(({ box }) => boxContains(boxGrow(frame, frameSlackMm), box));
  const shown = inFrame ? drawn : clipLayer(kernel, drawn, flattenPath(rectanglePath(frame)));
  const { pieces, colours, mixed } = artworkPieces(kernel, shown, 1 / workPerMm);
  if (!inFrame) warnings.add("frame.cut");
  if (mixed) warnings.add("opacity.mixed");
  if (pieces.length === 0) throw new ArtworkRefused("svg.nothing-visible");
  return { widthMm, heightMm, colours, pieces, warnings: artworkWarnings(warnings) };
}
