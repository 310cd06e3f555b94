import type { SawSet } from "#shared/contracts/saws.ts";
import { type SawField, sawGroups } from "#shared/cut-plan/saw-fields.ts";
import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import {
  type FigureUnit,
  formatLimit,
  isLength,
  shownFigure,
  storedFigure,
  tidy,
} from "#shared/dry-fit/limit-units.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { UnsavedGuard } from "@/components/ui/unsaved-guard.tsx";
import { counted } from "@/lib/format.ts";
import { useSawsForm } from "./use-saws-form.ts";

type SawsFormProps = { readonly shop: string; readonly unit: LengthUnit; readonly set: SawSet };

/** How the shop cuts, to be changed: all figures are saved at once, and the plan is made anew with them. */
export function SawsForm({ shop, unit, set }: SawsFormProps) {
  const form = useSawsForm(shop, unit, set);
  const { written, changed, faults, newer, problem, busy } = form;
  return (
    <form
      noValidate
      aria-label="How we cut"
      onSubmit={(event) => {
        event.preventDefault();
        void form.save();
      }}
    >
      <UnsavedGuard when={changed.length > 0 && !busy} what="How we cut" />
      <div className="grid gap-x-12 gap-y-6 md:grid-cols-2">
        {sawGroups.map(({ title, fields }) => (
          <fieldset key={title} className="min-w-0 space-y-4">
            <legend className="font-serif text-lg font-bold text-ink">{title}</legend>
            {fields.map((field) => (
              <Figure
                key={field.key}
                field={field}
                unit={unit}
                value={written[field.key]}
                fault={faults.find(({ key }) => key === field.key)?.detail}
                onChange={(value) => form.write(field.key, value)}
              />
            ))}
          </fieldset>
        ))}
      </div>
      <div className="mt-6 space-y-3">
        {newer && (
          <Notice tone="caution" title="Not saved: the figures were changed meanwhile.">
            <p>{newer.savedBy ?? "Someone"} saved others. Your changes are still here.</p>
            <div className="mt-2 flex flex-wrap gap-3">
              <Button size="small" onClick={form.keepMine}>
                Lay my changes over theirs
              </Button>
              <Button size="small" onClick={form.takeTheirs}>
                Take theirs
              </Button>
            </div>
          </Notice>
        )}
        {problem && <Notice tone="error">{problem}</Notice>}
        <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
          <Button type="submit" busy={busy} disabled={changed.length === 0 && !busy}>
            Save and plan again
          </Button>
          <p role="status" className="text-sm text-graphite">
            {form.saved
              ? "Saved. Every plan of the shop keeps to it."
              : [
                  changed.length > 0 && `${counted(changed.length, "change")} not saved yet.`,
                  faults.length > 0 && `${counted(faults.length, "figure")} to mend first.`,
                ]
                  .filter(Boolean)
                  .join(" ")}
          </p>
        </div>
      </div>
    </form>
  );
}

type FigureProps = {
  readonly field: SawField;
  readonly unit: LengthUnit;
  readonly value: number | null;
  readonly fault: string | undefined;
  readonly onChange: (value: number | null) => void;
};

function Figure({ field: { key, label, unit: figure, why }, unit, value, fault, onChange }: FigureProps) {
  const hint = `${why} Default ${formatLimit(usualSaws[key], figure, unit)}.`;
  if (isLength(figure))
    return (
      <LengthField
        label={label}
        unit={unit}
        fine={figure === "small length"}
        hint={hint}
        value={value}
        error={fault}
        onChange={(mm) => onChange(mm === null ? null : tidy(mm))}
      />
    );
  return <Share label={label} figure={figure} hint={hint} value={value} error={fault} onChange={onChange} />;
}

type ShareProps = {
  readonly label: string;
  readonly figure: FigureUnit;
  readonly hint: string;
  readonly value: number | null;
  readonly error: string | undefined;
  readonly onChange: (value: number | null) => void;
};

function Share({ figure, value, onChange, ...field }: ShareProps) {
  return (
    <NumberField
      {...field}
      suffix="%"
      value={value === null || Number.isNaN(value) ? value : shownFigure(value, figure)}
      onChange={(shown) => onChange(shown === null ? null : storedFigure(shown, figure))}
    />
  );
}
