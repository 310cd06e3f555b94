import type { LengthUnit } from "#shared/units/length.ts";
import { isPriced, type PriceFaults, type PriceRow } from "./price-draft.ts";
import type { PriceGroup } from "./price-fields.ts";

export type PriceSearch = { readonly text: string; readonly unpricedOnly: boolean };

/**
 * The rows that are looked for, by a part of their name. A row counts as priced by what is saved, so that none goes away under
 * the hand that writes in it; one with a fault is always there.
 */
export function foundRows(
  group: PriceGroup,
  rows: readonly PriceRow[],
  on: {
    readonly base: readonly PriceRow[];
    readonly faults: PriceFaults;
    readonly search: PriceSearch;
    readonly unit: LengthUnit;
  },
): readonly PriceRow[] {
  const { text, unpricedOnly } = on.search;
  const part = text.trim().toLowerCase();
  if (part === "" && !unpricedOnly) return rows;
  const saved = new Set(on.base.filter((row) => isPriced(group, row, on.unit)).map(({ id }) => id));
  const places = [...on.faults.keys()];
  return rows.filter(
    ({ id, name }) =>
      places.some((place) => place.startsWith(`${group}/${id}/`)) ||
      (name.toLowerCase().includes(part) && !(unpricedOnly && saved.has(id))),
  );
}
