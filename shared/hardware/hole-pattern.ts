import { isShorter } from "../geometry/tolerance.ts";

/** A hole of a layer with what passes it. All mm. */
export type PatternHole = {
  readonly id: string;
  readonly diameter: number;
  readonly fixed: boolean;
  /** Least diameter that lets the panel move there. */
  readonly least: number;
};

export type PatternFault =
  /** Nothing holds the panel's place. */
  | { readonly kind: "none fixed" }
  /** Two fixed holes hold the panel against each other when it grows. */
  | { readonly kind: "several fixed"; readonly ids: readonly string[] }
  | { readonly kind: "no play"; readonly id: string; readonly missing: number };

/**
 * What keeps a hole pattern from moving freely from one fixed hole: none, several, or other holes without play. Nothing
 * is wrong with no holes. Common practice.
 */
export function patternFaults(holes: readonly PatternHole[]): PatternFault[] {
  if (holes.length === 0) return [];
  const fixed = holes.filter((hole) => hole.fixed);
  const faults: PatternFault[] = [];
  if (fixed.length === 0) faults.push({ kind: "none fixed" });
  if (fixed.length > 1) faults.push({ kind: "several fixed", ids: fixed.map((hole) => hole.id) });
  for (const { id, diameter, least, fixed: isFixed } of holes) {
    if (!isFixed && isShorter(diameter, least)) faults.push({ kind: "no play", id, missing: least - diameter });
  }
  return faults;
}
