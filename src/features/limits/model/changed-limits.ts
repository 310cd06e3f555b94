import type { WrittenLimits } from "#shared/dry-fit/check-limits.ts";
import { limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import type { LimitKey } from "#shared/dry-fit/limit-texts/limit-text.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";

/** The limits that are written otherwise than they were. */
export const changedLimits = (written: WrittenLimits, before: Limits): LimitKey[] =>
  limitKeys.filter((key) => !Object.is(written[key], before[key]));

/** What someone changed from `before`, laid over what somebody else saved meanwhile. */
export const onto = (newer: Limits, written: WrittenLimits, before: Limits): WrittenLimits => ({
  ...newer,
  ...Object.fromEntries(changedLimits(written, before).map((key) => [key, written[key]])),
});
