import { useState } from "react";
import type { CalculationGroup, SourceStatus } from "#shared/calculations/calculation.ts";
import { Button } from "@/components/ui/button.tsx";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { counted } from "@/lib/format.ts";
import type { ExamplesState } from "../engine/use-worked-examples.ts";
import { findCalculations, type NumberedGroup, numbered } from "../model/find-calculations.ts";
import { CalculationEntry } from "./calculation-entry.tsx";
import { CalculationIndex, groupAnchor, indexAnchor } from "./calculation-index.tsx";
import type { ShownOutcome } from "./example-table.tsx";
import { SheetBlock } from "./sheet-block.tsx";
import { StatusKey } from "./source-status.tsx";
import { useShownAnchor } from "./use-shown-anchor.ts";

type CalculationSheetProps = {
  readonly groups: readonly CalculationGroup[];
  readonly state: ExamplesState;
  readonly onComputeAgain: () => void;
};

/** Every calculation as a reference sheet: what the marks mean, an index, and the entries by group. */
export function CalculationSheet({ groups, state, onComputeAgain }: CalculationSheetProps) {
  const [query, setQuery] = useState("");
  const meant = useShownAnchor(state.step);
  const all = numbered(groups);
  const found = findCalculations(all, query);
  return (
    <>
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-2">
        <div>
          <Notice tone="caution" title="Estimates for planning">
            Local codes and licensed practice come first, then the maker's sheet, then a trial on scrap. Nothing here
            says that a sign complies or will hold.
          </Notice>
          <div className="mt-6 max-w-md">
            <label htmlFor="find-calculation" className="text-sm font-semibold text-ink">
              Find a calculation
            </label>
            <input
              id="find-calculation"
              type="search"
              placeholder="A word, as screw or contrast"
              value={query}
              onChange={(event) => setQuery(event.target.value)}
              className="mt-1 min-h-11 w-full border-b border-ink bg-transparent px-1 text-base text-ink placeholder:text-graphite"
            />
          </div>
          <p role="status" className="mt-2 text-sm tabular-nums text-graphite">
            {countOf(found) === countOf(all)
              ? `${counted(countOf(all), "calculation")} in ${counted(all.length, "group")}`
              : `${countOf(found)} of ${counted(countOf(all), "calculation")}`}
          </p>
        </div>
        <section aria-labelledby="sources">
          <h2 id="sources" className="pb-2 font-serif text-base font-bold text-ink">
            How sure a rule is
          </h2>
          <StatusKey counts={countsByStatus(groups)} />
        </section>
      </div>

      {state.step === "failed" && (
        <Notice tone="error" title="The worked examples could not be computed" className="mt-8">
          <p>{state.reason} The rules below stand without them.</p>
          <Button size="small" className="mt-3" onClick={onComputeAgain}>
            Compute them again
          </Button>
        </Notice>
      )}

      <div className="mt-10">
        {found.length === 0 ? (
          <EmptyState
            title={`No calculation has “${query.trim()}” in it`}
            action={<Button onClick={() => setQuery("")}>Show them all</Button>}
          >
            Try a single word: hole, screw, pocket, letter, mass.
          </EmptyState>
        ) : (
          <CalculationIndex groups={found} />
        )}
      </div>

      <div aria-busy={state.step === "computing"}>
        {found.map(({ number, title, entries }) => (
          <section key={number} aria-labelledby={groupAnchor(number)} className="mt-12">
            <div className="flex items-end justify-between gap-4 border-b-2 border-ink pb-2">
              <h2
                id={groupAnchor(number)}
                tabIndex={-1}
                className="flex scroll-mt-4 gap-3 font-serif text-xl font-bold text-ink"
              >
                <span className="tabular-nums text-graphite">{number}</span>
                {title}
              </h2>
              <TextLink to={{ hash: indexAnchor }} className="py-1 text-sm">
                Index
              </TextLink>
            </div>
            {entries.map(({ number: place, calculation }) => (
              <CalculationEntry
                key={calculation.id}
                number={place}
                calculation={calculation}
                outcome={outcomeOf(state, calculation.id)}
                isMeant={calculation.id === meant}
              />
            ))}
          </section>
        ))}
      </div>
      <SheetBlock total={countOf(all)} state={state} />
    </>
  );
}

function outcomeOf(state: ExamplesState, id: string): ShownOutcome {
  if (state.step === "computing") return "computing";
  return state.step === "failed" ? "not computed" : (state.examples[id] ?? "not computed");
}

const countOf = (groups: readonly NumberedGroup[]): number =>
  groups.reduce((sum, { entries }) => sum + entries.length, 0);

function countsByStatus(groups: readonly CalculationGroup[]): Record<SourceStatus, number> {
  const counts = { published: 0, calculated: 0, "common practice": 0, "from memory": 0, "our choice": 0 };
  for (const { source } of groups.flatMap(({ calculations }) => calculations)) counts[source.status] += 1;
  return counts;
}
