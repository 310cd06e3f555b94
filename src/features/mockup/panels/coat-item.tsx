import { Field } from "@/components/ui/field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import type { CoatDraft, CoatProblems } from "../model/coat-draft.ts";
import { WordButton } from "./cell-controls.tsx";

type CoatItemProps = {
  readonly coat: CoatDraft;
  readonly place: number;
  readonly of: number;
  readonly problems: CoatProblems;
  /** Whether what is missing is to be said, and not only what is wrong. */
  readonly tried: boolean;
  readonly onChange: (more: Partial<CoatDraft>) => void;
  readonly onMove: (by: -1 | 1) => void;
  readonly onRemove: () => void;
};

const kindWords: Readonly<Record<CoatDraft["kind"], string>> = {
  sanding: "Sanding",
  conditioner: "Conditioner",
  stain: "Stain",
  "clear coat": "Clear coat",
  other: "Other",
};

/** One coat: what it is, the fields of its kind, and its place among the others. */
export function CoatItem({ coat, place, of, problems, tried, onChange, onMove, onRemove }: CoatItemProps) {
  const { id, kind } = coat;
  const sayable = (value: number | null) => tried || (value !== null && !Number.isNaN(value));
  return (
    <li data-coat={id} aria-label={`Coat ${place}, ${kindWords[kind]}`} className="flex items-start gap-3 py-2">
      <p className="w-24 shrink-0 pt-8 text-sm">
        <span className="pr-2 font-serif font-bold tabular-nums">{place}</span>
        {kindWords[kind]}
      </p>
      <div className="flex min-w-0 flex-1 flex-wrap items-start gap-3">
        {kind === "sanding" ? (
          <NumberField
            className="w-28"
            label="Grit"
            value={coat.grit}
            onChange={(grit) => onChange({ grit })}
            error={sayable(coat.grit) ? problems.grit : undefined}
          />
        ) : (
          <>
            <Field
              className="min-w-40 flex-1"
              label="Name"
              maxLength={120}
              value={coat.name}
              onChange={(event) => onChange({ name: event.target.value })}
              error={tried ? problems.name : undefined}
            />
            {kind === "stain" && (
              <>
                <Field
                  className="w-16"
                  label="Colour"
                  type="color"
                  value={coat.colour.toLowerCase()}
                  onChange={(event) => onChange({ colour: event.target.value.toUpperCase() })}
                />
                <NumberField
                  className="w-28"
                  label="Strength"
                  suffix="%"
                  value={coat.strength === null ? null : Math.round(coat.strength * 10_000) / 100}
                  onChange={(percent) => onChange({ strength: percent === null ? null : percent / 100 })}
                  error={sayable(coat.strength) ? problems.strength : undefined}
                />
              </>
            )}
            {kind === "clear coat" && (
              <Select
                className="w-40"
                label="Base"
                value={coat.base}
                onChange={(event) =>
                  onChange({ base: event.target.value === "water-borne" ? "water-borne" : "oil or shellac" })
                }
              >
                <option value="water-borne">water-borne</option>
                <option value="oil or shellac">oil or shellac</option>
              </Select>
            )}
            <NumberField
              className="w-28"
              label="Dries"
              suffix="hours"
              value={coat.dryingHours}
              onChange={(hours) => onChange({ dryingHours: hours })}
              error={sayable(coat.dryingHours) ? problems.dryingHours : undefined}
            />
          </>
        )}
      </div>
      <div className="flex shrink-0 pt-8">
        <WordButton
          data-way="up"
          disabled={place === 1}
          aria-label={`Coat ${place} earlier`}
          onClick={() => onMove(-1)}
        >
          earlier
        </WordButton>
        <WordButton
          data-way="down"
          disabled={place === of}
          aria-label={`Coat ${place} later`}
          onClick={() => onMove(1)}
        >
          later
        </WordButton>
        <WordButton aria-label={`Remove coat ${place}`} onClick={onRemove}>
          remove
        </WordButton>
      </div>
    </li>
  );
}
