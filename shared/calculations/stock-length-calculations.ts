import { cutRunMm, kerfAlongMm, nestedRunMm, usableLengthMm } from "../stock-lengths/bar-take.ts";
import { type CuttingJob, squareEnd } from "../stock-lengths/cutting-job.ts";
import { type CuttingPlan, planCutting } from "../stock-lengths/plan-cutting.ts";
import { type CalculationGroup, resultOf, worked } from "./calculation.ts";

/** The textbook's rolls: lengths in mm and how many of each, from rolls of 5600. */
const rollMm = 5600;
const orders: readonly (readonly [lengthMm: number, quantity: number])[] = [
  [1380, 22],
  [1520, 25],
  [1560, 12],
  [1710, 14],
  [1820, 18],
  [1880, 18],
  [1930, 20],
  [2000, 10],
  [2050, 12],
  [2100, 14],
  [2140, 16],
  [2150, 18],
  [2200, 20],
];

const rollsJob: CuttingJob = {
  parts: orders.map(([lengthMm, quantity]) => ({
    id: `${lengthMm}`,
    label: `${lengthMm}`,
    lengthMm,
    quantity,
    start: squareEnd,
    end: squareEnd,
  })),
  stock: [{ id: "roll", label: "roll", lengthMm: rollMm, price: null, onHand: null }],
  widthMm: 1,
  saw: { kerfMm: 0, squaringMm: 0, rejectShare: 0, nests: false },
};

export const stockLengthCalculations: CalculationGroup = {
  title: "Stock lengths",
  calculations: [
    {
      id: "kerf-along",
      title: "What a cut takes along the bar",
      formula: "kerf / sin(angle between blade and bar); the cut itself runs w · cot(angle) along a bar w wide.",
      source: { text: "Trigonometry", status: "calculated" },
      limits: "1 to 90 degrees. A part with two angles is reckoned with the flatter one.",
      example: () => {
        const kerf = 3;
        const angle = 45;
        const width = 38.1;
        return worked(
          [
            ["Kerf", kerf, "mm"],
            ["Blade to bar", angle, "°"],
            ["Bar's width", width, "mm"],
          ],
          [
            ["Kerf along the bar", resultOf(kerfAlongMm(kerf, angle)), "mm"],
            ["The cut runs", resultOf(cutRunMm(width, angle)), "mm"],
          ],
        );
      },
    },
    {
      id: "usable-bar",
      title: "What of a bar can be used",
      formula: "Length · (1 − share lost to knots) − squaring cut. The last cut may fall off the end.",
      source: { text: "Common practice; the share is the shop's own", status: "common practice" },
      limits: "Knots are reckoned in length, not in places: a part may still have to be cut anew.",
      example: () => {
        const bar = { lengthMm: 2440, squaringMm: 10, rejectShare: 0.1 };
        return worked(
          [
            ["Bar", bar.lengthMm, "mm"],
            ["Squaring cut", bar.squaringMm, "mm"],
            ["Lost to knots", bar.rejectShare],
          ],
          [["Can be used", resultOf(usableLengthMm(bar)), "mm"]],
        );
      },
    },
    {
      id: "nested-slats",
      title: "Slats that lie in each other",
      formula:
        "Each a/sin θ + kerf/sin θ, and once w · cot θ a bar. a across the run, θ between blade and bar, w the width.",
      source: { text: "Geometry of the parallelogram", status: "calculated" },
      limits: "Two parallel cuts, one hand. The last cut is in it.",
      example: () => {
        const run = { count: 5, lengthMm: 240 * Math.SQRT2, widthMm: 40, bladeAngle: 45, kerfMm: 3 };
        return worked(
          [
            ["Slats", run.count],
            ["Long point to long point", run.lengthMm, "mm"],
            ["Width", run.widthMm, "mm"],
            ["Blade to bar", run.bladeAngle, "°"],
            ["Kerf", run.kerfMm, "mm"],
          ],
          [["They take", resultOf(nestedRunMm(run)), "mm"]],
        );
      },
    },
    {
      id: "stock-lengths",
      title: "Bars to cut parts from",
      formula:
        "The least cost over all ways to fill bars: bounded from below by patterns in parts of a bar, found by search bar by bar and by rounding those patterns. Both are stated, and their gap.",
      source: {
        text: "Gilmore and Gomory 1961; Farley 1990; Korf 2002. The example is a textbook's",
        status: "published",
      },
      limits: "The search ends after a set amount of work, with the best so far. Up to 20,000 parts.",
      example: () => {
        const { barCount, leastCost, barsMm, partsMm, partCount } = planOf(rollsJob);
        return worked(
          [
            ["Parts", partCount],
            ["Lengths", orders.length],
            ["Each bar", rollMm, "mm"],
          ],
          [
            ["Bars", barCount],
            ["No plan needs fewer than", leastCost],
            ["Left over", barsMm - partsMm, "mm"],
          ],
        );
      },
    },
  ],
};

function planOf(job: CuttingJob): CuttingPlan {
  const outcome = planCutting(job);
  if (outcome.ok) return outcome.value;
  throw new Error(`An example is refused: ${outcome.problems.map(({ words }) => words).join(" ")}`);
}
