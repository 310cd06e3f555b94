import type { Range } from "../units/outcome.ts";

/** Whether a value lies in a range, both ends included; what is no number does not. */
export const isWithin = (value: number, { least, most }: Range): boolean => value >= least && value <= most;

/** What is wrong with a number, as a sentence about `what`; null when it lies in its range. */
export function numberProblem(what: string, value: number, range: Range, unit = ""): string | null {
  if (isWithin(value, range)) return null;
  const withUnit = (number: number) => (unit === "°" ? `${number}°` : unit ? `${number} ${unit}` : String(number));
  if (!Number.isFinite(value)) return `${what} must be a number.`;
  return value < range.least
    ? `${what} is ${withUnit(value)}; it must be at least ${withUnit(range.least)}.`
    : `${what} is ${withUnit(value)}; it must be at most ${withUnit(range.most)}.`;
}
