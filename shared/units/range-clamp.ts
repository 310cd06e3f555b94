import type { Range } from "./outcome.ts";

/** The value of a range that comes nearest to one. */
export function rangeClamp(value: number, { least, most }: Range): number {
  return Math.min(most, Math.max(least, value));
}
