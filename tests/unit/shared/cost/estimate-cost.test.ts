import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type CostQuantities, noQuantities } from "#shared/cost/cost-quantities.ts";
import { type CostEstimate, type CostOrder, estimateCost } from "#shared/cost/estimate-cost.ts";
import { parsePriceBook } from "#shared/cost/price-book.ts";
import { buildPriceBook } from "../../../support/build-price-book.ts";

const each: CostQuantities = {
  materials: [
    { id: "ply", measure: { kind: "area", mm2: 300 * 400 } },
    { id: "strip", measure: { kind: "length", mm: 6286.74 } },
  ],
  machining: [{ id: "laser", cutMm: 4500, pocketMm2: 3600, setUps: 0 }],
  hardware: [
    { id: "standoff", count: 4 },
    { id: "screw", count: 10 },
  ],
  adhesives: [{ id: "epoxy", areaMm2: 50_000, beadMm: 400 }],
  finishes: [{ id: "oil", areaMm2: 300 * 400, coats: 2 }],
  labour: [
    { id: "piece", count: 14 },
    { id: "slat", count: 26 },
  ],
};
const once: CostQuantities = {
  ...noQuantities,
  materials: [{ id: "acrylic", measure: { kind: "count", count: 2 } }],
  machining: [{ id: "laser", cutMm: 0, pocketMm2: 0, setUps: 1 }],
};
const buildOrder = (overrides: Partial<CostOrder> = {}): CostOrder => ({
  book: buildPriceBook(),
  each,
  once,
  signs: 3,
  ...overrides,
});

function estimateOf(order: CostOrder): CostEstimate {
  const outcome = estimateCost(order);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
  return outcome.value;
}
const problemsOf = (order: CostOrder) => {
  const outcome = estimateCost(order);
  return outcome.ok ? [] : outcome.problems;
};

describe("three signs, worked out by hand", () => {
  const estimate = estimateOf(buildOrder());

  // Calculated with pencil and paper; amounts in cents.
  it.each([
    // 3 · 0.12 m² and 15 %; 0.414 · 42.00 = 17.388.
    { what: "Oak plywood 12 mm", quantity: 0.414, unit: "m²", amount: 1739 },
    // 3 · 6.28674 m and 10 % = 20.746242; 20.746 · 3.10 = 64.3126.
    { what: "Oak strip 38 × 9", quantity: 20.746, unit: "m", amount: 6431 },
    // Two whole sheets for all, without waste: 178.00.
    { what: "Cast acrylic 3 mm", quantity: 2, unit: "sheet", amount: 17_800 },
    // 13500/600 + 10800/2000 + 10 = 37.9 min at 60.00 an hour.
    { what: "Laser", quantity: 37.9, unit: "min", amount: 3790 },
    // 12 of 4 for 9.50.
    { what: "Standoff 15 × 19", quantity: 12, unit: "each", amount: 2850 },
    // 30 of 100 for 7.99: 2.397.
    { what: "Screw No. 6", quantity: 30, unit: "each", amount: 240 },
    // 0.15 m² · 250 + 1.2 m · 12 = 51.9 ml of 400 for 24.50: 3.1789.
    { what: "Epoxy", quantity: 51.9, unit: "ml", amount: 318 },
    // 0.36 m² · 2 coats · 3.80 = 2.736.
    { what: "Oil", quantity: 0.72, unit: "m² of one coat", amount: 274 },
    // 0.72 · 12 min at 45.00 an hour.
    { what: "Oil, the work of it", quantity: 8.64, unit: "min", amount: 648 },
    // 42 · 6 min at 48.00.
    { what: "Bonding, a piece", quantity: 252, unit: "min", amount: 20_160 },
    // 78 · 2 min at 48.00.
    { what: "Laying, a slat", quantity: 156, unit: "min", amount: 12_480 },
  ])("$what: $quantity $unit", (line) => {
    expect(estimate.lines.find(({ what }) => what === line.what)).toMatchObject(line);
  });

  it("come to 667.30, with markup and tax to 1072.02", () => {
    expect(estimate.lines).toHaveLength(11);
    // 35 % of 667.30 is 233.555, half away from zero; 19 % of 900.86 is 171.1634.
    expect(estimate.whole).toEqual({ subtotal: 66_730, markup: 23_356, tax: 17_116, total: 107_202 });
  });

  it("are a third of that each, every figure rounded by itself", () => {
    expect(estimate.perSign).toEqual({ subtotal: 22_243, markup: 7785, tax: 5705, total: 35_733 });
  });
});

