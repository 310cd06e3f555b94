import { deltaE00, labOf } from "../colour/lab.ts";
import { lengthsEqual } from "../geometry/tolerance.ts";
import type { Acrylic } from "../mockup/document.ts";
import type { AcrylicStock } from "./stock.ts";

/** Nominal thicknesses that differ by less are one, mm: 4.5 and what a shop writes as 4.48. */
export const sameThicknessMm = 0.05;

/** The entry that something in a document was copied from: by its stock id, or else by its name; null when it is gone. */
export function findEntry<T>(
  entries: readonly T[],
  wanted: { readonly stockId: string | null; readonly name: string },
  thingOf: (entry: T) => { readonly stockId: string | null; readonly name: string },
): T | null {
  const { stockId, name } = wanted;
  const byId = stockId === null ? undefined : entries.find((entry) => thingOf(entry).stockId === stockId);
  return byId ?? entries.find((entry) => thingOf(entry).name === name) ?? null;
}

/** Whether a list of thicknesses in mm has that one. */
export function hasThickness(thicknessesMm: readonly number[], thicknessMm: number): boolean {
  return thicknessesMm.some((one) => lengthsEqual(one, thicknessMm, sameThicknessMm));
}

/** The thickness in stock nearest to one in mm, of equally near ones the thinner; null when there is none. */
export function nearestThickness(thicknessesMm: readonly number[], thicknessMm: number): number | null {
  let nearest: number | null = null;
  for (const one of thicknessesMm.toSorted((a, b) => a - b)) {
    const apart = Math.abs(one - thicknessMm);
    if (nearest === null || apart < Math.abs(nearest - thicknessMm)) nearest = one;
  }
  return nearest;
}

/**
 * Stock to take for a sheet of that colour, look and thickness in mm: the nearest by colour of those that look alike and
 * come in that thickness, or else of those that look alike. Null when nothing looks alike.
 */
export function nearestSheet(
  wanted: Pick<Acrylic, "colour" | "look"> & { readonly thicknessMm: number },
  stock: readonly AcrylicStock[],
): { readonly stock: Acrylic; readonly thicknessMm: number; readonly deltaE: number } | null {
  const alike = stock.filter(({ acrylic, thicknessesMm }) => acrylic.look === wanted.look && thicknessesMm.length > 0);
  const thick = alike.filter(({ thicknessesMm }) => hasThickness(thicknessesMm, wanted.thicknessMm));
  const lab = labOf(wanted.colour);
  let nearest: { entry: AcrylicStock; deltaE: number } | null = null;
  for (const entry of thick.length > 0 ? thick : alike) {
    const deltaE = deltaE00(lab, labOf(entry.acrylic.colour));
    if (!nearest || deltaE < nearest.deltaE) nearest = { entry, deltaE };
  }
  if (!nearest) return null;
  const { entry, deltaE } = nearest;
  const thicknessMm = hasThickness(entry.thicknessesMm, wanted.thicknessMm)
    ? wanted.thicknessMm
    : (nearestThickness(entry.thicknessesMm, wanted.thicknessMm) ?? wanted.thicknessMm);
  return { stock: entry.acrylic, thicknessMm, deltaE };
}
