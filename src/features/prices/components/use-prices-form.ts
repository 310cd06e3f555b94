import { type FormEvent, useCallback, useEffect, useEffectEvent, useMemo, useState } from "react";
import { type Prices, pricesSchema } from "#shared/contracts/prices.ts";
import { type Thing, thingsToPrice } from "#shared/cost/things-to-price.ts";
import type { Stock } from "#shared/materials/stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ApiProblem } from "@/lib/api-client.ts";
import { fieldOfPointer, messageOf } from "@/lib/form-problem.ts";
import { useChangePrices } from "../api/mutations.ts";
import { countChanges, layOver } from "../model/lay-over.ts";
import {
  addedRow,
  bookOfDraft,
  draftOf,
  type PriceDraft,
  type PriceFaults,
  type Wanted,
} from "../model/price-draft.ts";
import type { PriceGroup } from "../model/price-fields.ts";

export type PricesFormInput = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly prices: Prices;
  readonly stock: Stock;
  /** What a drawing asks a price for. */
  readonly wanted: readonly Wanted[];
};

const none: PriceFaults = new Map();

/**
 * The form of the price book. It begins from a book and saves onto that version; a book that somebody else saved meanwhile is
 * taken in at once while nothing is changed here, and laid before the reader (`newer`) when saving meets it.
 */
export function usePricesForm({ shop, unit, prices, stock, wanted }: PricesFormInput) {
  const change = useChangePrices(shop);
  const things = useMemo(() => thingsToPrice(stock, unit), [stock, unit]);
  const draftFor = (set: Prices): PriceDraft => draftOf(set.book, things, { unit, wanted });
  const [base, setBase] = useState(() => ({ version: prices.version, draft: draftFor(prices) }));
  const [draft, setDraft] = useState(base.draft);
  const [newer, setNewer] = useState<Prices | null>(null);
  const [asked, setAsked] = useState(false);
  const [refused, setRefused] = useState<PriceFaults>(none);
  const [problem, setProblem] = useState<string | null>(null);
  const changes = useMemo(() => countChanges(draft, base.draft), [draft, base.draft]);
  const checked = useMemo(() => (asked ? bookOfDraft(draft, unit) : null), [asked, draft, unit]);
  const faults = useMemo(() => (checked ? new Map([...refused, ...checked.faults]) : none), [checked, refused]);

  function take(next: Prices, mine: PriceDraft | null) {
    const theirs = draftFor(next);
    setBase({ version: next.version, draft: theirs });
    setDraft(mine === null ? theirs : layOver(theirs, mine, base.draft));
    setNewer(null);
    setAsked(false);
    setRefused(none);
    setProblem(null);
  }
  const takeIfUntouched = useEffectEvent((next: Prices) => {
    if (next.version > base.version && changes === 0) take(next, null);
  });
  useEffect(() => takeIfUntouched(prices), [prices]);

  async function save() {
    const { book, placeOfPath } = bookOfDraft(draft, unit);
    setAsked(true);
    setRefused(none);
    setProblem(null);
    if (book === null) return;
    try {
      take(await change.mutateAsync({ version: base.version, book }), null);
    } catch (error) {
      const theirs = newerOf(error);
      if (theirs !== null) return setNewer(theirs);
      const errors = error instanceof ApiProblem ? (error.problem?.errors ?? []) : [];
      const placed = errors.map(({ pointer, detail }) => ({
        place: placeOfPath(fieldOfPointer(pointer).replace(/^book\./, "")),
        detail,
      }));
      setRefused(new Map(placed.flatMap(({ place, detail }) => (place === null ? [] : [[place, detail] as const]))));
      const unplaced = placed.filter(({ place }) => place === null).map(({ detail }) => detail);
      setProblem([messageOf(error), ...unplaced].join(" "));
    }
  }

  const onWrite = useCallback((group: PriceGroup, id: string, key: string, text: string) => {
    setDraft((before) => ({
      ...before,
      rows: {
        ...before.rows,
        [group]: before.rows[group].map((row) =>
          row.id === id ? { ...row, fields: { ...row.fields, [key]: text } } : row,
        ),
      },
    }));
  }, []);
  const onRemove = useCallback((group: PriceGroup, id: string) => {
    setDraft((before) => ({
      ...before,
      rows: { ...before.rows, [group]: before.rows[group].filter((row) => row.id !== id) },
    }));
  }, []);

  return {
    draft,
    base: base.draft,
    changes,
    faults,
    newer,
    problem,
    busy: change.isPending,
    saved: change.isSuccess && changes === 0,
    onWrite,
    onRemove,
    onWriteTerm: (key: "currency" | "markup" | "taxName" | "taxShare", text: string) =>
      setDraft((before) => ({ ...before, [key]: text })),
    onAdd: (group: PriceGroup, thing: Thing) =>
      setDraft((before) => {
        if (before.rows[group].some(({ id }) => id === thing.id)) return before;
        const row = addedRow(group, thing, { currency: before.currency, unit });
        return { ...before, rows: { ...before.rows, [group]: [...before.rows[group], row] } };
      }),
    takeTheirs: () => newer && take(newer, null),
    keepMine: () => newer && take(newer, draft),
    handleSubmit: (event: FormEvent<HTMLFormElement>) => {
      event.preventDefault();
      const form = event.currentTarget;
      // The hand is led to the first field that is refused, once it is marked.
      void save().then(() =>
        requestAnimationFrame(() => form.querySelector<HTMLElement>("[aria-invalid=true]")?.focus()),
      );
    },
  };
}

function newerOf(error: unknown): Prices | null {
  if (!(error instanceof ApiProblem) || error.code !== "stale") return null;
  const read = pricesSchema.safeParse(error.problem?.extra?.newer);
  return read.success ? read.data : null;
}
