import { useEffect, useEffectEvent, useState } from "react";
import { type Resolver, type ResolverError, useForm } from "react-hook-form";
import { type LimitSet, limitSetSchema } from "#shared/contracts/limits.ts";
import { checkLimits, type WrittenLimits } from "#shared/dry-fit/check-limits.ts";
import { limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import type { LimitKey } from "#shared/dry-fit/limit-texts/limit-text.ts";
import { type Limits, limitsSchema } from "#shared/dry-fit/limits.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ApiProblem } from "@/lib/api-client.ts";
import { useSend } from "@/lib/use-send.ts";
import { useChangeLimits } from "../api/mutations.ts";
import { changedLimits, onto } from "../model/changed-limits.ts";

type Written = { limits: WrittenLimits };
type Checked = { limits: Limits };

const fields = limitKeys.map((key) => `limits.${key}` as const);

/**
 * The form of the limits. It begins from a set and saves onto that version; a set that somebody else saved meanwhile is
 * taken in at once while nothing is changed here, and laid before the reader (`newer`) when saving meets it.
 */
export function useLimitsForm(shop: string, unit: LengthUnit, set: LimitSet) {
  const change = useChangeLimits(shop);
  const [base, setBase] = useState(set);
  const [newer, setNewer] = useState<LimitSet | null>(null);
  const form = useForm<Written, unknown, Checked>({
    defaultValues: { limits: set.limits },
    resolver: resolverIn(unit),
  });
  const written = form.watch("limits");
  const changed = changedLimits(written, base.limits);

  function take(next: LimitSet, limits: WrittenLimits) {
    setBase(next);
    setNewer(null);
    form.reset({ limits });
  }
  const takeIfUntouched = useEffectEvent((next: LimitSet) => {
    if (next.version > base.version && changed.length === 0) take(next, next.limits);
  });
  useEffect(() => takeIfUntouched(set), [set]);

  const send = useSend(form, fields, async ({ limits }) => {
    try {
      const saved = await change.mutateAsync({ version: base.version, limits });
      take(saved, saved.limits);
    } catch (error) {
      const theirs = newerOf(error);
      if (theirs === null) throw error;
      setNewer(theirs);
    }
  });
  // A pair's fault goes when either of the two is mended, so all of them are looked at anew with each change.
  const faults = form.formState.isSubmitted ? checkLimits(written, unit) : [];
  const refused = form.formState.errors.limits;
  const faultOf = (key: LimitKey): string | undefined =>
    faults.find((fault) => fault.key === key)?.detail ??
    (refused?.[key]?.type === "server" ? refused[key].message : undefined);
  return {
    ...send,
    form,
    faultOf,
    toMend: limitKeys.filter((key) => faultOf(key) !== undefined).length,
    written,
    changed,
    saved: change.isSuccess && changed.length === 0,
    newer,
    takeTheirs: () => newer && take(newer, newer.limits),
    keepMine: () => newer && take(newer, onto(newer.limits, written, base.limits)),
  };
}

/** Faults in the unit that the shop reads lengths in. */
function resolverIn(unit: LengthUnit): Resolver<Written, unknown, Checked> {
  return ({ limits }) => {
    const faults = checkLimits(limits, unit);
    if (faults.length === 0) return { values: { limits: limitsSchema.parse(limits) }, errors: {} };
    const messages = faults.map(({ key, detail }) => [key, { type: "limits", message: detail }]);
    const refused: ResolverError<Written> = { values: {}, errors: { limits: Object.fromEntries(messages) } };
    return refused;
  };
}

function newerOf(error: unknown): LimitSet | null {
  if (!(error instanceof ApiProblem) || error.code !== "stale") return null;
  const read = limitSetSchema.safeParse(error.problem?.extra?.newer);
  return read.success ? read.data : null;
}
