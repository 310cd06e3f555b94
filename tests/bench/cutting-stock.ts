import { readFileSync } from "node:fs";
import { z } from "zod";
import { type CuttingJob, type SawRules, squareEnd } from "#shared/stock-lengths/cutting-job.ts";
import { packInOrder } from "#shared/stock-lengths/first-fit.ts";
import { packingOfJob } from "#shared/stock-lengths/packing-of-job.ts";
import { type CuttingPlan, planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { type Measure, type Measurement, summarise } from "../support/benchmark.ts";
import { seededRandom } from "../support/seeded-random.ts";

const plainSaw: SawRules = { kerfMm: 0, squaringMm: 0, rejectShare: 0, nests: false };
const runs = 5;

function jobOf(stockMm: number, lengths: readonly number[], saw: SawRules = plainSaw): CuttingJob {
  return {
    parts: lengths.map((lengthMm, index) => ({
      id: `${index}`,
      label: `${index}`,
      lengthMm,
      quantity: 1,
      start: squareEnd,
      end: squareEnd,
    })),
    stock: [{ id: "bar", label: "bar", lengthMm: stockMm, price: null, onHand: null }],
    widthMm: 38.1,
    saw,
  };
}

const bins = z.object({ bin_size: z.number(), items: z.array(z.number()) });

function referenceJob(name: string): CuttingJob {
  const { bin_size, items } = bins.parse(
    JSON.parse(readFileSync(new URL(`../fixtures/reference/${name}.json`, import.meta.url), "utf8")),
  );
  return jobOf(bin_size, items);
}

/** Slats from bars of 8 ft, their lengths spread evenly. */
function slatJob(count: number, { least = 60, most = 560 } = {}): CuttingJob {
  const random = seededRandom(count);
  const lengths = Array.from({ length: count }, () => least + random() * (most - least));
  return jobOf(2440, lengths, { kerfMm: 3.2, squaringMm: 10, rejectShare: 0, nests: false });
}

function planOf(job: CuttingJob): CuttingPlan {
  const outcome = planCutting(job);
  if (outcome.ok) return outcome.value;
  throw new Error(outcome.problems.map(({ words }) => words).join(" "));
}

const millisecondsOf = (work: () => unknown): number => {
  const start = performance.now();
  work();
  return performance.now() - start;
};

/** How far a plan and first fit decreasing are from what nothing beats, and how much longer the plan takes, in the same run. */
function compare(name: string, job: CuttingJob): Measurement[] {
  const plan = planOf(job);
  const firstFit = () => packInOrder(packingOfJob(job).packing, [0], "first")?.cost ?? 0;
  const ratios = Array.from({ length: runs }, () => {
    const exact = millisecondsOf(() => planOf(job));
    return exact / Math.max(1e-3, millisecondsOf(firstFit));
  });
  return [
    summarise(`${name}: bars over the lower bound`, "%", [plan.gap * 100]),
    summarise(`${name}: the same, first fit`, "%", [(firstFit() / Math.max(1, plan.leastCost) - 1) * 100]),
    summarise(`${name}: time against first fit`, "x", ratios),
  ];
}

/** Gap and time of cutting plans, each against first fit decreasing on the same job. */
export const measure: Measure = async () => [
  ...compare("t60_00", referenceJob("bpp-t60_00")),
  ...compare("u120_00", referenceJob("bpp-u120_00")),
  ...compare("26 slats", slatJob(26)),
  // A quarter to a half of a bar each: hard to pack and to prove.
  ...compare("120 long slats", slatJob(120, { least: 610, most: 1210 })),
  ...compare("300 slats", slatJob(300)),
  ...compare("3,000 slats", slatJob(3_000)),
];
