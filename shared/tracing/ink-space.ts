import type { Picture, Rgb } from "./picture.ts";

/** Numbers a pixel takes in an ink space. */
export const inkSize = 4;

/**
 * Every pixel as four numbers in which mixing at an edge is a straight line and distances are about those of RGB: brightness, two
 * differences of colour (ITU-T T.871 makes them of RGB) and opacity, all times opacity. A lossy picture keeps its differences of
 * colour at half the detail, so they count `chroma` times as much as they would.
 */
export type InkSpace = { readonly chroma: number };

/** Of a picture as it was drawn, and of one that JPEG has blurred the colours of. */
export const inkSpaceOf = ({ lossy }: { lossy: boolean }): InkSpace => ({ chroma: lossy ? 0.8 : 1 });

/** Inks of all pixels, `inkSize` numbers each. */
export function inksOf({ width, height, data }: Picture, space: InkSpace): Float32Array {
  const inks = new Float32Array(width * height * inkSize);
  for (let at = 0; at < inks.length; at += inkSize)
    writeInk(inks, at, space, data[at] ?? 0, data[at + 1] ?? 0, data[at + 2] ?? 0, data[at + 3] ?? 0);
  return inks;
}

/** The ink of each colour, `inkSize` numbers each. */
export function inksOfColours(colours: readonly Rgb[], space: InkSpace): Float32Array {
  const inks = new Float32Array(colours.length * inkSize);
  for (const [index, { red, green, blue, alpha }] of colours.entries())
    writeInk(inks, index * inkSize, space, red, green, blue, alpha);
  return inks;
}

/** Square of the distance between two inks, each where its numbers begin. */
export function inkDistance2(a: Float32Array, at: number, b: Float32Array, bt: number): number {
  const d0 = (a[at] ?? 0) - (b[bt] ?? 0);
  const d1 = (a[at + 1] ?? 0) - (b[bt + 1] ?? 0);
  const d2 = (a[at + 2] ?? 0) - (b[bt + 2] ?? 0);
  const d3 = (a[at + 3] ?? 0) - (b[bt + 3] ?? 0);
  return d0 * d0 + d1 * d1 + d2 * d2 + d3 * d3;
}

/**
 * How much of `a` is in `ink` when it is mixed of `a` and `b`, from 0 to 1, and the square of how far the best mix is off:
 * `out[0]` and `out[1]`.
 */
export function mixOf(
  ink: Float32Array,
  at: number,
  colours: Float32Array,
  a: number,
  b: number,
  out: Float64Array,
): void {
  let along = 0;
  let length = 0;
  const ia = a * inkSize;
  const ib = b * inkSize;
  for (let n = 0; n < inkSize; n++) {
    const whole = (colours[ia + n] ?? 0) - (colours[ib + n] ?? 0);
    along += whole * ((ink[at + n] ?? 0) - (colours[ib + n] ?? 0));
    length += whole * whole;
  }
  const share = length === 0 ? 1 : Math.max(0, Math.min(1, along / length));
  let off = 0;
  for (let n = 0; n < inkSize; n++) {
    const mixed = share * (colours[ia + n] ?? 0) + (1 - share) * (colours[ib + n] ?? 0);
    off += ((ink[at + n] ?? 0) - mixed) ** 2;
  }
  out[0] = share;
  out[1] = off;
}

function writeInk(
  inks: Float32Array,
  at: number,
  { chroma }: InkSpace,
  red: number,
  green: number,
  blue: number,
  alpha: number,
): void {
  const opaque = alpha / 255;
  const bright = 0.299 * red + 0.587 * green + 0.114 * blue;
  // A grey that is d brighter in all three is √3 d away in RGB.
  inks[at] = 1.732 * bright * opaque;
  inks[at + 1] = 1.25 * chroma * 0.564 * (blue - bright) * opaque;
  inks[at + 2] = 1.25 * chroma * 0.713 * (red - bright) * opaque;
  inks[at + 3] = alpha;
}
