import { bondLimits } from "./limit-texts/bond-limits.ts";
import { hangingLimits } from "./limit-texts/hanging-limits.ts";
import { holeLimits } from "./limit-texts/hole-limits.ts";
import { type LimitKey, type LimitText, limitHeadings } from "./limit-texts/limit-text.ts";
import { pieceLimits } from "./limit-texts/piece-limits.ts";
import { slatLimits } from "./limit-texts/slat-limits.ts";
import { standoffLimits } from "./limit-texts/standoff-limits.ts";
import { defaultLimits, limitsSchema } from "./limits.ts";

/** What each limit is. A limit without its text is a type error, and so is a text without a limit. */
const texts: Readonly<Record<LimitKey, LimitText>> = {
  ...pieceLimits,
  ...bondLimits,
  ...holeLimits,
  ...standoffLimits,
  ...slatLimits,
  ...hangingLimits,
};

export type DescribedLimit = Omit<LimitText, "group"> & {
  readonly key: LimitKey;
  readonly usual: number;
  readonly least: number;
  readonly most: number;
};
export type LimitGroup = {
  readonly id: string;
  readonly title: string;
  readonly rules: readonly number[];
  readonly limits: readonly DescribedLimit[];
};

/** Every limit, in the order of the schema. */
export const limitKeys: readonly LimitKey[] = limitsSchema.keyof().options;

/** What a limit is, with its default and its bounds. */
export function describeLimit(key: LimitKey): DescribedLimit {
  const { group: _, ...text } = texts[key];
  const { minValue, maxValue } = limitsSchema.shape[key].unwrap();
  return { key, ...text, usual: defaultLimits[key], least: minValue ?? -Infinity, most: maxValue ?? Infinity };
}

/** Every limit under its heading. */
export const limitGroups: readonly LimitGroup[] = Object.entries(limitHeadings).map(([id, title]) => {
  const limits = limitKeys.filter((key) => texts[key].group === id).map(describeLimit);
  const rules = [...new Set(limits.flatMap((limit) => limit.rules))].toSorted((a, b) => a - b);
  return { id, title, rules, limits };
});
