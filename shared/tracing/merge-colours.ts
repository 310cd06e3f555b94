import type { Rgb } from "./picture.ts";

/** A colour, how many pixels have it, and the places in the list merged from of the colours that went into it. */
export type MergedColour = { readonly colour: Rgb; readonly count: number; readonly of: readonly number[] };

/**
 * Colours joined two by two, the nearest first, into the more frequent of the two: while any two are nearer than `nearest` in RGB and
 * while more than `most` are left. For the latter, few pixels count as nearer than many, so that small areas give way first.
 * "No colour" joins none and does not count. Most frequent first.
 */
export function mergeColours(
  colours: readonly { readonly colour: Rgb; readonly count: number }[],
  { nearest, most }: { readonly nearest: number; readonly most: number },
): MergedColour[] {
  const left: MergedColour[] = colours.map(({ colour, count }, index) => ({ colour, count, of: [index] }));
  left.sort((a, b) => b.count - a.count);
  for (;;) {
    const solid = left.filter(({ colour }) => colour.alpha > 0);
    const near = nearestPair(solid, false);
    const pair = near && near.away < nearest ? near : solid.length > most ? nearestPair(solid, true) : null;
    if (!pair) return left;
    const { more, less } = pair;
    left[left.indexOf(more)] = { colour: more.colour, count: more.count + less.count, of: [...more.of, ...less.of] };
    left.splice(left.indexOf(less), 1);
    left.sort((a, b) => b.count - a.count);
  }
}

function nearestPair(colours: readonly MergedColour[], weighted: boolean) {
  let best: { more: MergedColour; less: MergedColour; away: number } | null = null;
  for (const [index, more] of colours.entries()) {
    for (let next = index + 1; next < colours.length; next++) {
      const less = colours[next];
      if (!less) continue;
      const apart = colourDistance(more.colour, less.colour);
      // What joining them costs: the pixels that change times how much (J. H. Ward, J. Am. Stat. Assoc. 58, 1963).
      const away = weighted ? apart * Math.sqrt((more.count * less.count) / (more.count + less.count)) : apart;
      if (!best || away < best.away) best = { more, less, away };
    }
  }
  return best;
}

/** Distance of two colours in RGB and opacity, from 0 to 510. */
export function colourDistance(a: Rgb, b: Rgb): number {
  return Math.hypot(a.red - b.red, a.green - b.green, a.blue - b.blue, a.alpha - b.alpha);
}
