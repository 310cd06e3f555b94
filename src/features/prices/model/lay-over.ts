import type { PriceDraft, PriceRow } from "./price-draft.ts";
import { byGroup, type PriceGroup, priceGroups } from "./price-fields.ts";

const heads = ["currency", "markup", "taxName", "taxShare"] as const;

/** How many rows and figures of a draft differ from the one that it began from. */
export function countChanges(draft: PriceDraft, base: PriceDraft): number {
  const ofHeads = heads.filter((key) => draft[key] !== base[key]).length;
  return priceGroups.reduce((count, group) => {
    const before = byId(base.rows[group]);
    const after = byId(draft.rows[group]);
    const changed = draft.rows[group].filter((row) => !isSameRow(row, before.get(row.id)));
    return count + changed.length + base.rows[group].filter(({ id }) => !after.has(id)).length;
  }, ofHeads);
}

/** The newer draft with what was changed since `base` laid over it, field by field. */
export function layOver(newer: PriceDraft, mine: PriceDraft, base: PriceDraft): PriceDraft {
  const head = (key: (typeof heads)[number]) => (mine[key] === base[key] ? newer[key] : mine[key]);
  return {
    currency: head("currency"),
    markup: head("markup"),
    taxName: head("taxName"),
    taxShare: head("taxShare"),
    rows: byGroup((group) => rowsOver(group, newer, mine, base)),
  };
}

function rowsOver(group: PriceGroup, newer: PriceDraft, mine: PriceDraft, base: PriceDraft): PriceRow[] {
  const own = byId(mine.rows[group]);
  const old = byId(base.rows[group]);
  const theirs = newer.rows[group].filter(({ id }) => own.has(id) || !old.has(id));
  const known = byId(theirs);
  const added = mine.rows[group].filter((row) => !known.has(row.id) && !isSameRow(row, old.get(row.id)));
  return [...theirs.map((row) => fieldsOver(row, own.get(row.id), old.get(row.id))), ...added];
}

function fieldsOver(theirs: PriceRow, mine: PriceRow | undefined, base: PriceRow | undefined): PriceRow {
  if (!mine) return theirs;
  const fields = Object.entries(theirs.fields).map(([key, text]) => {
    const own = mine.fields[key] ?? text;
    return [key, own === base?.fields[key] ? text : own];
  });
  return { ...theirs, fields: Object.fromEntries(fields) };
}

const byId = (rows: readonly PriceRow[]): ReadonlyMap<string, PriceRow> => new Map(rows.map((row) => [row.id, row]));

/** An added row that nothing is written in is a row all the same. */
const isSameRow = (row: PriceRow, other: PriceRow | undefined): boolean =>
  other !== undefined && Object.entries(row.fields).every(([key, text]) => other.fields[key] === text);
