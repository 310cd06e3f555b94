import type { Region } from "../geometry/path.ts";
import { type Matrix, matrixMultiply } from "../geometry/transform.ts";
import { ArtworkRefused } from "./refusals.ts";
import { referenceOf, transformOf } from "./svg-element.ts";
import { boxMatrix, fillRegion, objectBox, type WalkContext } from "./walk-context.ts";
import type { XmlElement } from "./xml-text.ts";

/** References to references end here: the reader breaks circles, so deeper ones are made to hurt. */
export const deepestReference = 40;

/**
 * The area an element's `clip-path` leaves of it (CSS Masking 1, section 6): the filled shapes of the clip's children, each within
 * its own clip, within the clip's own clip. `matrix` leads from the element's user space to the working plane.
 * Null when the element has no clip; an empty region cuts everything away.
 */
export function clipRegionOf(element: XmlElement, matrix: Matrix, context: WalkContext, depth = 0): Region | null {
  const id = referenceOf(element, "clip-path");
  const clip = id === null ? undefined : context.byId.get(id);
  if (!clip) return null;
  if (depth > deepestReference) throw new ArtworkRefused("svg.too-deep");
  const inBox = clip.attributes.clipPathUnits === "objectBoundingBox";
  const unit = inBox ? boxMatrix(objectBox(element)) : null;
  if (inBox && !unit) return [];
  const own = matrixMultiply(unit ? matrixMultiply(matrix, unit) : matrix, transformOf(clip));
  const region = childrenRegion(clip, own, context, depth);
  const outer = clipRegionOf(clip, matrix, context, depth + 1);
  return outer ? context.kernel.intersect(region, outer) : region;
}

function childrenRegion(parent: XmlElement, matrix: Matrix, context: WalkContext, depth: number): Region {
  const regions = parent.children.map((child) => {
    const own = matrixMultiply(matrix, transformOf(child));
    const region = childRegion(child, own, context, depth);
    const clip = region.length > 0 ? clipRegionOf(child, own, context, depth + 1) : null;
    return clip ? context.kernel.intersect(region, clip) : region;
  });
  return regions.length === 1 && regions[0] ? regions[0] : context.kernel.union(regions.flat(), "nonzero");
}

function childRegion(child: XmlElement, matrix: Matrix, context: WalkContext, depth: number): Region {
  if (child.name === "g") return childrenRegion(child, matrix, context, depth);
  if (child.name !== "path" || child.attributes.visibility === "hidden") return [];
  context.budget.countPath();
  return fillRegion(child, child.attributes["clip-rule"] === "evenodd" ? "evenodd" : "nonzero", matrix, context);
}
