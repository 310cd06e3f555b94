import { checked, lengthRange, type Outcome, type Range } from "../units/outcome.ts";
import type { Sheet } from "./rigidity.ts";

/**
 * How far a sheet bends, in mm. Beyond half its thickness the theory of small deflections no longer holds, and no figure
 * is given.
 */
export type Deflection =
  | { readonly kind: "figure"; readonly mm: number; readonly upperEstimate: boolean }
  | { readonly kind: "beyond the theory"; readonly overMm: number };

/** Ranges that every plate formula here is used in. */
export const sheetRanges = ({ modulus, thickness, poisson }: Sheet): Record<string, readonly [number, Range]> => ({
  modulus: [modulus, { least: 100, most: 300_000 }],
  thickness: [thickness, { least: 0.1, most: 200 }],
  poisson: [poisson, { least: 0, most: 0.5 }],
});

/** A deflection of a plate of that thickness, flagged beyond half of it (Timoshenko, Theory of Plates and Shells). */
export function deflectionOf(mm: number, thickness: number, upperEstimate: boolean): Deflection {
  const most = thickness / 2;
  return mm <= most ? { kind: "figure", mm, upperEstimate } : { kind: "beyond the theory", overMm: most };
}

/** The usual limits of bending, mm and as a part of the spacing (our choice). */
export const usualBend = { mm: 1, part: 300 } as const;

/** What a sheet of that longest spacing may bend before it is a caution: the larger of a length and a part of the spacing. */
export function deflectionLimitMm(
  spacing: number,
  { mm, part }: { mm: number; part: number } = usualBend,
): Outcome<number> {
  return checked({ spacing: [spacing, lengthRange] }, () => Math.max(mm, spacing / part));
}

/** Whether it bends too far. Beyond the theory it counts as too far: nobody can say that it does not. */
export function bendsTooFar(deflection: Deflection, limitMm: number): boolean {
  return deflection.kind === "beyond the theory" || deflection.mm > limitMm;
}
