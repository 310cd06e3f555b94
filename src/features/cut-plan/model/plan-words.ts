import type { SheetLayout } from "#shared/sheets/nesting.ts";
import type { SlatCut, SlatEdge } from "#shared/slats/slat-layout.ts";
import type { CuttingPlan } from "#shared/stock-lengths/plan-cutting.ts";
import { counted } from "@/lib/format.ts";
import type { Ended, SheetsLaid } from "../engine/plan-messages.ts";
import type { TaskState } from "../engine/planner.ts";

const edges: Readonly<Record<SlatEdge, string>> = {
  spine: "spine",
  left: "left edge",
  right: "right edge",
  upper: "upper edge",
  lower: "lower edge",
  outline: "edge",
};

/** A saw setting in degrees off a square cut, as the saw's scale reads. */
export const degreesWords = (setting: number): string => `${Number(setting.toFixed(1))}°`;

/** The cuts at one end of a slat: setting and what it meets. Trimmed ends may be cut square. */
export const cutsWords = (cuts: readonly SlatCut[]): string =>
  cuts
    .map(({ edge, setting, mustFit }) => `${degreesWords(setting)} ${edges[edge]}${mustFit ? ", fits" : ""}`)
    .join("; ");

/** How near to the best a plan of bars is known to be. */
export function gapWords({ costKind, cost, leastCost, barCount }: CuttingPlan): string {
  if (cost <= leastCost + 1e-6) {
    if (costKind === "bars") return "Proved: no fewer bars will do.";
    return costKind === "length" ? "Proved: no less length will do." : "Proved: no cheaper bars will do.";
  }
  if (costKind !== "bars")
    return `At most ${Math.ceil(((cost - leastCost) / leastCost) * 1000) / 10} % more than needed.`;
  const more = Math.max(1, Math.floor(barCount - leastCost + 1e-6));
  return `At most ${counted(more, "bar")} more than needed.`;
}

/** What a reader must know of how a search ended; null when it ran to its end. */
export function endedWords(ended: Ended): string | null {
  switch (ended) {
    case "searched":
      return null;
    case "by the clock":
      return "The 20 s for it were over: this is the best found by then. Another computer may find another one.";
    case "asked":
      return "Stopped: this is the best that was found by then.";
  }
}

const sheetsUsed = ({ needed }: SheetLayout): number => needed.reduce((sum, { sheets }) => sum + sheets, 0);

/** Sheets that something is cut from, those to be bought included. */
export const sheetCount = ({ layout, bought }: SheetsLaid): number =>
  sheetsUsed(layout) + (bought ? sheetsUsed(bought) : 0);

/** Where a task stands, in a few words. */
export function stateWords<T>(state: TaskState<T>, what: (value: T) => string): string {
  switch (state.step) {
    case "waiting":
      return "waiting";
    case "running":
      return state.best === null ? "being laid out" : `${what(state.best)} so far, looking for better`;
    case "over":
      return state.outcome.ok ? what(state.outcome.value) : "can't be laid out";
  }
}
