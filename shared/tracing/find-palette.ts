import { flatPixels } from "./flat-pixels.ts";
import { groupColours } from "./group-colours.ts";
import { type InkSpace, inkDistance2, inkSize, inksOfColours } from "./ink-space.ts";
import { mergeColours } from "./merge-colours.ts";
import type { Picture, Rgb } from "./picture.ts";
import { unexplainedColours } from "./unexplained-colours.ts";

/**
 * The colours a picture was drawn in. Pixels are recognised by `shades`, each of which belongs to one of the `colours`: those stay apart
 * when a maker wants fewer colours, so that a pixel is never taken for a mix because its colour was joined to another.
 */
export type Palette = {
  /** Most frequent first; "no colour" is one of them where the picture is transparent. */
  readonly colours: readonly Rgb[];
  readonly shades: readonly Rgb[];
  /** For each shade the place of its colour. */
  readonly colourOf: readonly number[];
  /** Share of the flat pixels that have no shade's colour: what runs from colour to colour. */
  readonly blurred: number;
};

/** Most colours that may be asked for, and most that are found unasked. */
export const mostColours = 24;
const mostShades = 40;
/** Fewer flat pixels than this share of the picture, or this many, are no colour of their own. */
const leastShare = 0.00012;
const leastPixels = 24;
/**
 * In RGB: nearer than this, two shades are one that noise has spread, and two colours one; farther than this from every mix, a colour is a
 * stroke's own; farther than this from its shade, a flat pixel is part of a gradient.
 */
const drawn = { shade: 14, colour: 20, unexplained: 40, blurred: 4 };
const lossyNoise = { shade: 28, colour: 28, unexplained: 60, blurred: 11 };

/**
 * The palette from a picture's flat pixels, and from thin strokes that no mix of two others explains. With `most`, the nearest colours are
 * joined until so many are left ("no colour" not counted); null leaves those that are clearly apart.
 */
export function findPalette(
  picture: Picture,
  inks: Float32Array,
  space: InkSpace,
  { most, lossy }: { most: number | null; lossy: boolean },
): Palette {
  const noise = lossy ? lossyNoise : drawn;
  const flat = flatPixels(picture);
  const least = Math.max(leastPixels, picture.width * picture.height * leastShare);
  const found = mergeColours(groupColours(picture, flat, noise.shade), { nearest: noise.shade, most: mostShades });
  const common = found.filter(({ count }) => count >= least);
  const kept = common.length > 0 ? common : found.slice(0, 1);
  const rare = unexplainedColours(picture, inks, space, {
    known: kept.map(({ colour }) => colour),
    off: noise.unexplained,
    least: lossy ? least : least / 2,
    lossy,
  });
  const shades = [...kept, ...rare];
  const asked = most ?? mostColours;
  const merged = mergeColours(shades, { nearest: most === null ? noise.colour : 0, most: asked });
  const shadeColours = shades.map(({ colour }) => colour);
  return {
    colours: merged.map(({ colour }) => colour),
    shades: shadeColours,
    colourOf: shades.map((_, shade) => merged.findIndex(({ of }) => of.includes(shade))),
    blurred: blurredShare(flat, inks, inksOfColours(shadeColours, space), noise.blurred),
  };
}

/** Share of the flat pixels farther than `off` from every shade. */
function blurredShare(flat: Uint8Array, inks: Float32Array, shades: Float32Array, off: number): number {
  let blurred = 0;
  let all = 0;
  for (let pixel = 0; pixel < flat.length; pixel++) {
    if (flat[pixel] !== 1) continue;
    all++;
    let near = false;
    for (let at = 0; at < shades.length && !near; at += inkSize)
      near = inkDistance2(inks, pixel * inkSize, shades, at) <= off * off;
    if (!near) blurred++;
  }
  return all === 0 ? 0 : blurred / all;
}
