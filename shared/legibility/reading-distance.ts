import { checked, distanceRange, lengthRange, type Outcome } from "../units/outcome.ts";

/** Distance over letter height at which signs are read at the limit: 1 in for 30 ft (MUTCD, 2009 edition, section 2A.13). */
export const limitRatio = 360;
/** At which they are read with ease: 1 in for 10 ft (common practice). */
export const easeRatio = 120;

export type ReadingDistance = { readonly easeMm: number; readonly limitMm: number };

/** From how far letters of that height in mm are read with ease and at the limit. Proportion; clear letters, good contrast. */
export function readingDistance(height: number): Outcome<ReadingDistance> {
  return checked({ height: [height, lengthRange] }, () => ({
    easeMm: height * easeRatio,
    limitMm: height * limitRatio,
  }));
}

/** Letter heights in mm that a distance in mm asks for. */
export function lettersForDistance(distance: number): Outcome<{ readonly easeMm: number; readonly limitMm: number }> {
  return checked({ distance: [distance, distanceRange] }, () => ({
    easeMm: distance / easeRatio,
    limitMm: distance / limitRatio,
  }));
}

/** How letters of a height in mm read from a distance in mm. */
export function readingEase(height: number, distance: number): Outcome<"with ease" | "at a pinch" | "not at all"> {
  return checked({ height: [height, lengthRange], distance: [distance, distanceRange] }, () => {
    // A hair is given, so that a letter of just the height counts.
    if (distance <= height * easeRatio * (1 + 1e-9)) return "with ease";
    return distance <= height * limitRatio * (1 + 1e-9) ? "at a pinch" : "not at all";
  });
}
