import type { LimitSet } from "#shared/contracts/limits.ts";
import { describeLimit, limitKeys } from "#shared/dry-fit/limit-descriptions.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { NewerNotice } from "@/components/ui/newer-notice.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { UnsavedGuard } from "@/components/ui/unsaved-guard.tsx";
import { counted } from "@/lib/format.ts";
import { LimitField } from "./limit-field.tsx";
import { LimitGroups } from "./limit-groups.tsx";
import { LimitIndex } from "./limit-index.tsx";
import { LimitRow } from "./limit-row.tsx";
import { useLimitsForm } from "./use-limits-form.ts";

type LimitsFormProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly set: LimitSet;
  readonly explanationOf: (rule: number) => string | null;
};

/** The limits to be set, all saved at once. */
export function LimitsForm({ shop, unit, set, explanationOf }: LimitsFormProps) {
  const limits = useLimitsForm(shop, unit, set);
  const { form, written, changed, busy, newer } = limits;
  const own = limitKeys.filter((key) => written[key] !== describeLimit(key).usual);
  const back = (keys: readonly (typeof own)[number][]) => {
    for (const key of keys) form.setValue(`limits.${key}`, describeLimit(key).usual, { shouldValidate: true });
  };
  return (
    <form
      noValidate
      onSubmit={limits.handleSubmit}
      aria-label="Limits of the dry fit"
      className="[&_:is(a,button,input)]:scroll-mb-32"
    >
      <UnsavedGuard when={changed.length > 0 && !busy} what="The shop’s set of limits" />
      <div className="flex min-h-11 flex-wrap items-center gap-x-6 gap-y-1">
        <p role="status" className="text-base text-ink">
          {own.length === 0
            ? "Every limit is at its default."
            : `${own.length} of ${limitKeys.length} limits ${own.length === 1 ? "is" : "are"} the shop’s own.`}
        </p>
        {own.length > 1 && (
          <Button kind="bare" size="small" onClick={() => back(own)}>
            All back to the defaults
          </Button>
        )}
      </div>
      <LimitIndex />
      <LimitGroups explanationOf={explanationOf}>
        {(limit) => (
          <LimitRow
            key={limit.key}
            limit={limit}
            unit={unit}
            value={written[limit.key]}
            isUnsaved={changed.includes(limit.key)}
            onBack={() => back([limit.key])}
          >
            <LimitField limit={limit} unit={unit} fault={limits.faultOf(limit.key)} control={form.control} />
          </LimitRow>
        )}
      </LimitGroups>
      <div className="sticky bottom-0 -mx-4 space-y-3 border-t border-ink bg-paper px-4 py-3 sm:-mx-6 sm:px-6">
        {newer && <NewerNotice what="limits" newer={newer} onTake={limits.takeTheirs} onKeep={limits.keepMine} />}
        {limits.problem && <Notice tone="error">{limits.problem}</Notice>}
        <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
          <Button type="submit" kind="primary" busy={busy} disabled={changed.length === 0 && !busy}>
            Save the limits
          </Button>
          <p role="status" className="text-sm text-graphite">
            {limits.saved
              ? "Saved. Mockups keep to them from now on; sheets already issued stay as they are."
              : [
                  changed.length > 0 && `${counted(changed.length, "change")} not saved yet.`,
                  limits.toMend > 0 && `${counted(limits.toMend, "limit")} to mend first.`,
                ]
                  .filter(Boolean)
                  .join(" ")}
          </p>
        </div>
      </div>
    </form>
  );
}
