import { inkDistance2, inkSize, mixOf } from "./ink-space.ts";
import { isBetweenNeighbours } from "./is-between-neighbours.ts";
import type { Picture } from "./picture.ts";

/**
 * What each pixel is made of: the colour it shows most of, the one mixed in at an edge, and how much of the first is in it (from a half
 * to 1). Colours by their place in the palette.
 */
export type Labels = {
  readonly width: number;
  readonly height: number;
  readonly first: Uint8Array;
  readonly second: Uint8Array;
  readonly share: Float32Array;
};

/** A pixel this near a colour shows it, unless its neighbours make it a mix; a lossy picture strays farther. */
const sure = 16;
const sureLossy = 30;
const noLabel = 255;
const reaches = [2, 4];

/**
 * Every pixel's colour. At an edge it is a mix of two colours that lie near, never a third one that happens to look like the mix:
 * so the seams of smoothed edges do not become colours of their own.
 */
export function labelPixels(
  { width, height }: Picture,
  inks: Float32Array,
  colours: Float32Array,
  { lossy }: { lossy: boolean },
): Labels {
  const pixels = width * height;
  const count = colours.length / inkSize;
  const first = new Uint8Array(pixels);
  const second = new Uint8Array(pixels);
  const share = new Float32Array(pixels).fill(1);
  const anchors = new Uint8Array(pixels).fill(noLabel);
  const limit = (lossy ? sureLossy : sure) ** 2;
  let nearest = 0;
  let least = Number.POSITIVE_INFINITY;
  for (let pixel = 0; pixel < pixels; pixel++) {
    // In drawn pictures most pixels are as the one before.
    if (pixel === 0 || inkDistance2(inks, pixel * inkSize, inks, (pixel - 1) * inkSize) > 0) {
      least = Number.POSITIVE_INFINITY;
      for (let colour = 0; colour < count; colour++) {
        const away = inkDistance2(inks, pixel * inkSize, colours, colour * inkSize);
        if (away >= least) continue;
        least = away;
        nearest = colour;
      }
    }
    first[pixel] = second[pixel] = nearest;
    if (least <= limit && !isBetweenNeighbours(inks, pixel, { width, height, lossy })) anchors[pixel] = nearest;
  }
  const mix = new Float64Array(2);
  const near: number[] = [];
  for (let pixel = 0; pixel < pixels; pixel++) {
    if (anchors[pixel] !== noLabel) continue;
    collectNear(anchors, pixel, width, height, near);
    if (near.length === 0) continue;
    let best = Number.POSITIVE_INFINITY;
    for (const [place, a] of near.entries()) {
      for (let next = near.length === 1 ? place : place + 1; next < near.length; next++) {
        const b = near[next] ?? a;
        mixOf(inks, pixel * inkSize, colours, a, b, mix);
        const off = mix[1] ?? 0;
        if (off >= best) continue;
        best = off;
        const part = mix[0] ?? 1;
        first[pixel] = part >= 0.5 ? a : b;
        second[pixel] = part >= 0.5 ? b : a;
        share[pixel] = Math.max(part, 1 - part);
      }
    }
  }
  return { width, height, first, second, share };
}

/** Colours that pixels near this one show for sure, in the order of the palette: within the first reach that holds any. */
function collectNear(anchors: Uint8Array, pixel: number, width: number, height: number, near: number[]): void {
  const x = pixel % width;
  const y = (pixel - x) / width;
  near.length = 0;
  for (const reach of reaches) {
    for (let row = Math.max(0, y - reach); row <= Math.min(height - 1, y + reach); row++) {
      for (let column = Math.max(0, x - reach); column <= Math.min(width - 1, x + reach); column++) {
        const label = anchors[row * width + column] ?? noLabel;
        if (label !== noLabel && !near.includes(label)) near.push(label);
      }
    }
    if (near.length > 0) break;
  }
  near.sort((a, b) => a - b);
}

/** The labels with every colour replaced: `become` gives the new one for each. */
export function relabelled(labels: Labels, become: readonly number[]): Labels {
  const first = labels.first.map((label) => become[label] ?? label);
  const second = labels.second.map((label) => become[label] ?? label);
  return {
    ...labels,
    first,
    second,
    share: labels.share.map((part, pixel) => (first[pixel] === second[pixel] ? 1 : part)),
  };
}
