import { type PriceBook, priceBookSchema } from "#shared/cost/price-book.ts";
import type { ThingsToPrice } from "#shared/cost/things-to-price.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import {
  byGroup,
  fieldsOf,
  type PriceGroup,
  priceGroups,
  readField,
  type Writing,
  writtenField,
} from "./price-fields.ts";

type Entry = { readonly id: string; readonly name: string } & Readonly<Record<string, unknown>>;

/** An entry of the price book as it is being written; without money in it it is no entry yet. */
export type PriceRow = {
  readonly id: string;
  readonly name: string;
  readonly fields: Readonly<Record<string, string>>;
  /** As the book has it; null while it has none. */
  readonly entry: Entry | null;
  /** On the stock list or always there; else the shop added it, or the stock has it no more. */
  readonly isStocked: boolean;
};
export type PriceRows = Readonly<Record<PriceGroup, readonly PriceRow[]>>;
export type PriceDraft = {
  readonly currency: string;
  /** Percent. */
  readonly markup: string;
  readonly taxName: string;
  /** Percent. */
  readonly taxShare: string;
  readonly rows: PriceRows;
};
/** Something that a price is asked for, by its group of the price book. */
export type Wanted = { readonly group: string; readonly id: string; readonly name: string };

/** Groups of the book that stand under one heading each. */
const headingOf: Readonly<Record<string, PriceGroup>> = {
  machining: "machines",
  hardware: "hardware",
  adhesives: "adhesives",
  finishes: "finishes",
  labour: "labour",
};

/** Under which heading something stands, by its group of the book and how its id begins. */
export function priceGroupOf({ group, id }: Pick<Wanted, "group" | "id">): PriceGroup {
  if (id.startsWith("sheet ")) return "sheets";
  if (id.startsWith("strip ")) return "strips";
  return headingOf[group] ?? "boards";
}

/** Rows for what is in stock, for what else the book has, and for what a drawing asks a price for. */
export function draftOf(
  book: PriceBook | null,
  things: ThingsToPrice,
  { unit, wanted = [] }: { readonly unit: LengthUnit; readonly wanted?: readonly Wanted[] },
): PriceDraft {
  const kept = book ?? emptyPriceBook(unit === "in" ? "USD" : "EUR");
  const writing = { currency: kept.currency, unit };
  const entriesOf = (group: PriceGroup): readonly Entry[] => {
    if (group !== "sheets" && group !== "boards" && group !== "strips") return kept[group];
    return kept.materials.filter(({ id }) => priceGroupOf({ group: "materials", id }) === group);
  };
  const rowsOf = (group: PriceGroup): PriceRow[] => {
    const entries = new Map(entriesOf(group).map((entry) => [entry.id, entry]));
    const stocked = group === "strips" ? [] : things[group];
    const known = new Set(stocked.map(({ id }) => id));
    const others = [...entries.values(), ...wanted.filter((one) => priceGroupOf(one) === group)];
    const added = new Map(others.filter(({ id }) => !known.has(id)).map(({ id, name }) => [id, { id, name }]));
    return [
      ...stocked.map((thing) => rowOf(group, thing, entries.get(thing.id), true, writing)),
      ...[...added.values()].map((thing) => rowOf(group, thing, entries.get(thing.id), false, writing)),
    ];
  };
  return {
    currency: kept.currency,
    markup: percent(kept.markup),
    taxName: kept.tax.name,
    taxShare: percent(kept.tax.share),
    rows: byGroup(rowsOf),
  };
}

const percent = (share: number): string => String(Number((share * 100).toPrecision(10)));

function rowOf(
  group: PriceGroup,
  thing: { readonly id: string; readonly name: string; readonly isTape?: boolean },
  entry: Entry | undefined,
  isStocked: boolean,
  writing: Writing,
): PriceRow {
  const usual: Readonly<Record<string, unknown>> = thing.isTape ? { ...usualTape } : {};
  const fields = fieldsOf(group, writing.unit).map((field) => [
    field.key,
    writtenField(field, entry ? entry[field.key] : usual[field.key], writing),
  ]);
  return { id: thing.id, name: thing.name, fields: Object.fromEntries(fields), entry: entry ?? null, isStocked };
}

/** A tape is counted by its area and covers what it is put on. */
const usualTape = { unit: "cm²", containerMl: 5000, mlPerM2: 10_000, mlPerM: 0 } as const;

/** A new row that the shop adds itself. */
export const addedRow = (group: PriceGroup, thing: { readonly id: string; readonly name: string }, writing: Writing) =>
  rowOf(group, thing, undefined, false, writing);

/** Whether money is written anywhere in a row, so that it becomes an entry. */
export const isPriced = (group: PriceGroup, { fields }: PriceRow, unit: LengthUnit): boolean =>
  fieldsOf(group, unit).some(({ kind, key }) => kind === "money" && (fields[key] ?? "").trim() !== "");

/** Faults by where they stand: "markup", "sheets/<id>/price". */
export type PriceFaults = ReadonlyMap<string, string>;
export const placeOf = (group: PriceGroup, id: string, key: string): string => `${group}/${id}/${key}`;

export type DraftOutcome = {
  /** null when something has a fault. */
  readonly book: PriceBook | null;
  readonly faults: PriceFaults;
  /** Where on the page a place of the book stands, by its path as "materials.3.price". */
  readonly placeOfPath: (path: string) => string | null;
};

/** The price book that a draft says, or every fault it has. */
export function bookOfDraft(draft: PriceDraft, unit: LengthUnit): DraftOutcome {
  const writing = { currency: draft.currency, unit };
  const faults = new Map<string, string>();
  const places: Record<string, string> = {
    currency: "currency",
    markup: "markup",
    "tax.name": "taxName",
    "tax.share": "taxShare",
  };
  const book: Record<string, unknown[]> = {};
  for (const group of priceGroups) {
    const list = bookListOf(group);
    const entries = book[list] ?? [];
    book[list] = entries;
    for (const row of draft.rows[group]) {
      if (!isPriced(group, row, unit)) continue;
      const entry: Record<string, unknown> = { id: row.id, name: row.name };
      for (const field of fieldsOf(group, unit)) {
        const place = placeOf(group, row.id, field.key);
        const read = readField(field, row.fields[field.key] ?? "", { ...writing, stored: row.entry?.[field.key] });
        if (read.ok) entry[field.key] = read.value;
        else faults.set(place, read.words);
        places[`${list}.${entries.length}.${field.key}`] = place;
      }
      entries.push(entry);
    }
  }
  const share = (text: string, place: string): number => {
    const read = readField({ key: place, label: "", kind: "percent", usual: "" }, text, writing);
    if (!read.ok) faults.set(place, read.words);
    return read.ok && typeof read.value === "number" ? read.value : 0;
  };
  const tax = { name: draft.taxName, share: share(draft.taxShare, "taxShare") };
  const written = { version: 1, currency: draft.currency, ...book, markup: share(draft.markup, "markup"), tax };
  const placeOfPath = (path: string): string | null => places[path] ?? null;
  const parsed = priceBookSchema.safeParse(written);
  for (const { path, message } of parsed.error?.issues ?? []) {
    const place = placeOfPath(path.join(".")) ?? path.join(".");
    if (!faults.has(place)) faults.set(place, message);
  }
  return { book: parsed.success && faults.size === 0 ? parsed.data : null, faults, placeOfPath };
}

const bookListOf = (group: PriceGroup) =>
  group === "sheets" || group === "boards" || group === "strips" ? "materials" : group;
