import type { LengthUnit } from "../units/length.ts";
import { describeLimit, limitKeys } from "./limit-descriptions.ts";
import type { LimitKey } from "./limit-texts/limit-text.ts";
import { formatLimit } from "./limit-units.ts";
import { type Limits, limitsSchema } from "./limits.ts";

/** What is wrong with one limit, in words that say what would be right. */
export type LimitFault = { readonly key: LimitKey; readonly detail: string };

/** Limits as a form holds them: null is empty, NaN is something that is no number. */
export type WrittenLimits = Readonly<Record<LimitKey, number | null>>;

/** Pairs of which the first may not be more than the second: a caution comes no later than its stop. */
export const limitOrders: readonly (readonly [low: LimitKey, high: LimitKey])[] = [
  ["unsupportedCaution", "unsupportedStop"],
  ["colourRemark", "colourCaution"],
  ["rigidBondMm", "gapFillingBondMm"],
  ["pocketGapLeastMm", "pocketGapMostMm"],
  ["twinSameMm", "twinAlikeMm"],
];

/** Every fault of a whole set, each limit at most once, in the order of the schema; lengths in words are in `unit`. */
export function checkLimits(limits: WrittenLimits, unit: LengthUnit): LimitFault[] {
  const alone = limitKeys.flatMap((key): LimitFault[] => {
    const detail = faultOf(key, limits[key], unit);
    return detail === null ? [] : [{ key, detail }];
  });
  const faulty = new Set(alone.map(({ key }) => key));
  return [...alone, ...crossedLimits(limits, unit).filter(({ key }) => !faulty.has(key))];
}

/** The pairs of which the first is over the second. What is empty or no number is over nothing. */
export function crossedLimits(limits: WrittenLimits, unit: LengthUnit): LimitFault[] {
  return limitOrders.flatMap(([low, high]): LimitFault[] => {
    const [value, most] = [limits[low], limits[high]];
    const isOver = value !== null && most !== null && value > most;
    return isOver ? [{ key: low, detail: tooLate(high, most, unit) }] : [];
  });
}

/**
 * Limits from what a shop set apart from the defaults, at any time before. What the schema no longer takes falls back to
 * its default, and so do both of a pair that no longer fits: an old figure must not keep a shop from working.
 */
export function readLimits(kept: Readonly<Record<string, unknown>>): Limits {
  const limits = limitsSchema.parse(
    Object.fromEntries(limitKeys.filter((key) => isTaken(key, kept[key])).map((key) => [key, kept[key]])),
  );
  const crossed = limitOrders.filter(([low, high]) => limits[low] > limits[high]).flat();
  return { ...limits, ...Object.fromEntries(crossed.map((key) => [key, describeLimit(key).usual])) };
}

/** Only what differs from the defaults, so that a better default reaches every shop that did not choose its own. */
export function ownLimits(limits: Limits): Partial<Limits> {
  return Object.fromEntries(
    limitKeys.filter((key) => limits[key] !== describeLimit(key).usual).map((key) => [key, limits[key]]),
  );
}

function faultOf(key: LimitKey, value: number | null, lengthUnit: LengthUnit): string | null {
  if (value === null) return "Fill this in.";
  if (!Number.isFinite(value)) return "Write a number, like 2.5.";
  if (isTaken(key, value)) return null;
  const { least, most, unit } = describeLimit(key);
  if (value > least && value < most) return "Write a whole number.";
  const words = (bound: number) => formatLimit(bound, unit, lengthUnit);
  return isTaken(key, least)
    ? `From ${words(least)} to ${words(most)}.`
    : `Over ${words(least)}, up to ${words(most)}.`;
}

function tooLate(high: LimitKey, most: number, lengthUnit: LengthUnit): string {
  const { label, unit } = describeLimit(high);
  return `Not over ${formatLimit(most, unit, lengthUnit)}, which is “${label}”.`;
}

const isTaken = (key: LimitKey, value: unknown): boolean =>
  value !== undefined && limitsSchema.shape[key].safeParse(value).success;
