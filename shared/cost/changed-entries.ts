import type { PriceBook } from "./price-book.ts";

type Entry = { readonly id: string; readonly name: string };

const groups = ["materials", "machines", "hardware", "adhesives", "finishes", "labour"] as const;

/**
 * Names of what differs between two books, in the book's order: entries that are new, changed or gone, then "markup", "tax"
 * and "currency". Amounts are not among the words.
 */
export function changedEntries(before: PriceBook, after: PriceBook): string[] {
  const entries = groups.flatMap((group) => changedOf(before[group], after[group]));
  const rest = [
    before.markup === after.markup ? [] : ["markup"],
    isSameEntry(before.tax, after.tax) ? [] : ["tax"],
    before.currency === after.currency ? [] : ["currency"],
  ];
  return [...entries, ...rest.flat()];
}

function changedOf(before: readonly Entry[], after: readonly Entry[]): string[] {
  const old = new Map(before.map((entry) => [entry.id, entry]));
  const kept = new Set(after.map(({ id }) => id));
  const changed = after.filter((entry) => {
    const earlier = old.get(entry.id);
    return !earlier || !isSameEntry(earlier, entry);
  });
  return [...changed, ...before.filter(({ id }) => !kept.has(id))].map(({ name }) => name);
}

/** Entries are flat: an absent field is the same as one left undefined. */
function isSameEntry(a: object, b: object): boolean {
  const [one, other] = [new Map(Object.entries(a)), new Map(Object.entries(b))];
  return [...new Set([...one.keys(), ...other.keys()])].every((key) => Object.is(one.get(key), other.get(key)));
}
