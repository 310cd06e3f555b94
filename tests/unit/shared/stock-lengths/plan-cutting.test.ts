import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type BarPart, type CuttingJob, type StockLength, squareEnd } from "#shared/stock-lengths/cutting-job.ts";
import { type CuttingPlan, planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { faultsOfPlan } from "../../../support/check-cuts.ts";
import { seededRandom } from "../../../support/seeded-random.ts";
import { tryAllCuts } from "../../../support/try-all-cuts.ts";

const bar = (lengthMm: number, overrides: Partial<StockLength> = {}): StockLength => ({
  id: `bar ${lengthMm}`,
  label: `${lengthMm} mm bar`,
  lengthMm,
  price: null,
  onHand: null,
  ...overrides,
});
const part = (id: string, lengthMm: number, overrides: Partial<BarPart> = {}): BarPart => ({
  id,
  label: id,
  lengthMm,
  quantity: 1,
  start: squareEnd,
  end: squareEnd,
  ...overrides,
});
const buildJob = (overrides: Partial<CuttingJob> = {}): CuttingJob => ({
  parts: [part("a", 400), part("b", 300)],
  stock: [bar(1000)],
  widthMm: 38.1,
  saw: { kerfMm: 3.2, squaringMm: 10, rejectShare: 0, nests: false },
  ...overrides,
});
const saw = (overrides: Partial<CuttingJob["saw"]> = {}) => ({ ...buildJob().saw, ...overrides });
/** Both cuts at 45 degrees the same way. */
const slant = (hand: "left" | "right"): Pick<BarPart, "start" | "end"> => ({
  start: { angle: 45, longPoint: hand === "left" ? "upper" : "lower" },
  end: { angle: 45, longPoint: hand === "left" ? "lower" : "upper" },
});

function planOf(job: CuttingJob, effort = {}): CuttingPlan {
  const outcome = planCutting(job, effort);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
  expect(faultsOfPlan(job, outcome.value)).toEqual([]);
  return outcome.value;
}

describe("what a bar holds", () => {
  // By hand: 10 squared off, two kerfs of 3.2 between three parts of (1000 − 10 − 6.4) / 3 = 327.866….
  it.each([
    { length: 327.866, bars: 1, why: "three with two kerfs between them just fit, the last cut falls off the end" },
    { length: 327.868, bars: 2, why: "a hair longer they don't" },
  ])("three parts of $length mm: $why", ({ length, bars }) => {
    expect(planOf(buildJob({ parts: [part("a", length, { quantity: 3 })] })).barCount).toBe(bars);
  });

  it.each([
    { length: 990, saw: saw(), bars: 1 },
    { length: 900, saw: saw({ squaringMm: 0, rejectShare: 0.1 }), bars: 1 },
    { length: 1000, saw: saw({ squaringMm: 0 }), bars: 1 },
  ])("a part of $length mm has a bar to itself where it is as long as what can be used", ({ length, saw, bars }) => {
    expect(planOf(buildJob({ parts: [part("a", length)], saw })).barCount).toBe(bars);
  });

  it("a kerf at 45 degrees takes 4.53 of 3.2 mm", () => {
    // Three of 327 need 981 + 2 · 3.2 = 987.4 square, and 981 + 2 · 4.525 = 990.05 at 45: more than the 990.
    const square = part("a", 327, { quantity: 3 });
    expect(planOf(buildJob({ parts: [square] })).barCount).toBe(1);
    expect(planOf(buildJob({ parts: [{ ...square, ...slant("left") }] })).barCount).toBe(2);
    // With one end square and one at 45 the flatter cut counts.
    expect(planOf(buildJob({ parts: [{ ...square, end: slant("left").end }] })).barCount).toBe(2);
  });

  it("knots take their share", () => {
    // 1000 · 0.8 = 800 less 10: two of 393.4 and a kerf are 790.
    const parts = [part("a", 393.4, { quantity: 2 })];
    expect(planOf(buildJob({ parts, saw: saw({ rejectShare: 0.2 }) })).barCount).toBe(1);
    expect(planOf(buildJob({ parts, saw: saw({ rejectShare: 0.201 }) })).barCount).toBe(2);
  });
});

describe("slats that lie in each other", () => {
  it("take a / sin θ and a kerf each, and the mitre once a bar", () => {
    // 269.4 at 45° and 38.1 wide: each 231.3 + 4.5255, once 38.1; four of them 4 · 235.8255 + 38.1 − 4.5255 = 976.88.
    const parts = [part("a", 269.4, { quantity: 4, ...slant("left") })];
    const job = buildJob({ parts, saw: saw({ nests: true }) });
    expect(planOf(job).barCount).toBe(1);
    expect(planOf({ ...job, saw: saw({ nests: false }) }).barCount).toBe(2);
    const [first, second] = planOf(job).bars[0]?.places ?? [];
    expect(second?.isNested).toBe(true);
    expect(second?.fromMm).toBeCloseTo((first?.toMm ?? 0) + 3.2 * Math.SQRT2 - 38.1, 9);
  });

  it("lie together by hand, left with left", () => {
    const parts = ["a", "b", "c", "d"].map((id, at) => part(id, 220, slant(at % 2 === 0 ? "left" : "right")));
    const plan = planOf(buildJob({ parts, saw: saw({ nests: true }) }));
    expect(plan.bars[0]?.places.map(({ partId, isNested }) => [partId, isNested])).toEqual([
      ["a", false],
      ["c", true],
      ["b", false],
      ["d", true],
    ]);
  });

  it("a part shorter than its own mitre is no parallelogram and lies alone", () => {
    const plan = planOf(
      buildJob({ parts: [part("a", 30, { quantity: 2, ...slant("left") })], saw: saw({ nests: true }) }),
    );
    expect(plan.bars[0]?.places.map(({ isNested }) => isNested)).toEqual([false, false]);
  });
});

describe("several lengths in stock", () => {
  const parts = [part("a", 900, { quantity: 2 }), part("b", 450, { quantity: 2 })];

  it("are chosen by price where all have one", () => {
    // 2700 and kerfs: one of 3000 for 900, or 1000 + 1000 + 1000 for 1050.
    const stock = [bar(1000, { price: 350 }), bar(3000, { price: 900 })];
    expect(planOf(buildJob({ parts, stock }))).toMatchObject({
      costKind: "price",
      cost: 900,
      leastCost: 900,
      ended: "proved",
    });
    const dear = [bar(1000, { price: 350 }), bar(3000, { price: 1100 })];
    expect(planOf(buildJob({ parts, stock: dear }))).toMatchObject({ cost: 1050, barCount: 3, ended: "proved" });
  });

  it("are chosen by length where a price is missing", () => {
    const stock = [bar(1000, { price: 1 }), bar(2800)];
    expect(planOf(buildJob({ parts, stock }))).toMatchObject({ costKind: "length", cost: 2800, barCount: 1 });
  });

  it("no more are cut than there are", () => {
    const stock = [bar(1000, { price: 10, onHand: 1 }), bar(2800, { price: 900 })];
    // One part of 900 on the bar on hand, the rest on a new one.
    expect(planOf(buildJob({ parts, stock })).needed).toEqual([
      { stockId: "bar 1000", bars: 0 },
      { stockId: "bar 2800", bars: 1 },
    ]);
    const offcuts = [bar(1000, { price: 10, onHand: 2 }), bar(2000, { price: 900 })];
    expect(planOf(buildJob({ parts, stock: offcuts })).cost).toBe(910);
  });
});

const anyEnd = fc.constantFrom(...(["left", "right"] as const)).map(slant);
const smallJob = fc
  .record({
    lengths: fc.array(fc.integer({ min: 60, max: 700 }), { minLength: 1, maxLength: 6 }),
    ends: fc.array(anyEnd, { minLength: 6, maxLength: 6 }),
    isSlanted: fc.boolean(),
    kerfMm: fc.constantFrom(0, 3.2),
    nests: fc.boolean(),
    stock: fc.uniqueArray(
      fc.record({
        lengthMm: fc.constantFrom(800, 1000, 1300, 1700),
        price: fc.integer({ min: 1, max: 60 }),
        onHand: fc.option(fc.integer({ min: 0, max: 3 })),
      }),
      { selector: ({ lengthMm }) => lengthMm, minLength: 1, maxLength: 3 },
    ),
  })
  .map(({ lengths, ends, isSlanted, kerfMm, nests, stock }) =>
    buildJob({
      parts: lengths.map((length, index) => part(`p${index}`, length, isSlanted ? ends[index] : {})),
      stock: stock.map(({ lengthMm, price, onHand }) => bar(lengthMm, { price, onHand })),
      saw: saw({ kerfMm, nests }),
    }),
  );

it("agrees with trying every way there is, for small jobs of any kind", () => {
  fc.assert(
    fc.property(smallJob, (job) => {
      const least = tryAllCuts(job, (stock) => job.stock[stock]?.price ?? 0);
      const outcome = planCutting(job);
      if (!outcome.ok) {
        expect(least).toBeNull();
        return;
      }
      expect(faultsOfPlan(job, outcome.value)).toEqual([]);
      expect(outcome.value).toMatchObject({ cost: least, leastCost: least, ended: "proved" });
    }),
    { numRuns: 300 },
  );
});

describe("the end of a search", () => {
  const random = seededRandom(11);
  /** Twenty bars' worth of pieces a quarter to a half of a bar: hard to prove. */
  const hard = buildJob({
    parts: Array.from({ length: 60 }, (_, index) => part(`p${index}`, 250 + Math.round(random() * 250))),
    saw: { kerfMm: 0, squaringMm: 0, rejectShare: 0, nests: false },
  });

  it("gives the best so far and says how far it may be off when its work is used up", () => {
    const plan = planOf(hard, { work: 1 });
    expect(plan.ended).toBe("work");
    expect(plan.gap).toBeCloseTo((plan.cost - plan.leastCost) / plan.leastCost, 12);
    expect(plan.gap).toBeGreaterThan(0);
    expect(planOf(hard).cost).toBeLessThan(plan.cost);
  });

  it("comes when somebody asks for it", () => {
    let asked = 0;
    const plan = planOf(hard, { shouldStop: () => ++asked > 2 });
    expect(plan.ended).toBe("asked");
    expect(asked).toBe(3);
  });

  it("comes after the same step each time: the same job, the same plan", () => {
    const effort = { work: 200_000 };
    expect(planOf(hard, effort)).toEqual(planOf(hard, effort));
  });

  it("never has a worse plan or a lower bound for more work", () => {
    const plans = [1, 10_000, 100_000, 1_000_000].map((work) => planOf(hard, { work }));
    for (const [index, plan] of plans.entries()) {
      const before = plans[index - 1] ?? plan;
      expect(plan.cost).toBeLessThanOrEqual(before.cost);
      expect(plan.leastCost).toBeGreaterThanOrEqual(before.leastCost);
    }
  });
});

describe("large jobs", () => {
  it("plans 10,000 parts, no two alike, within 2 % of what no plan can beat", () => {
    const random = seededRandom(3);
    const parts = Array.from({ length: 10_000 }, (_, index) => part(`p${index}`, 60 + random() * 500));
    const plan = planOf(buildJob({ parts, stock: [bar(2440)] }), { work: 100_000 });
    expect(plan.partCount).toBe(10_000);
    expect(plan.gap).toBeLessThan(0.02);
  });

  it("plans 10,000 equal parts", () => {
    // (2440 − 10 + 3.2) / 503.2 = 4.8: four a bar.
    const plan = planOf(buildJob({ parts: [part("a", 500, { quantity: 10_000 })], stock: [bar(2440)] }));
    expect(plan).toMatchObject({ barCount: 2500, gap: 0, ended: "proved" });
    expect(plan.bars).toHaveLength(1);
  });
});

it("nothing to cut needs no bar", () => {
  expect(planOf(buildJob({ parts: [] }))).toMatchObject({ barCount: 0, cost: 0, ended: "proved" });
});
