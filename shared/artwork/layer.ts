import { boxesOverlap, boxOfRegion } from "../geometry/box.ts";
import { joinAbutting } from "../geometry/join-abutting.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Region } from "../geometry/path.ts";
import { isInvisible, isOpaque, type Rgba, rgbaKey, rgbaOver } from "./rgba.ts";

/** One colour and where it shows. */
export type Patch = { readonly key: string; readonly colour: Rgba; readonly region: Region; readonly box: Box };

/** What shows of a part of the drawing: patches that do not overlap, one per colour, in the order they first came. */
export type Layer = readonly Patch[];

/** A patch, or nothing when the region is empty or the colour invisible. */
export function patchLayer(colour: Rgba, region: Region): Layer {
  const box = boxOfRegion(region);
  return box && !isInvisible(colour) ? [{ key: rgbaKey(colour), colour, region, box }] : [];
}

/** Paints layers one over the other, the first lowest, and keeps what shows of each. */
export function paintLayers(kernel: Kernel, layers: readonly Layer[]): Layer {
  return paintRange(kernel, joinRuns(kernel, layers));
}

/** Halving keeps the covers small: painting one by one would cut every patch against an ever larger cover. */
function paintRange(kernel: Kernel, layers: readonly Layer[]): Layer {
  if (layers.length <= 1) return layers[0] ?? [];
  const half = layers.length >> 1;
  return paintOver(kernel, paintRange(kernel, layers.slice(0, half)), paintRange(kernel, layers.slice(half)));
}

/** What shows when the layer `top` lies over `below`. Translucent colours mix with what they lie on. */
export function paintOver(kernel: Kernel, below: Layer, top: Layer): Layer {
  if (below.length === 0) return top;
  if (top.length === 0) return below;
  const parts = new Map<string, { colour: Rgba; regions: Region[] }>();
  const add = (colour: Rgba, region: Region) => {
    if (region.length === 0) return;
    const key = rgbaKey(colour);
    const part = parts.get(key);
    if (part) part.regions.push(region);
    else parts.set(key, { colour, regions: [region] });
  };
  const translucent = top.filter((patch) => !isOpaque(patch.colour));
  for (const patch of below) {
    // What lies under its own colour still shows as that colour, so that part need not be cut.
    const covers = top.filter(
      (cover) => boxesOverlap(cover.box, patch.box) && !(cover.key === patch.key && isOpaque(cover.colour)),
    );
    add(patch.colour, covers.length === 0 ? patch.region : kernel.difference(patch.region, regionOf(kernel, covers)));
    for (const cover of covers) {
      if (isOpaque(cover.colour)) continue;
      add(rgbaOver(cover.colour, patch.colour), kernel.intersect(patch.region, cover.region));
    }
  }
  for (const patch of top) {
    if (!translucent.includes(patch)) add(patch.colour, patch.region);
    else {
      const bases = below.filter((base) => boxesOverlap(base.box, patch.box));
      add(patch.colour, bases.length === 0 ? patch.region : kernel.difference(patch.region, regionOf(kernel, bases)));
    }
  }
  return layerOf(kernel, [...parts.values()]);
}

/** What shows of a layer inside a region. */
export function clipLayer(kernel: Kernel, layer: Layer, clip: Region): Layer {
  return layer.flatMap((patch) => patchLayer(patch.colour, kernel.intersect(patch.region, clip)));
}

/** The layer with every colour covering `factor` as much. */
export function fadeLayer(layer: Layer, factor: number): Layer {
  return layer.flatMap((patch) => patchLayer({ ...patch.colour, a: patch.colour.a * factor }, patch.region));
}

/** All a layer covers, whatever the colour. */
function regionOf(kernel: Kernel, layer: Layer): Region {
  return joinAbutting(
    kernel,
    layer.map((patch) => patch.region),
  );
}

/** Joins the regions of each colour into one patch without inner seams. */
export function layerOf(
  kernel: Kernel,
  parts: readonly { readonly colour: Rgba; readonly regions: readonly Region[] }[],
): Layer {
  return parts.flatMap(({ colour, regions }) => patchLayer(colour, joinAbutting(kernel, regions)));
}

/** Neighbours in paint order of one opaque colour become one layer by a single union. */
function joinRuns(kernel: Kernel, layers: readonly Layer[]): Layer[] {
  const joined: Layer[] = [];
  let run: Patch[] = [];
  const close = () => {
    const [first] = run;
    if (first)
      joined.push(
        run.length === 1
          ? run
          : patchLayer(
              first.colour,
              kernel.union(
                run.flatMap(({ region }) => region),
                "nonzero",
              ),
            ),
      );
    run = [];
  };
  for (const layer of layers) {
    const [patch] = layer;
    if (layer.length === 1 && patch && isOpaque(patch.colour)) {
      if (run[0] && run[0].key !== patch.key) close();
      run.push(patch);
    } else if (layer.length > 0) {
      close();
      joined.push(layer);
    }
  }
  close();
  return joined;
}
