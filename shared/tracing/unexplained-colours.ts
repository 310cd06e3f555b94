import { type ColourCount, groupColours } from "./group-colours.ts";
import { type InkSpace, inkDistance2, inkSize, inksOfColours, mixOf } from "./ink-space.ts";
import { isBetweenNeighbours } from "./is-between-neighbours.ts";
import type { Picture, Rgb } from "./picture.ts";

/** More rounds would only find noise. */
const mostColours = 8;

/**
 * Colours of thin strokes, which have no flat pixel: of the pixels that differ by more than `off` from every mix of two known
 * colours, and from every mix of the pixels beside them, the most frequent colour again and again, while `least` pixels or more have it.
 */
export function unexplainedColours(
  picture: Picture,
  inks: Float32Array,
  space: InkSpace,
  { known, off, least, lossy }: { known: readonly Rgb[]; off: number; least: number; lossy: boolean },
): ColourCount[] {
  const colours = [...known];
  const added: ColourCount[] = [];
  const open = new Uint8Array(picture.width * picture.height).fill(1);
  while (added.length < mostColours) {
    markUnexplained(picture, inks, inksOfColours(colours, space), { off, lossy }, open);
    const [best] = groupColours(picture, open, 28).filter(({ colour }) => colour.alpha > 127);
    if (!best || best.count < least) return added;
    colours.push(best.colour);
    added.push(best);
  }
  return added;
}

/** Clears the mark of every pixel that the colours explain. */
function markUnexplained(
  { width, height }: Picture,
  inks: Float32Array,
  colours: Float32Array,
  { off, lossy }: { off: number; lossy: boolean },
  open: Uint8Array,
): void {
  const count = colours.length / inkSize;
  const mix = new Float64Array(2);
  for (let pixel = 0; pixel < open.length; pixel++) {
    if (open[pixel] !== 1) continue;
    const at = pixel * inkSize;
    let explained = isBetweenNeighbours(inks, pixel, { width, height, lossy });
    for (let a = 0; a < count && !explained; a++) {
      explained = inkDistance2(inks, at, colours, a * inkSize) <= off * off;
      for (let b = a + 1; b < count && !explained; b++) {
        mixOf(inks, at, colours, a, b, mix);
        explained = (mix[1] ?? 0) <= off * off;
      }
    }
    if (explained) open[pixel] = 0;
  }
}
