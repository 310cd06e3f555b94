import { useEffect, useEffectEvent, useState } from "react";
import { type SawSet, sawSetSchema } from "#shared/contracts/saws.ts";
import { checkSaws, type SawKey, sawFields, type WrittenSaws } from "#shared/cut-plan/saw-fields.ts";
import { shopSawsSchema } from "#shared/cut-plan/shop-saws.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ApiProblem } from "@/lib/api-client.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { useChangeSaws } from "../api/mutations.ts";

/**
 * The form of how a shop cuts. It begins from a set and saves onto that version; a set that somebody else saved meanwhile
 * is taken in at once while nothing is changed here, and laid before the reader (`newer`) when saving meets it.
 */
export function useSawsForm(shop: string, unit: LengthUnit, set: SawSet) {
  const change = useChangeSaws(shop);
  const [base, setBase] = useState(set);
  const [written, setWritten] = useState<WrittenSaws>(set.saws);
  const [newer, setNewer] = useState<SawSet | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [wasSent, setWasSent] = useState(false);
  const changed = sawFields.filter(({ key }) => !Object.is(written[key], base.saws[key])).map(({ key }) => key);
  const faults = wasSent ? checkSaws(written, unit) : [];

  function take(next: SawSet, to: WrittenSaws) {
    setBase(next);
    setWritten(to);
    setNewer(null);
    setProblem(null);
    setWasSent(false);
  }
  const takeIfUntouched = useEffectEvent((next: SawSet) => {
    if (next.version > base.version && changed.length === 0) take(next, next.saws);
  });
  useEffect(() => takeIfUntouched(set), [set]);

  async function save() {
    setProblem(null);
    setWasSent(true);
    if (checkSaws(written, unit).length > 0) return;
    try {
      const saved = await change.mutateAsync({ version: base.version, saws: shopSawsSchema.parse(written) });
      take(saved, saved.saws);
    } catch (error) {
      const theirs = newerOf(error);
      if (theirs === null) setProblem(messageOf(error));
      else setNewer(theirs);
    }
  }

  return {
    written,
    changed,
    faults,
    problem,
    newer,
    busy: change.isPending,
    saved: change.isSuccess && changed.length === 0,
    write: (key: SawKey, value: number | null) => setWritten((before) => ({ ...before, [key]: value })),
    save,
    takeTheirs: () => newer && take(newer, newer.saws),
    /** One's own changes on top of theirs, to be saved again. */
    keepMine: () =>
      newer && take(newer, { ...newer.saws, ...Object.fromEntries(changed.map((key) => [key, written[key]])) }),
  };
}

function newerOf(error: unknown): SawSet | null {
  if (!(error instanceof ApiProblem) || error.code !== "stale") return null;
  const read = sawSetSchema.safeParse(error.problem?.extra?.newer);
  return read.success ? read.data : null;
}
