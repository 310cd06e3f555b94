import { checkCuttingJob } from "./check-cutting-job.ts";
import type { CuttingJob, CuttingProblem } from "./cutting-job.ts";
import { type CutBar, layBars } from "./lay-bars.ts";
import { type CostKind, packingOfJob } from "./packing-of-job.ts";
import { solvePacking } from "./solve-packing.ts";
import type { Effort } from "./work-meter.ts";

export type CuttingPlan = {
  /** Bars cut alike together; those of the first stock length first. */
  readonly bars: readonly CutBar[];
  /** How many bars of each stock length are needed, in the order of the stock. */
  readonly needed: readonly { readonly stockId: string; readonly bars: number }[];
  readonly barCount: number;
  readonly partCount: number;
  /** All bars, all parts (long point to long point), mm. */
  readonly barsMm: number;
  readonly partsMm: number;
  /** What was kept small, in bars, mm or minor units: what this plan takes and what no plan takes less than. */
  readonly costKind: CostKind;
  readonly cost: number;
  readonly leastCost: number;
  /** How far the plan may be from the best one, as a share of `leastCost`; 0 when there is none better. */
  readonly gap: number;
  /** Nothing better exists, the work allowed was used up, or somebody asked for the end. */
  readonly ended: "proved" | "work" | "asked";
};

export type PlanOutcome =
  | { readonly ok: true; readonly value: CuttingPlan }
  | { readonly ok: false; readonly problems: readonly CuttingProblem[] };

/** Bars to cut all parts of a job from, for the least cost that is found with the effort given. The same job and work give the same plan. */
export function planCutting(job: CuttingJob, effort: Effort = {}): PlanOutcome {
  const problems = checkCuttingJob(job);
  if (problems.length > 0) return { ok: false, problems };
  if (job.parts.length === 0) return { ok: true, value: emptyPlan(job) };
  const jobPacking = packingOfJob(job);
  const { packed, bound, ended } = solvePacking(jobPacking.packing, effort);
  if (!packed) return { ok: false, problems: [{ field: "stock", words: shortOfBars(job) }] };
  const bars = layBars(job, jobPacking, packed.uses).toSorted((a, b) => stockPlace(job, a) - stockPlace(job, b));
  const { costKind, costUnit } = jobPacking;
  return {
    ok: true,
    value: {
      ...totals(job, bars),
      bars,
      costKind,
      cost: packed.cost * costUnit,
      leastCost: Math.min(bound, packed.cost) * costUnit,
      gap: packed.cost <= bound ? 0 : (packed.cost - bound) / Math.max(1, bound),
      ended,
    },
  };
}

const stockPlace = ({ stock }: CuttingJob, { stockId }: CutBar): number => stock.findIndex(({ id }) => id === stockId);

function totals(
  { stock, parts }: CuttingJob,
  bars: readonly CutBar[],
): Pick<CuttingPlan, "needed" | "barCount" | "partCount" | "barsMm" | "partsMm"> {
  const needed = stock.map(({ id }) => ({
    stockId: id,
    bars: bars.reduce((sum, { stockId, times }) => sum + (stockId === id ? times : 0), 0),
  }));
  return {
    needed,
    barCount: needed.reduce((sum, each) => sum + each.bars, 0),
    partCount: parts.reduce((sum, { quantity }) => sum + quantity, 0),
    barsMm: bars.reduce((sum, { lengthMm, times }) => sum + lengthMm * times, 0),
    partsMm: parts.reduce((sum, { lengthMm, quantity }) => sum + lengthMm * quantity, 0),
  };
}

function emptyPlan(job: CuttingJob): CuttingPlan {
  return { ...totals(job, []), bars: [], costKind: "bars", cost: 0, leastCost: 0, gap: 0, ended: "proved" };
}

function shortOfBars({ stock }: CuttingJob): string {
  const count = stock.reduce((sum, { onHand }) => sum + (onHand ?? 0), 0);
  return `No way was found to cut all parts from the ${count === 1 ? "one bar" : `${count} bars`} on hand. Add a stock length that can be bought, or more bars.`;
}
