import type { LengthUnit } from "./length.ts";

/** A scale of a drawing: length on paper = length of the thing × factor. */
export type Scale = { readonly name: string; readonly factor: number };

const enlarged = [50, 20, 10, 5, 2].map((times): Scale => ({ name: `${times}:1`, factor: times }));
const reduced = (divisors: readonly number[]) =>
  divisors.map((times): Scale => ({ name: `1:${times}`, factor: 1 / times }));
const isoDivisors = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];

/** Preferred scales, largest first (ISO 5455). Shops that work in inches also use 1:4 and 1:8 (common practice). */
export function preferredScales(unit: LengthUnit): readonly Scale[] {
  const divisors = unit === "mm" ? isoDivisors : [...isoDivisors, 4, 8].sort((a, b) => a - b);
  return [...enlarged, ...reduced(divisors)];
}

/**
 * The largest preferred scale at which a thing of `widthMm` by `heightMm` fits into the space. `largest` caps it (1
 * keeps small signs at full size). Null when it does not fit even at 1:1000, or when there is nothing to fit.
 */
export function largestScale(
  thing: { readonly widthMm: number; readonly heightMm: number },
  space: { readonly widthMm: number; readonly heightMm: number },
  options: { readonly unit: LengthUnit; readonly largest?: number },
): Scale | null {
  if (!(thing.widthMm > 0 && thing.heightMm > 0)) return null;
  // A thing as long as the space fits, whatever the last binary digit says.
  const fits = (lengthMm: number, roomMm: number) => lengthMm <= roomMm + 1e-9;
  return (
    preferredScales(options.unit).find(
      ({ factor }) =>
        factor <= (options.largest ?? Number.POSITIVE_INFINITY) &&
        fits(thing.widthMm * factor, space.widthMm) &&
        fits(thing.heightMm * factor, space.heightMm),
    ) ?? null
  );
}
