import type { Calculation, CalculationGroup } from "#shared/calculations/calculation.ts";

/** A group and its calculations with their numbers on the sheet: "3" and "3.4". */
export type NumberedGroup = {
  readonly number: string;
  readonly title: string;
  readonly entries: readonly { readonly number: string; readonly calculation: Calculation }[];
};

/** Numbers groups and calculations from 1, in their order. */
export function numbered(groups: readonly CalculationGroup[]): NumberedGroup[] {
  return groups.map(({ title, calculations }, group) => ({
    number: `${group + 1}`,
    title,
    entries: calculations.map((calculation, entry) => ({ number: `${group + 1}.${entry + 1}`, calculation })),
  }));
}

/** What every word of `query` occurs in, in any order and case; all of it for an empty query. Numbers stay as they are. */
export function findCalculations(groups: readonly NumberedGroup[], query: string): NumberedGroup[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  return groups
    .map((group) => ({
      ...group,
      entries: group.entries.filter(({ number, calculation: { title, formula, source, limits } }) => {
        const text = [number, group.title, title, formula, source.text, source.status, limits].join(" ").toLowerCase();
        return words.every((word) => text.includes(word));
      }),
    }))
    .filter(({ entries }) => entries.length > 0);
}
