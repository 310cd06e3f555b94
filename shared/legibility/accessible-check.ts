import { type AccessibleLimit, type AccessibleMeasure, accessibleLimits } from "./accessible-limits.ts";

export type AccessibleResult = {
  readonly limit: AccessibleLimit;
  readonly measured: number;
  readonly verdict: "within" | "too small" | "too large";
};

/** Lengths and shares that came through inches may miss a limit by their last digits. */
const hair = 1e-9;

/** A raised gap may be four strokes wide at most (703.2.7). */
const gapStrokes = 4;

/**
 * Measured values beside the limits of section 703, in the order of the clauses; values that are no number are left out.
 * Lengths mm. With a raised stroke in mm the gap between raised characters is held to four strokes. An aid, no statement
 * that a sign complies.
 */
export function accessibleCheck(
  measured: Partial<Readonly<Record<AccessibleMeasure, number>>>,
  raisedStrokeMm: number | null = null,
): AccessibleResult[] {
  return accessibleLimits.flatMap((limit) => {
    const value = measured[limit.id];
    if (value === undefined || !Number.isFinite(value)) return [];
    const held = withStroke(limit, raisedStrokeMm);
    return [{ limit: held, measured: value, verdict: verdictOf(value, held) }];
  });
}

function withStroke(limit: AccessibleLimit, strokeMm: number | null): AccessibleLimit {
  const isGap = limit.id === "raised gap" || limit.id === "raised gap at base";
  if (!isGap || strokeMm === null || !(strokeMm > 0)) return limit;
  return { ...limit, most: gapStrokes * strokeMm };
}

function verdictOf(value: number, { least, most }: AccessibleLimit): AccessibleResult["verdict"] {
  if (least !== null && value < least * (1 - hair)) return "too small";
  return most !== null && value > most * (1 + hair) ? "too large" : "within";
}
