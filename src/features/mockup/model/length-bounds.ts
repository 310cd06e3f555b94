import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";

export type Bounds = { readonly least: number; readonly most: number };

/** Whether a length field holds a length within bounds; null is an empty field, NaN one that can't be read. */
export function isWithinBounds(mm: number | null, { least, most }: Bounds): mm is number {
  return mm !== null && mm >= least && mm <= most;
}

/** What to say under a length field; undefined when it is right or says itself that it can't be read. */
export function boundsProblem(mm: number | null, bounds: Bounds, unit: LengthUnit): string | undefined {
  if (Number.isNaN(mm) || isWithinBounds(mm, bounds)) return undefined;
  return `From ${formatLengthWithUnit(bounds.least, unit)} to ${formatLengthWithUnit(bounds.most, unit)}.`;
}
