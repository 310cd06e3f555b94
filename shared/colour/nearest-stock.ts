import { deltaE00, labOf } from "./lab.ts";

/** How a difference looks side by side: up to 1, up to 2, up to 5, more (common practice). */
export type ColourMatch = "same" | "close" | "visible" | "another colour";

/** The word for a ΔE00. */
export function colourMatch(deltaE: number): ColourMatch {
  if (deltaE <= 1) return "same";
  if (deltaE <= 2) return "close";
  return deltaE <= 5 ? "visible" : "another colour";
}

/**
 * The stock whose colour comes nearest by ΔE00, with the difference; the first of equals; null when there is no stock.
 */
export function nearestStock<T extends { readonly colour: string }>(
  colour: string,
  stock: readonly T[],
): { readonly stock: T; readonly deltaE: number; readonly match: ColourMatch } | null {
  const wanted = labOf(colour);
  let nearest: { stock: T; deltaE: number } | null = null;
  for (const candidate of stock) {
    const deltaE = deltaE00(wanted, labOf(candidate.colour));
    if (!nearest || deltaE < nearest.deltaE) nearest = { stock: candidate, deltaE };
  }
  return nearest && { ...nearest, match: colourMatch(nearest.deltaE) };
}
