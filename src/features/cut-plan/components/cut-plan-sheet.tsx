import { useMemo } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import { countParts } from "#shared/cut-plan/counts.ts";
import { type BarResult, listToBuy, type SheetResult } from "#shared/cut-plan/to-buy.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cx } from "@/lib/cx.ts";
import type { PlanInput } from "../engine/plan-messages.ts";
import type { PlanPort } from "../engine/planner.ts";
import { useCutPlan } from "../engine/use-cut-plan.ts";
import { countedParts } from "../model/stock-counts.ts";
import { BarsPart } from "./bars-part.tsx";
import { CountsPart } from "./counts-part.tsx";
import { FramePart } from "./frame-part.tsx";
import { Part } from "./part.tsx";
import { PlanProgress } from "./plan-progress.tsx";
import { SheetsPart } from "./sheets-part.tsx";
import { SlatsPart } from "./slats-part.tsx";
import { ToBuyTable } from "./to-buy-table.tsx";

type CutPlanSheetProps = {
  readonly input: PlanInput;
  /** The stock list with its counts. */
  readonly items: readonly StockItem[];
  readonly openPort?: () => PlanPort;
};

/** Everything that is cut and laid ready for a build, in the order of the work. */
export function CutPlanSheet({ input, items, openPort }: CutPlanSheetProps) {
  const plan = useCutPlan(input, openPort);
  const { document, unit, saws } = input;
  const { sheets, bars, wood, step } = plan.state;
  const counts = useMemo(() => countParts(document, unit), [document, unit]);
  const toBuy = useMemo(
    () =>
      listToBuy({
        sheets: sheets.map(({ task, state }): SheetResult => {
          const laid = state.step === "over" && state.outcome.ok ? state.outcome.value : null;
          return { task, layout: laid?.layout ?? null, bought: laid?.bought ?? null };
        }),
        bars: bars.map(({ task, state }): BarResult => {
          return { task, plan: state.step === "over" && state.outcome.ok ? state.outcome.value : null };
        }),
        counts,
        counted: countedParts(items),
        saws,
        unit,
      }),
    [sheets, bars, counts, items, saws, unit],
  );
  const slats = wood?.slats ?? null;
  const frame = wood?.frame ?? null;
  const parts = [
    { id: "sheets", title: "Sheets", isThere: sheets.length > 0 },
    { id: "bars", title: "Bars", isThere: bars.length > 0 },
    { id: "slats", title: "Slats", isThere: slats !== null },
    { id: "frame", title: "Frame", isThere: frame !== null },
    { id: "counts", title: "Counts", isThere: true },
    { id: "to-buy", title: "What to buy", isThere: true },
  ].filter(({ isThere }) => isThere);
  const titleOf = (id: string) => {
    const place = parts.findIndex((part) => part.id === id);
    return `${place + 1}. ${parts[place]?.title ?? ""}`;
  };

  return (
    <div aria-busy={step === "reading" || step === "planning"}>
      <p className="max-w-3xl text-base text-graphite">
        Wear eye protection, keep the guards on, try each setting on scrap first. The makers’ sheets come before this
        plan.
      </p>
      <nav aria-label="Parts of the plan" className="mt-3 mb-5 print:hidden">
        <ul className="flex flex-wrap gap-x-5 gap-y-1">
          {parts.map(({ id }) => (
            <li key={id}>
              <TextLink to={{ hash: id }} className="inline-block py-2">
                {titleOf(id)}
              </TextLink>
            </li>
          ))}
        </ul>
      </nav>
      <PlanProgress plan={plan} />
      {sheets.length > 0 && (
        <Part id="sheets" title={titleOf("sheets")}>
          <div className={cx("grid grid-cols-1 items-start gap-x-8", sheets.length > 1 && "lg:grid-cols-2")}>
            {sheets.map((work) => (
              <SheetsPart key={work.task.id} work={work} unit={unit} />
            ))}
          </div>
        </Part>
      )}
      {bars.length > 0 && (
        <Part id="bars" title={titleOf("bars")}>
          {bars.map((work) => (
            <BarsPart key={work.task.id} work={work} unit={unit} />
          ))}
        </Part>
      )}
      {slats && (
        <Part id="slats" title={titleOf("slats")}>
          {slats.ok ? (
            <SlatsPart plan={slats.value} document={document} unit={unit} />
          ) : (
            <Notice tone="error" title="The slats can't be laid." className="mt-4">
              {slats.words}
            </Notice>
          )}
        </Part>
      )}
      {frame && (
        <Part id="frame" title={titleOf("frame")}>
          {frame.ok ? (
            <FramePart frame={frame.value} unit={unit} />
          ) : (
            <Notice tone="error" title="The frame can't be made." className="mt-4">
              {frame.words}
            </Notice>
          )}
        </Part>
      )}
      <Part id="counts" title={titleOf("counts")}>
        <CountsPart counts={counts} quantity={document.quantity} unit={unit} />
      </Part>
      <Part id="to-buy" title={titleOf("to-buy")}>
        <ToBuyTable lines={toBuy} />
      </Part>
    </div>
  );
}
