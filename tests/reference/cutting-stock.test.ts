import { describe, expect, it } from "vitest";
import { z } from "zod";
import { type CuttingJob, squareEnd } from "#shared/stock-lengths/cutting-job.ts";
import { packInOrder } from "#shared/stock-lengths/first-fit.ts";
import { packingOfJob } from "#shared/stock-lengths/packing-of-job.ts";
import { planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { faultsOfPlan } from "../support/check-cuts.ts";
import { checkReference } from "../support/check-reference.ts";
import { referenceJson } from "../support/reference-data.ts";

const bins = z.object({
  name: z.string(),
  source: z.string(),
  bin_size: z.number(),
  optimum_bins: z.number(),
  first_fit_decreasing: z.number(),
  items: z.array(z.number()),
});
const rolls = z.object({
  source: z.string(),
  stock_mm: z.number(),
  orders: z.array(z.object({ length_mm: z.number(), qty: z.number() })),
  optimum_rolls: z.number(),
  pieces: z.number(),
  waste_mm: z.number(),
});

/** Square cuts without kerf, one length of bar. */
function plainJob(stockMm: number, parts: readonly (readonly [lengthMm: number, quantity: number])[]): CuttingJob {
  return {
    parts: parts.map(([lengthMm, quantity], index) => ({
      id: `p${index}`,
      label: `${index}`,
      lengthMm,
      quantity,
      start: squareEnd,
      end: squareEnd,
    })),
    stock: [{ id: "bar", label: "Bar", lengthMm: stockMm, price: null, onHand: null }],
    widthMm: 40,
    saw: { kerfMm: 0, squaringMm: 0, rejectShare: 0, nests: false },
  };
}

describe("bin packing with published optima", () => {
  it.each(["bpp-t60_00.json", "bpp-u120_00.json", "bpp-N1C1W1_A.json"])("%s is packed and proved", (file) => {
    const data = bins.parse(referenceJson(file));
    const job = plainJob(
      data.bin_size,
      data.items.map((size) => [size, 1]),
    );
    const outcome = planCutting(job);
    if (!outcome.ok) throw new Error("refused");
    const { value: plan } = outcome;
    // E. Falkenauer 1996 (20 and 48), A. Scholl et al. 1997 (25).
    checkReference({
      what: `bars of ${data.name}`,
      source: data.source.slice(0, 60),
      expected: data.optimum_bins,
      got: plan.barCount,
      within: 0,
    });
    expect(plan).toMatchObject({ leastCost: data.optimum_bins, gap: 0, ended: "proved" });
    expect(faultsOfPlan(job, plan)).toEqual([]);
  });

  it.each(["bpp-t60_00.json", "bpp-u120_00.json", "bpp-N1C1W1_A.json"])("%s by first fit decreasing alone", (file) => {
    const data = bins.parse(referenceJson(file));
    const { packing } = packingOfJob(
      plainJob(
        data.bin_size,
        data.items.map((size) => [size, 1]),
      ),
    );
    // 23, 49 and 25: calculated with another program.
    expect(packInOrder(packing, [0], "first")?.cost).toBe(data.first_fit_decreasing);
  });

  it("cuts 219 rolls from 73 of 5600 mm, and wastes 1640 mm", () => {
    // Textbook example of the cutting-stock problem; optimum and waste calculated and proved by a solver.
    const data = rolls.parse(referenceJson("csp-rolls-5600.json"));
    const job = plainJob(
      data.stock_mm,
      data.orders.map(({ length_mm, qty }) => [length_mm, qty]),
    );
    const outcome = planCutting(job);
    if (!outcome.ok) throw new Error("refused");
    const { value: plan } = outcome;
    checkReference({ what: "5600 mm rolls", source: "textbook example", expected: 73, got: plan.barCount, within: 0 });
    expect(plan).toMatchObject({ leastCost: 73, gap: 0, ended: "proved", partCount: 219 });
    expect(plan.barsMm - plan.partsMm).toBe(data.waste_mm);
    expect(faultsOfPlan(job, plan)).toEqual([]);
  });
});
