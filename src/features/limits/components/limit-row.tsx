import type { ReactNode } from "react";
import type { DescribedLimit } from "#shared/dry-fit/limit-descriptions.ts";
import { formatLimit } from "#shared/dry-fit/limit-units.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { cx } from "@/lib/cx.ts";

type LimitRowProps = {
  readonly limit: DescribedLimit;
  readonly unit: LengthUnit;
  /** null while nothing is written. */
  readonly value: number | null;
  readonly isUnsaved: boolean;
  /** null where the reader may not change it. */
  readonly onBack: (() => void) | null;
  /** The field, or the figure to read. */
  readonly children: ReactNode;
};

/** One limit: the shop's figure, the default beside it with a way back, and why it is there. */
export function LimitRow({ limit, unit, value, isUnsaved, onBack, children }: LimitRowProps) {
  const usual = formatLimit(limit.usual, limit.unit, unit);
  // Level with what is written in the field, or with the figure that stands in its place.
  const lead = onBack ? "md:pt-9" : "md:pt-6.5";
  const isOwn = !Object.is(value, limit.usual);
  return (
    <li className="grid gap-x-10 gap-y-2 border-b border-rule py-4 md:grid-cols-[minmax(0,20rem)_minmax(0,13rem)_minmax(0,1fr)] lg:grid-cols-[minmax(0,25rem)_minmax(0,13rem)_minmax(0,1fr)]">
      {children}
      <div className={cx("flex flex-wrap items-center gap-x-4 gap-y-1 md:flex-col md:items-start", lead)}>
        <p className="text-sm tabular-nums text-graphite">Default {usual}</p>
        {isUnsaved ? (
          <Mark colour="text-ochre" words="Not saved yet" />
        ) : (
          isOwn && <Mark colour="text-indigo" words="The shop’s own" />
        )}
        {isOwn && onBack && (
          <Button
            kind="bare"
            size="small"
            className="-ml-3"
            aria-label={`${limit.label}: back to the default, ${usual}`}
            onClick={onBack}
          >
            Back to the default
          </Button>
        )}
      </div>
      <p className={cx("max-w-prose text-sm text-graphite", lead)}>{limit.why}</p>
    </li>
  );
}

/** A change, marked by a triangle as on a drawing. */
function Mark({ colour, words }: { readonly colour: string; readonly words: string }) {
  return (
    <p className={cx("flex items-center gap-1.5 text-sm font-semibold", colour)}>
      <svg aria-hidden="true" viewBox="0 0 16 16" className="size-3.5 shrink-0">
        <path d="M8 2L15 14H1Z" fill="none" stroke="currentColor" strokeWidth="1.75" strokeLinejoin="round" />
      </svg>
      {words}
    </p>
  );
}