it("areas and lengths in feet", () => {
  const materials = [
    { id: "sheet", name: "Sheet", unit: "ft²" as const, price: 1250, waste: 0 },
    { id: "trim", name: "Trim", unit: "ft" as const, price: 99, waste: 0 },
  ];
  const wanted: CostQuantities = {
    ...noQuantities,
    materials: [
      { id: "sheet", measure: { kind: "area", mm2: 609.6 * 457.2 } },
      { id: "trim", measure: { kind: "length", mm: 3048 } },
    ],
  };
  const { lines } = estimateOf({ book: buildPriceBook({ materials, currency: "USD" }), each: wanted, signs: 1 });
  // 2 ft by 1.5 ft are 3 ft²; 3048 mm are 10 ft.
  expect(lines.map(({ quantity, amount }) => [quantity, amount])).toEqual([
    [3, 3750],
    [10, 990],
  ]);
});

describe("an order that can't be reckoned is refused in words", () => {
  it.each<{ why: string; order: Partial<CostOrder>; field: string; words: RegExp }>([
    { why: "no signs", order: { signs: 0 }, field: "signs", words: /whole number from 1 to 10000/ },
    { why: "half a sign", order: { signs: 1.5 }, field: "signs", words: /whole number/ },
    { why: "no number of signs", order: { signs: Number.NaN }, field: "signs", words: /whole number/ },
    {
      why: "an area below nothing",
      order: { each: { ...each, materials: [{ id: "ply", measure: { kind: "area", mm2: -1 } }] } },
      field: "each.materials.0.measure",
      words: /can't be below 0/,
    },
    {
      why: "a cut without number",
      order: { each: { ...each, machining: [{ id: "laser", cutMm: Number.NaN, pocketMm2: 0, setUps: 0 }] } },
      field: "each.machining.0.cutMm",
      words: /must be a number/,
    },
    {
      why: "more screws than there are",
      order: { once: { ...noQuantities, hardware: [{ id: "screw", count: 1e9 }] } },
      field: "once.hardware.0.count",
      words: /more than 1000000, which can't be meant/,
    },
    {
      why: "a thing without a price",
      order: { each: { ...each, hardware: [{ id: "magnet", count: 1 }] } },
      field: "hardware.magnet",
      words: /“magnet” has no entry under hardware/,
    },
    {
      why: "an area of what is sold by the sheet",
      order: { each: { ...each, materials: [{ id: "acrylic", measure: { kind: "area", mm2: 5 } }] } },
      field: "materials.acrylic",
      words: /Cast acrylic 3 mm is priced by the sheet: give a count, not an area/,
    },
    {
      why: "a sum beyond all numbers",
      order: {
        signs: 10_000,
        book: buildPriceBook({ hardware: [{ id: "gold", name: "Gold", price: 1e9, pack: 1 }] }),
        each: { ...noQuantities, hardware: [{ id: "gold", count: 1e6 }] },
        once: noQuantities,
      },
      field: "hardware.gold",
      words: /Gold comes to more than can be reckoned exactly/,
    },
  ])("$why", ({ order, field, words }) => {
    expect(problemsOf(buildOrder(order)).find((problem) => problem.field === field)?.words).toMatch(words);
  });
});

const price = fc.integer({ min: 0, max: 2_000_000 });
const share = fc.double({ min: 0, max: 1, noNaN: true });
const anyBook = fc
  .record({
    price,
    perHour: price,
    pack: fc.integer({ min: 1, max: 500 }),
    waste: share,
    markup: share,
    tax: share,
    pace: fc.integer({ min: 1, max: 9000 }),
  })
  .map(({ price, perHour, pack, waste, markup, tax, pace }) => {
    const book = buildPriceBook();
    return buildPriceBook({
      materials: book.materials.map((entry, index) => ({ ...entry, price: price + index, waste })),
      machines: book.machines.map((entry) => ({ ...entry, perHour, cutMmPerMinute: pace, pocketMm2PerMinute: pace })),
      hardware: book.hardware.map((entry) => ({ ...entry, price, pack })),
      finishes: book.finishes.map((entry) => ({ ...entry, perHour, pricePerM2: price })),
      markup,
      tax: { name: "Tax", share: tax },
    });
  });
const amount = fc.double({ min: 0, max: 1e7, noNaN: true });
const count = fc.integer({ min: 0, max: 5000 });
const anyQuantities = fc.record({ area: amount, length: amount, count, coats: fc.integer({ min: 0, max: 6 }) });
type Amounts = { area: number; length: number; count: number; coats: number };
const quantitiesOf = ({ area, length, count, coats }: Amounts): CostQuantities => ({
  materials: [
    { id: "ply", measure: { kind: "area", mm2: area } },
    { id: "strip", measure: { kind: "length", mm: length } },
    { id: "acrylic", measure: { kind: "count", count } },
  ],
  machining: [{ id: "laser", cutMm: length, pocketMm2: area, setUps: count }],
  hardware: [
    { id: "standoff", count },
    { id: "screw", count },
  ],
  adhesives: [{ id: "epoxy", areaMm2: area, beadMm: length }],
  finishes: [{ id: "oil", areaMm2: area, coats }],
  labour: [{ id: "piece", count }],
});

