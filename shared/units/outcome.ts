/** Values that a calculation takes, both ends included, in the value's unit. */
export type Range = { readonly least: number; readonly most: number };

/** An input that a calculation can't take. A value that is no number lies in no range. */
export type OutOfRange = { readonly field: string; readonly value: number; readonly range: Range };

/** What a calculation gives: its value, or which of its inputs lies out of range. */
export type Outcome<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly reason: OutOfRange };

/**
 * Lengths of parts and signs in mm: from a thousandth, the step of the geometry kernel, up to 10 m, which is what a
 * document takes too.
 */
export const lengthRange: Range = { least: 0.001, most: 10_000 };
/** Lengths in mm that may also be nothing. */
export const spanRange: Range = { least: 0, most: 10_000 };
/** Distances in mm from which a sign is read: up to 1 km. */
export const distanceRange: Range = { least: 0.001, most: 1_000_000 };
/** A part of a whole. */
export const shareRange: Range = { least: 0, most: 1 };
/** Forces in N, up to a tonne's weight. */
export const forceRange: Range = { least: 0, most: 10_000 };
/** Specific gravity of wood at 12 % moisture: the lightest and the heaviest that the Wood Handbook's formulas are used for. */
export const gravityRange: Range = { least: 0.2, most: 1 };

/** `compute`'s value when every input lies in its range, else the first that does not, by its name. */
export function checked<T>(
  inputs: Readonly<Record<string, readonly [value: number, range: Range]>>,
  compute: () => T,
): Outcome<T> {
  for (const [field, [value, range]] of Object.entries(inputs)) {
    if (!isInRange(value, range)) return { ok: false, reason: { field, value, range } };
  }
  return { ok: true, value: compute() };
}

function isInRange(value: number, { least, most }: Range): boolean {
  return value >= least && value <= most;
}
