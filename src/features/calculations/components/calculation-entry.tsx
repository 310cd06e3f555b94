import type { Calculation, WorkedExample } from "#shared/calculations/calculation.ts";
import { cx } from "@/lib/cx.ts";
import { ExampleTable, type ShownOutcome } from "./example-table.tsx";
import { StatusMark, saysOnly } from "./source-status.tsx";

type CalculationEntryProps = {
  readonly number: string;
  readonly calculation: Calculation;
  readonly outcome: ShownOutcome;
  /** Whether the address points at this one. */
  readonly isMeant: boolean;
};

/** One calculation: the rule and where it comes from on the left, its worked example on the right. */
export function CalculationEntry({ number, calculation, outcome, isMeant }: CalculationEntryProps) {
  const { id, title, formula, source, limits } = calculation;
  return (
    <article
      id={id}
      tabIndex={-1}
      aria-labelledby={`${id}-title`}
      className={cx(
        "scroll-mt-4 grid gap-x-10 gap-y-4 border-b border-rule py-5 lg:grid-cols-[3rem_minmax(0,1fr)_22rem]",
        isMeant && "-mx-3 bg-indigo/8 px-3",
      )}
    >
      <p className="hidden font-serif text-base tabular-nums text-graphite lg:block">{number}</p>
      <div className="min-w-0">
        <h3 id={`${id}-title`} className="font-serif text-base font-bold text-ink">
          <span className="pr-2 font-normal tabular-nums text-graphite lg:sr-only">{number}</span>
          {title}
        </h3>
        <p className="mt-2 max-w-prose font-serif text-base text-ink">{formula}</p>
        <dl className="mt-3 grid grid-cols-[4.5rem_minmax(0,1fr)] gap-x-3 gap-y-1 text-sm">
          <dt className="text-graphite">Source</dt>
          <dd className="max-w-prose text-ink">
            <StatusMark status={source.status} />
            {!saysOnly(source.text, source.status) && <span className="block">{source.text}</span>}
          </dd>
          <dt className="text-graphite">Limits</dt>
          <dd className="max-w-prose text-ink">{limits}</dd>
          <dt className="text-graphite">Units</dt>
          <dd className="text-ink">{typeof outcome === "object" && outcome.ok ? unitsOf(outcome.example) : "–"}</dd>
        </dl>
      </div>
      <div className="min-w-0">
        <p className="pb-1 text-fine font-semibold text-graphite">
          {typeof outcome === "object" ? "Worked example, computed now" : "Worked example"}
        </p>
        <ExampleTable of={title} outcome={outcome} />
      </div>
    </article>
  );
}

function unitsOf({ given, gives }: WorkedExample): string {
  const units = new Set([...given, ...gives].map(({ unit }) => unit).filter(Boolean));
  return units.size > 0 ? [...units].join(", ") : "none: a count, a share or a word";
}
