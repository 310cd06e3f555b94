import { type FormEvent, useEffect, useRef, useState } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import { type StockEntry, stockEntryIn } from "#shared/contracts/stock-entry.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ApiProblem } from "@/lib/api-client.ts";
import { fieldOfPointer, messageOf } from "@/lib/form-problem.ts";
import { type Faults, faultsOf } from "../model/faults.ts";
import { newerItem } from "../model/newer-item.ts";
import { entryOf, readyEntry, type WrittenEntry } from "../model/written.ts";

const none: Faults = new Map();

/**
 * The form of one item. Faults are shown from the first try to save on, and go as they are mended. `send` gets the entry
 * and the version that the writing began from; an item that somebody else saved meanwhile is laid before the writer.
 */
export function useItemForm({
  unit,
  start,
  version,
  send,
}: {
  readonly unit: LengthUnit;
  readonly start: WrittenEntry;
  readonly version: number;
  readonly send: (entry: StockEntry, version: number) => Promise<unknown>;
}) {
  const [entry, setEntry] = useState(start);
  const [base, setBase] = useState({ entry: start, version });
  const [tried, setTried] = useState(0);
  const [refused, setRefused] = useState<Faults>(none);
  const [problem, setProblem] = useState<string | null>(null);
  const [newer, setNewer] = useState<StockItem | null>(null);
  const [busy, setBusy] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const outcome = stockEntryIn(unit).safeParse(readyEntry(entry));
  const faults = tried > 0 && !outcome.success ? faultsOf(outcome.error.issues) : refused;

  useEffect(() => {
    if (tried > 0) form.current?.querySelector<HTMLElement>("[aria-invalid=true]")?.focus();
  }, [tried]);

  async function save(checked: StockEntry, onto: number) {
    setBusy(true);
    setProblem(null);
    setRefused(none);
    try {
      await send(checked, onto);
    } catch (error) {
      const theirs = newerItem(error);
      setNewer(theirs);
      if (theirs === null) {
        setProblem(messageOf(error));
        setRefused(faultsOfRefusal(error));
        setTried((count) => count + 1);
      }
    } finally {
      setBusy(false);
    }
  }

  return {
    form,
    entry,
    change: (changed: WrittenEntry) => {
      setEntry(changed);
      setRefused(none);
    },
    isChanged: entry !== base.entry,
    faults,
    problem,
    newer,
    busy,
    handleSubmit: (event: FormEvent) => {
      event.preventDefault();
      if (outcome.success) void save(outcome.data, base.version);
      else setTried((count) => count + 1);
    },
    takeTheirs: () => {
      if (newer === null) return;
      const theirs = entryOf(newer);
      setEntry(theirs);
      setBase({ entry: theirs, version: newer.version });
      setNewer(null);
    },
    keepMine: () => {
      if (newer === null) return;
      setBase({ ...base, version: newer.version });
      setNewer(null);
      if (outcome.success) void save(outcome.data, newer.version);
    },
  };
}

/** Refused fields by their paths within the entry. */
function faultsOfRefusal(error: unknown): Faults {
  const refused = error instanceof ApiProblem ? (error.problem?.errors ?? []) : [];
  return new Map(refused.map(({ pointer, detail }) => [fieldOfPointer(pointer).replace(/^entry\./, ""), detail]));
}