describe("any order", () => {
  const anySigns = fc.integer({ min: 1, max: 200 });

  it("adds up, in whole minor units", () => {
    fc.assert(
      fc.property(anyBook, anyQuantities, anySigns, (book, amounts, signs) => {
        const { lines, whole, perSign } = estimateOf({ book, each: quantitiesOf(amounts), signs });
        expect(whole.subtotal).toBe(lines.reduce((sum, line) => sum + line.amount, 0));
        expect(whole.total).toBe(whole.subtotal + whole.markup + whole.tax);
        expect(perSign.total).toBe(perSign.subtotal + perSign.markup + perSign.tax);
        // Three figures, each half a unit off at most.
        expect(Math.abs(perSign.total * signs - whole.total)).toBeLessThanOrEqual(1.5 * signs);
        for (const figure of [
          ...lines.map((line) => line.amount),
          ...Object.values(whole),
          ...Object.values(perSign),
        ]) {
          expect(Number.isSafeInteger(figure)).toBe(true);
          expect(figure).toBeGreaterThanOrEqual(0);
        }
        // The printed quantity times the rate is the amount, within the rounding.
        for (const { quantity, rate, amount: charged } of lines)
          expect(Math.abs((quantity * rate.amount) / rate.per - charged)).toBeLessThanOrEqual(0.5 + 1e-9 * charged);
      }),
      { numRuns: 300 },
    );
  });

  it("costs no less with more in it, for more signs, or at a higher markup", () => {
    fc.assert(
      fc.property(anyBook, anyQuantities, anyQuantities, anySigns, (book, amounts, more, signs) => {
        const total = (order: Partial<CostOrder>) =>
          estimateOf({ book, each: quantitiesOf(amounts), signs, ...order }).whole.total;
        const least = total({});
        expect(total({ once: quantitiesOf(more) })).toBeGreaterThanOrEqual(least);
        expect(total({ signs: signs + 1 })).toBeGreaterThanOrEqual(least);
        expect(total({ book: { ...book, markup: book.markup + 0.1 } })).toBeGreaterThanOrEqual(least);
      }),
      { numRuns: 200 },
    );
  });

  it("is sound or refused for any numbers", () => {
    const any = fc.oneof(
      fc.double(),
      fc.integer({ min: -2, max: 100 }),
      fc.constantFrom(Number.NaN, Number.POSITIVE_INFINITY, 1e308, -1, 1e12),
    );
    const wild = fc.record({ area: any, length: any, count: any, coats: any });
    fc.assert(
      fc.property(wild, wild, any, (amounts, others, signs) => {
        const outcome = estimateCost({
          book: buildPriceBook(),
          each: quantitiesOf(amounts),
          once: quantitiesOf(others),
          signs,
        });
        if (outcome.ok) expect(Object.values(outcome.value.whole).every(Number.isSafeInteger)).toBe(true);
        else for (const { words } of outcome.problems) expect(words).toMatch(/^\P{Ll}.*\.$/su);
      }),
      { numRuns: 500 },
    );
  });
});

describe("a price book", () => {
  it("is read as it is", () => {
    const book = buildPriceBook();
    expect(parsePriceBook(JSON.parse(JSON.stringify(book)))).toEqual({ ok: true, value: book });
  });

  const ply = { id: "ply", name: "Ply", unit: "m²", price: 100, waste: 0 };
  it.each<{ data: object; field: string; words: RegExp }>([
    { data: { materials: [{ ...ply, price: -1 }] }, field: "materials.0.price", words: /can't be below 0/ },
    { data: { materials: [{ ...ply, price: 12.5 }] }, field: "materials.0.price", words: /whole minor units/ },
    { data: { materials: [{ ...ply, price: 1e12 }] }, field: "materials.0.price", words: /can't be right/ },
    { data: { materials: [{ ...ply, price: "12" }] }, field: "materials.0.price", words: /must be a number/ },
    { data: { materials: [{ ...ply, price: Number.NaN }] }, field: "materials.0.price", words: /must be a number/ },
    { data: { materials: [ply, ply] }, field: "materials.1.id", words: /“ply” is there twice/ },
    { data: { materials: [{ ...ply, waste: 15 }] }, field: "materials.0.waste", words: /0.15 for 15 %/ },
    { data: { currency: "XAU" }, field: "currency", words: /code of a currency/ },
    { data: { markup: -0.1 }, field: "markup", words: /can't be below 0/ },
    { data: { tax: { name: "VAT", share: 19 } }, field: "tax.share", words: /Tax is a share/ },
    {
      data: { machines: [{ ...buildPriceBook().machines[0], cutMmPerMinute: 0 }] },
      field: "machines.0.cutMmPerMinute",
      words: /above 0/,
    },
  ])("is refused for its $field: $words", ({ data, field, words }) => {
    const outcome = parsePriceBook({ ...buildPriceBook(), ...data });
    expect(outcome.ok ? [] : outcome.problems.map((problem) => problem.field)).toEqual([field]);
    expect(outcome.ok ? "" : outcome.problems[0]?.words).toMatch(words);
  });
});
