import { flattenPath } from "../geometry/flatten.ts";
import { subpathsFromText } from "../geometry/path-text.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { type Matrix, matrixMultiply, pathTransform } from "../geometry/transform.ts";
import { clipRegionOf, deepestReference } from "./clip-region.ts";
import { clipLayer, fadeLayer, type Layer, layerOf, paintLayers, patchLayer } from "./layer.ts";
import { paintOf } from "./paint.ts";
import { ArtworkRefused } from "./refusals.ts";
import { isInvisible, isOpaque, maskLuminance } from "./rgba.ts";
import { type StrokeStyle, strokeRegion } from "./stroke-region.ts";
import { numberOf, referenceOf, transformOf } from "./svg-element.ts";
import { boxMatrix, fillRegion, isNear, objectBox, type WalkContext } from "./walk-context.ts";
import type { XmlElement } from "./xml-text.ts";

/**
 * What shows of a simplified drawing, as patches on the working plane that `matrix` leads to. Colours of groups, clips,
 * masks and opacities are resolved; what can't be shown as flat colour is added to the context's warnings.
 * Throws ArtworkRefused when the drawing passes a limit.
 */
export function walkSvg(root: XmlElement, matrix: Matrix, context: WalkContext): Layer {
  return paintLayers(
    context.kernel,
    root.children.flatMap((child) => elementLayers(child, matrix, context, 0)),
  );
}

/** The layers of one element in paint order, the lowest first. */
function elementLayers(element: XmlElement, outer: Matrix, context: WalkContext, depth: number): Layer[] {
  const matrix = matrixMultiply(outer, transformOf(element));
  noteEffects(element, context);
  const layers = ownLayers(element, matrix, context, depth);
  const opacity = numberOf(element, "opacity", 1);
  const clip = clipRegionOf(element, matrix, context);
  const mask = referenceOf(element, "mask") === null ? null : maskLayerOf(element, matrix, context, depth);
  if (!clip && !mask && opacity >= 1) return layers;

  let layer = paintLayers(context.kernel, layers);
  if (clip) layer = clipLayer(context.kernel, layer, clip);
  if (mask) layer = throughMask(layer, mask, context);
  if (opacity < 1) layer = fadeLayer(layer, Math.max(0, opacity));
  return [layer];
}

function ownLayers(element: XmlElement, matrix: Matrix, context: WalkContext, depth: number): Layer[] {
  if (element.name === "g") return element.children.flatMap((child) => elementLayers(child, matrix, context, depth));
  if (element.name === "image") {
    if (element.attributes.visibility !== "hidden") context.warnings.add("image.left-out");
    return [];
  }
  if (element.name !== "path" || element.attributes.visibility === "hidden") return [];
  context.budget.countPath();
  const fill = fillLayer(element, matrix, context);
  const stroke = strokeLayer(element, matrix, context);
  return /^\s*stroke/.test(element.attributes["paint-order"] ?? "") ? [stroke, fill] : [fill, stroke];
}

function fillLayer(element: XmlElement, matrix: Matrix, context: WalkContext): Layer {
  const colour = paintOf(element, "fill", context);
  if (!colour) return [];
  const rule = element.attributes["fill-rule"] === "evenodd" ? "evenodd" : "nonzero";
  return patchLayer(colour, fillRegion(element, rule, matrix, context));
}

function strokeLayer(element: XmlElement, matrix: Matrix, context: WalkContext): Layer {
  const colour = paintOf(element, "stroke", context);
  const style = strokeStyleOf(element);
  const subpaths = subpathsFromText(element.attributes.d ?? "") ?? [];
  if (!colour || !(style.width > 0)) return [];
  if (!isNear(pathTransform(subpaths, matrix))) {
    context.warnings.add("shape.too-far");
    return [];
  }
  return patchLayer(colour, strokeRegion(context.kernel, subpaths, { matrix, style, budget: context.budget }));
}

function strokeStyleOf(element: XmlElement): StrokeStyle {
  const join = element.attributes["stroke-linejoin"];
  const cap = element.attributes["stroke-linecap"];
  return {
    width: numberOf(element, "stroke-width", 1),
    join: join === "round" || join === "bevel" ? join : "mitre",
    cap: cap === "round" || cap === "square" ? cap : "butt",
    mitreLimit: Math.max(1, numberOf(element, "stroke-miterlimit", 4)),
    dashes: (element.attributes["stroke-dasharray"] ?? "")
      .split(/[\s,]+/)
      .filter(Boolean)
      .map(Number)
      .filter(Number.isFinite),
    dashOffset: numberOf(element, "stroke-dashoffset", 0),
  };
}

/** The mask of an element as a layer whose colours' `a` says how much it lets through (CSS Masking 1, section 7). */
function maskLayerOf(element: XmlElement, matrix: Matrix, context: WalkContext, depth: number): Layer | null {
  const mask = context.byId.get(referenceOf(element, "mask") ?? "");
  if (!mask) return null;
  if (depth > deepestReference) throw new ArtworkRefused("svg.too-deep");
  const unit = boxMatrix(objectBox(element));
  const frameInBox = mask.attributes.maskUnits !== "userSpaceOnUse";
  const contentInBox = mask.attributes.maskContentUnits === "objectBoundingBox";
  if ((frameInBox || contentInBox) && !unit) return [];
  const inBox = unit ? matrixMultiply(matrix, unit) : matrix;

  const content = mask.children.flatMap((child) =>
    elementLayers(child, contentInBox ? inBox : matrix, context, depth + 1),
  );
  const frame = rectanglePath({
    x: numberOf(mask, "x", -0.1),
    y: numberOf(mask, "y", -0.1),
    width: numberOf(mask, "width", 1.2),
    height: numberOf(mask, "height", 1.2),
  });
  const frameRegion = context.kernel.union(flattenPath(pathTransform(frame, frameInBox ? inBox : matrix)), "nonzero");
  const byAlpha = mask.attributes["mask-type"] === "alpha" || /mask-type\s*:\s*alpha/.test(mask.attributes.style ?? "");
  const layer = clipLayer(context.kernel, paintLayers(context.kernel, content), frameRegion).flatMap((patch) =>
    patchLayer({ ...patch.colour, a: patch.colour.a * (byAlpha ? 1 : maskLuminance(patch.colour)) }, patch.region),
  );
  const nested = referenceOf(mask, "mask") === null ? null : maskLayerOf(mask, matrix, context, depth + 1);
  return nested ? throughMask(layer, nested, context) : layer;
}

function throughMask(layer: Layer, mask: Layer, context: WalkContext): Layer {
  const parts = mask.flatMap((window) => {
    if (isInvisible(window.colour)) return [];
    if (!isOpaque(window.colour)) context.warnings.add("mask.soft");
    return fadeLayer(clipLayer(context.kernel, layer, window.region), isOpaque(window.colour) ? 1 : window.colour.a);
  });
  const byKey = new Map<string, { colour: Layer[number]["colour"]; regions: Layer[number]["region"][] }>();
  for (const { key, colour, region } of parts) {
    const part = byKey.get(key);
    if (part) part.regions.push(region);
    else byKey.set(key, { colour, regions: [region] });
  }
  return layerOf(context.kernel, [...byKey.values()]);
}

function noteEffects(element: XmlElement, context: WalkContext): void {
  if (element.attributes.filter !== undefined && element.attributes.filter !== "none")
    context.warnings.add("filter.ignored");
  const blend = /mix-blend-mode\s*:\s*([a-z-]+)/.exec(element.attributes.style ?? "")?.[1];
  if (blend !== undefined && blend !== "normal") context.warnings.add("blend.ignored");
}
