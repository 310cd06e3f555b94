import { checked, type Outcome, type Range, shareRange } from "../units/outcome.ts";
import type { Lab } from "./lab.ts";
import { lrvOfLightness } from "./lrv.ts";

/** One coat on wood, in the order they go on. */
export type Coat =
  | { readonly kind: "clear, water-borne" }
  | { readonly kind: "clear, oil or shellac" }
  /** Pigment or dye: `strength` is the share of the way from the wood's colour to the stain's, 0 to 1. */
  | { readonly kind: "stain"; readonly colour: Lab; readonly strength: number };

/** What wets the grain darkens it and, with oil, warms it: changes of CIELAB for the first clear coat (from memory). */
const wetting = {
  "clear, water-borne": { L: -3, a: 0.5, b: 2 },
  "clear, oil or shellac": { L: -8, a: 2, b: 6 },
} as const;

const lightnessRange: Range = { least: 0, most: 100 };
const chromaRange: Range = { least: -200, most: 200 };

/**
 * The colour of wood under its coats, as CIELAB: each stain draws it towards its own colour, and the first clear coat
 * darkens it. An estimate to compare signs by (our choice); a finished sample is measured for a promise.
 */
export function finishedWood(bare: Lab, coats: readonly Coat[]): Outcome<Lab> {
  const stains = coats.filter((coat) => coat.kind === "stain");
  return checked(
    Object.assign(
      rangesOf("wood", bare),
      ...stains.map(({ colour, strength }, index) => ({
        ...rangesOf(`stain ${index + 1}`, colour),
        [`stain ${index + 1} strength`]: [strength, shareRange],
      })),
    ),
    () => coated(bare, coats),
  );
}

/** Light reflectance value in percent of wood under its coats. */
export function finishedWoodLrv(bare: Lab, coats: readonly Coat[]): Outcome<number> {
  const colour = finishedWood(bare, coats);
  return colour.ok ? lrvOfLightness(colour.value.L) : colour;
}

function coated(bare: Lab, coats: readonly Coat[]): Lab {
  let colour = bare;
  let isWet = false;
  for (const coat of coats) {
    if (coat.kind === "stain") colour = drawnTowards(colour, coat.colour, coat.strength);
    else if (!isWet) {
      const change = wetting[coat.kind];
      colour = { L: Math.max(0, colour.L + change.L), a: colour.a + change.a, b: colour.b + change.b };
      isWet = true;
    }
  }
  return colour;
}

function drawnTowards(from: Lab, to: Lab, share: number): Lab {
  const between = (a: number, b: number) => a + (b - a) * share;
  return { L: between(from.L, to.L), a: between(from.a, to.a), b: between(from.b, to.b) };
}

const rangesOf = (name: string, { L, a, b }: Lab): Record<string, readonly [number, Range]> => ({
  [`${name} L`]: [L, lightnessRange],
  [`${name} a`]: [a, chromaRange],
  [`${name} b`]: [b, chromaRange],
});
