import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bladeAngleRange, cutRunMm, kerfAlongMm, nestedRunMm, usableLengthMm } from "#shared/stock-lengths/bar-take.ts";
import { type BarEnd, type CuttingJob, squareEnd } from "#shared/stock-lengths/cutting-job.ts";
import { planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { faultsOfPlan } from "../../../support/check-cuts.ts";

type Changes = {
  readonly lengthMm?: number;
  readonly quantity?: number;
  readonly angle?: number;
  readonly barMm?: number;
  readonly price?: number | null;
  readonly onHand?: number | null;
  readonly widthMm?: number;
  readonly kerfMm?: number;
  readonly squaringMm?: number;
  readonly rejectShare?: number;
};

function buildJob(changes: Changes): CuttingJob {
  const end: BarEnd = { ...squareEnd, angle: changes.angle ?? 90 };
  const { lengthMm = 400, quantity = 2, barMm = 2440, price = null, onHand = null } = changes;
  const { widthMm = 38.1, kerfMm = 3.2, squaringMm = 10, rejectShare = 0 } = changes;
  return {
    parts: [{ id: "s", label: "S1", lengthMm, quantity, start: end, end }],
    stock: [{ id: "bar", label: "the 8 ft strip", lengthMm: barMm, price, onHand }],
    widthMm,
    saw: { kerfMm, squaringMm, rejectShare, nests: true },
  };
}

const problemsOf = (job: CuttingJob) => {
  const outcome = planCutting(job);
  return outcome.ok ? [] : outcome.problems;
};

describe("a job that can't be planned is refused in words", () => {
  it.each<Changes & { field: string; words: RegExp }>([
    { lengthMm: 0, field: "parts.0.lengthMm", words: /length of part S1 is 0 mm; it must be at least 0.1 mm/ },
    { lengthMm: Number.NaN, field: "parts.0.lengthMm", words: /length of part S1 must be a number/ },
    { lengthMm: -5, field: "parts.0.lengthMm", words: /is -5 mm/ },
    { lengthMm: 2430.5, field: "parts.0.lengthMm", words: /2430.5 mm long, and no bar gives more than 2430 mm/ },
    { lengthMm: 2000, rejectShare: 0.2, field: "parts.0.lengthMm", words: /no bar gives more than 1942 mm/ },
    { quantity: 0, field: "parts.0.quantity", words: /at least 1/ },
    { quantity: 1.5, field: "parts.0.quantity", words: /whole number, not 1.5/ },
    { quantity: 1e9, field: "parts.0.quantity", words: /at most 20000/ },
    { angle: 0, field: "parts.0.start.angle", words: /start of part S1 is 0°; it must be at least 1°/ },
    { angle: 135, field: "parts.0.end.angle", words: /at most 90°/ },
    { barMm: Number.POSITIVE_INFINITY, field: "stock.0.lengthMm", words: /length of the 8 ft strip must be a number/ },
    { price: -1, field: "stock.0.price", words: /price of the 8 ft strip is -1; it must be at least 0/ },
    { price: 1e12, field: "stock.0.price", words: /at most 1000000000/ },
    { price: 0.5, field: "stock.0.price", words: /whole number/ },
    { onHand: -1, field: "stock.0.onHand", words: /at least 0/ },
    { onHand: 0, field: "parts.0.lengthMm", words: /no bar gives more than 0 mm/ },
    { onHand: 1, quantity: 9, field: "stock", words: /from the one bar on hand/ },
    { widthMm: 0, field: "widthMm", words: /bars' width is 0 mm/ },
    { kerfMm: -1, field: "saw.kerfMm", words: /kerf is -1 mm/ },
    { squaringMm: 600, field: "saw.squaringMm", words: /at most 500 mm/ },
    { rejectShare: 1, field: "saw.rejectShare", words: /at most 0.9/ },
  ])("$field: $words", ({ field, words, ...changes }) => {
    const found = problemsOf(buildJob(changes)).find((problem) => problem.field === field);
    expect(found?.words).toMatch(words);
  });

  it("with everything that is wrong, not the first alone", () => {
    const fields = problemsOf(buildJob({ lengthMm: 0, kerfMm: 99, price: -1 })).map(({ field }) => field);
    expect(fields).toEqual(["saw.kerfMm", "stock.0.price", "parts.0.lengthMm"]);
  });

  it("without stock, with a part twice, with more parts than a plan takes", () => {
    const job = buildJob({});
    expect(problemsOf({ ...job, stock: [] })[0]?.words).toMatch(/no bar to cut from/);
    expect(problemsOf({ ...job, parts: [...job.parts, ...job.parts] })[0]).toEqual({
      field: "parts.1.id",
      words: "“s” is there twice.",
    });
    const many = Array.from({ length: 2 }, (_, index) => ({ ...job.parts[0], id: `${index}`, quantity: 10_001 }));
    expect(problemsOf({ ...job, parts: many as CuttingJob["parts"] })[0]?.words).toMatch(/20002 parts are too many/);
  });
});

const any = fc.oneof(
  fc.double(),
  fc.integer({ min: -3, max: 2500 }),
  fc.constantFrom(0, -0, Number.NaN, Number.POSITIVE_INFINITY, 1e308, 5e-324, 15, 45, 90, 0.9, 1),
);

it("any numbers give a sound plan or words", () => {
  const mostly = (least: number, most: number) =>
    fc.oneof(
      { weight: 12, arbitrary: fc.double({ min: least, max: most, noNaN: true }) },
      { weight: 1, arbitrary: any },
    );
  const whole = (most: number) =>
    fc.oneof({ weight: 12, arbitrary: fc.integer({ min: 1, max: most }) }, { weight: 1, arbitrary: any });
  const changes = fc.record({
    lengthMm: mostly(0.1, 2400),
    quantity: whole(40),
    angle: mostly(1, 90),
    barMm: mostly(1500, 10_000),
    price: fc.option(whole(10_000)),
    onHand: fc.option(whole(60)),
    widthMm: mostly(0.1, 200),
    kerfMm: mostly(0, 20),
    squaringMm: mostly(0, 100),
    rejectShare: mostly(0, 0.3),
  });
  let planned = 0;
  fc.assert(
    fc.property(changes, (changed) => {
      const job = buildJob(changed);
      const outcome = planCutting(job, { work: 20_000 });
      if (outcome.ok) {
        planned += 1;
        expect(faultsOfPlan(job, outcome.value)).toEqual([]);
        expect(JSON.stringify(outcome.value)).not.toMatch(/null|NaN/);
      } else {
        for (const { field, words } of outcome.problems) {
          expect(field.length).toBeGreaterThan(0);
          expect(words).toMatch(/^\P{Ll}.*[.]$/su);
          expect(words).not.toContain("NaN");
        }
      }
    }),
    { numRuns: 600 },
  );
  expect(planned).toBeGreaterThan(60);
});

describe("what a cut takes", () => {
  it.each([
    { angle: 90, along: 3 },
    // 3 · √2 (ENGINE's own example, trigonometry).
    { angle: 45, along: 4.242_640_687 },
    { angle: 30, along: 6 },
  ])("a kerf of 3 mm at $angle degrees is $along along the bar", ({ angle, along }) => {
    expect(kerfAlongMm(3, angle)).toEqual({ ok: true, value: expect.closeTo(along, 8) });
  });

  it("runs along the bar by the cotangent, nothing when square", () => {
    expect(cutRunMm(40, 45)).toEqual({ ok: true, value: expect.closeTo(40, 9) });
    expect(cutRunMm(40, 90)).toEqual({ ok: true, value: 0 });
  });

  it("leaves of a bar what knots and squaring leave", () => {
    expect(usableLengthMm({ lengthMm: 2440, squaringMm: 10, rejectShare: 0.1 })).toEqual({ ok: true, value: 2186 });
    expect(usableLengthMm({ lengthMm: 100, squaringMm: 400, rejectShare: 0 })).toEqual({ ok: true, value: 0 });
  });

  it("is shared by slats that lie in each other", () => {
    // a = 209.55, 45 degrees, 38.1 wide: 5 · (296.348 + 4.243) + 38.1.
    const lengthMm = 209.55 * Math.SQRT2 + 38.1;
    const run = nestedRunMm({ count: 5, lengthMm, widthMm: 38.1, bladeAngle: 45, kerfMm: 3 });
    expect(run).toEqual({ ok: true, value: expect.closeTo(1541.055, 3) });
  });

  it("is sound for any numbers, or refused", () => {
    fc.assert(
      fc.property(any, any, any, any, any, (a, b, c, d, e) => {
        const nested = { count: a, lengthMm: b, widthMm: c, bladeAngle: d, kerfMm: e };
        const bar = { lengthMm: a, squaringMm: b, rejectShare: c };
        for (const outcome of [kerfAlongMm(a, b), cutRunMm(a, b), usableLengthMm(bar), nestedRunMm(nested)]) {
          if (outcome.ok) expect(Number.isFinite(outcome.value)).toBe(true);
          else expect(outcome.reason.field).not.toBe("");
        }
      }),
    );
    expect(bladeAngleRange).toEqual({ least: 1, most: 90 });
  });
});
