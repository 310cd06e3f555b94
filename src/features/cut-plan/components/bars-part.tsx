import { useMemo } from "react";
import { drawCuttingDiagrams } from "#shared/drawing/cutting-diagram.ts";
import type { CuttingPlan } from "#shared/stock-lengths/plan-cutting.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { counted } from "@/lib/format.ts";
import type { BarWork } from "../engine/planner.ts";
import { endedWords, gapWords } from "../model/plan-words.ts";
import { DrawingBlock } from "./drawing-block.tsx";
import { usePaper } from "./use-paper.ts";

/** Bars of one wood and section: how many, how near to the fewest, and each as it is cut. */
export function BarsPart({ work: { task, state }, unit }: { readonly work: BarWork; readonly unit: LengthUnit }) {
  const { ref, paperMm } = usePaper();
  const outcome = state.step === "over" ? state.outcome : null;
  const plan = outcome?.ok ? outcome.value : null;
  const ended = outcome?.ok ? endedWords(outcome.ended) : null;
  const barMm = task.job.stock[0]?.lengthMm ?? 0;
  return (
    <div ref={ref} className="mt-6 break-inside-avoid">
      <h3 className="font-serif text-lg font-bold text-ink break-after-avoid">{task.title}</h3>
      {plan && (
        <p className="text-base text-graphite">
          {counted(plan.partCount, "part")} from {counted(plan.barCount, "bar")} of {formatLengthWithUnit(barMm, unit)}.{" "}
          {gapWords(plan)}
        </p>
      )}
      {ended && <p className="text-base text-graphite">{ended}</p>}
      {outcome && !outcome.ok && (
        <Notice tone="error" title="These parts can't be cut from the bars." className="mt-3">
          {outcome.words}
        </Notice>
      )}
      {plan && paperMm !== null && <Diagrams task={task} plan={plan} unit={unit} paperMm={paperMm} />}
    </div>
  );
}

function Diagrams({
  task: { job, title },
  plan,
  unit,
  paperMm,
}: {
  readonly task: BarWork["task"];
  readonly plan: CuttingPlan;
  readonly unit: LengthUnit;
  readonly paperMm: number;
}) {
  const pages = useMemo(
    () =>
      drawCuttingDiagrams({
        job,
        plan,
        unit,
        widthMm: paperMm,
        heightMm: paperMm * 1.2,
        isTrimmed: true,
      }),
    [job, plan, unit, paperMm],
  );
  return (
    <div className="mt-4 space-y-5">
      {pages.map((list, index) => {
        const what = `${title}, bars${pages.length > 1 ? `, ${index + 1} of ${pages.length}` : ""}`;
        return <DrawingBlock key={what} list={list} title={what} />;
      })}
    </div>
  );
}
