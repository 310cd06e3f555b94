import { expect, it } from "vitest";
import { hoursWords } from "#shared/dry-fit/words.ts";

it.each([
  { hours: 0.25, words: "15 minutes" },
  { hours: 1, words: "1 hour" },
  // A tack of a quarter of an hour, then an hour: 1.3 would be three minutes too many.
  { hours: 1.25, words: "1.25 hours" },
  { hours: 24.25, words: "24 hours" },
  { hours: 60, words: "2.5 days" },
])("$hours h is said as $words", ({ hours, words }) => {
  expect(hoursWords(hours)).toBe(words);
});
