import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { completeBars } from "#shared/stock-lengths/complete-bars.ts";
import { diveForPacking } from "#shared/stock-lengths/dive.ts";
import { fillBar } from "#shared/stock-lengths/fill-bar.ts";
import { packQuickly } from "#shared/stock-lengths/first-fit.ts";
import { costOfUses, loadOf, type Packed, type Packing, type Pattern } from "#shared/stock-lengths/packing.ts";
import { boundByPatterns } from "#shared/stock-lengths/pattern-bound.ts";
import { lengthBound, longPiecesBound, moreThanAny, payableFrom } from "#shared/stock-lengths/simple-bounds.ts";
import { startMeter } from "#shared/stock-lengths/work-meter.ts";

const plain = (room: number, sizes: readonly (readonly [size: number, demand: number])[]): Packing => ({
  items: sizes.map(([size, demand]) => ({ size, demand, family: null })),
  setups: [],
  bars: [{ room, cost: 1, onHand: null }],
});

/** Least cost by trying everything: each piece into each bar opened and into a new one of each kind. */
function leastCost(packing: Packing): number | null {
  const pieces = packing.items.flatMap(({ demand }, item) => Array.from({ length: demand }, () => item));
  const open: { bar: number; items: number[] }[] = [];
  let least: number | null = null;
  const fits = ({ bar, items }: { bar: number; items: number[] }) =>
    loadOf(
      packing,
      items.map((item) => ({ item, count: 1 })),
    ) <= (packing.bars[bar]?.room ?? 0);
  const place = (at: number, cost: number): void => {
    if (least !== null && cost >= least) return;
    const piece = pieces[at];
    if (piece === undefined) {
      least = cost;
      return;
    }
    for (const each of open) {
      each.items.push(piece);
      if (fits(each)) place(at + 1, cost);
      each.items.pop();
    }
    for (const [bar, { cost: price, onHand }] of packing.bars.entries()) {
      if (onHand !== null && open.filter((each) => each.bar === bar).length >= onHand) continue;
      open.push({ bar, items: [piece] });
      if (fits({ bar, items: [piece] })) place(at + 1, cost + price);
      open.pop();
    }
  };
  place(0, 0);
  return least;
}

/** Small packings of every kind: families, several bars, some of them few; the last bar can be had in any number. */
const anyPacking = fc
  .record({
    items: fc.uniqueArray(
      fc.record({
        size: fc.integer({ min: 8, max: 60 }),
        demand: fc.integer({ min: 1, max: 2 }),
        family: fc.constantFrom(null, 0, 1),
      }),
      { selector: ({ size, family }) => `${size}:${family}`, minLength: 1, maxLength: 4 },
    ),
    setups: fc.tuple(fc.integer({ min: 0, max: 15 }), fc.integer({ min: 0, max: 15 })),
    few: fc.array(
      fc.record({
        room: fc.integer({ min: 60, max: 120 }),
        cost: fc.integer({ min: 0, max: 9 }),
        onHand: fc.integer({ min: 0, max: 2 }),
      }),
      { maxLength: 2 },
    ),
    many: fc.record({
      room: fc.integer({ min: 75, max: 120 }),
      cost: fc.integer({ min: 1, max: 9 }),
      onHand: fc.constant(null),
    }),
  })
  .map(
    ({ items, setups, few, many }): Packing => ({
      items: items.toSorted((a, b) => b.size - a.size),
      setups,
      bars: [...few, many],
    }),
  );

/** Everything cut as often as asked or more, no bar overfull, no more bars than there are. */
function faultsOf(packing: Packing, { uses, cost }: Packed): string[] {
  const faults: string[] = [];
  const cut = packing.items.map(() => 0);
  const used = packing.bars.map(() => 0);
  for (const { pattern, times } of uses) {
    if (!fits(packing, pattern)) faults.push(`${JSON.stringify(pattern)} is overfull`);
    used[pattern.bar] = (used[pattern.bar] ?? 0) + times;
    for (const { item, count } of pattern.shares) cut[item] = (cut[item] ?? 0) + count * times;
  }
  for (const [item, { demand }] of packing.items.entries())
    if ((cut[item] ?? 0) < demand) faults.push(`${cut[item]} of item ${item}, not ${demand}`);
  for (const [bar, { onHand }] of packing.bars.entries())
    if ((used[bar] ?? 0) > (onHand ?? Number.POSITIVE_INFINITY)) faults.push(`${used[bar]} bars ${bar}`);
  if (costOfUses(packing, uses) !== cost) faults.push(`costs ${costOfUses(packing, uses)}, not ${cost}`);
  return faults;
}
const fits = (packing: Packing, { bar, shares }: Pattern) => loadOf(packing, shares) <= (packing.bars[bar]?.room ?? 0);

describe("bounds", () => {
  it.each([
    { room: 100, sizes: [[50, 4]] as const, length: 2, long: 2 },
    { room: 100, sizes: [[51, 4]] as const, length: 3, long: 4 },
    // Four of 60 leave 40 each: nothing for the two of 41.
    {
      room: 100,
      sizes: [
        [60, 4],
        [41, 2],
      ] as const,
      length: 4,
      long: 5,
    },
    {
      room: 100,
      sizes: [
        [60, 4],
        [40, 4],
      ] as const,
      length: 4,
      long: 4,
    },
    { room: 7, sizes: [[7, 3]] as const, length: 3, long: 3 },
  ])("of $sizes in $room: by length $length, by long pieces $long", ({ room, sizes, length, long }) => {
    expect(lengthBound(plain(room, sizes))).toBe(length);
    expect(longPiecesBound(plain(room, sizes))).toBe(long);
  });

  it("by length use up cheap bars on hand first", () => {
    const bars = [
      { room: 100, cost: 9, onHand: null },
      { room: 100, cost: 1, onHand: 2 },
    ];
    // 350 long: two bars for 1 each, the other 150 at 9 a hundred.
    expect(lengthBound({ items: [{ size: 35, demand: 10, family: null }], setups: [], bars })).toBe(2 + 14);
  });

  it("never lie above what is possible, with any amount of work", () => {
    let tight = 0;
    fc.assert(
      fc.property(anyPacking, fc.integer({ min: 1, max: 300 }), (packing, work) => {
        const least = leastCost(packing) ?? Number.POSITIVE_INFINITY;
        expect(lengthBound(packing)).toBeLessThanOrEqual(least);
        expect(longPiecesBound(packing)).toBeLessThanOrEqual(least);
        for (const steps of [work, 1e6]) {
          const { bound } = boundByPatterns(packing, {
            pool: [],
            enough: Number.POSITIVE_INFINITY,
            meter: startMeter({ work: steps }),
          });
          expect(bound).toBeLessThanOrEqual(least);
          if (steps > work && bound === least) tight += 1;
        }
      }),
      { numRuns: 400, seed: 4 },
    );
    // Whole patterns are needed now and then, so that not all are tight.
    expect(tight).toBeGreaterThan(150);
  });

  it("by patterns is 72.917 of the rolls, and 73 in whole ones", () => {
    // 72.916667 by another solver of linear programmes over all 308 patterns; by length 407160 / 5600 = 72.707.
    const rolls = plain(5600, [
      [2200, 20],
      [2150, 18],
      [2140, 16],
      [2100, 14],
      [2050, 12],
      [2000, 10],
      [1930, 20],
      [1880, 18],
      [1820, 18],
      [1710, 14],
      [1560, 12],
      [1520, 25],
      [1380, 22],
    ]);
    const { bound, values } = boundByPatterns(rolls, { pool: [], enough: 99, meter: startMeter() });
    expect(bound).toBe(73);
    const bars = values.reduce((sum, { value }) => sum + value, 0);
    expect(bars).toBeGreaterThan(72.916_6);
    expect(bars).toBeLessThan(73);
    for (const { pattern } of values) expect(fits(rolls, pattern)).toBe(true);
  });

  it.each([
    // Bars of 4 (one on hand) and 3: 3 4 6 7 9 10 12 13 …, never 8.
    { bound: 5, upTo: 20, payable: 6 },
    { bound: 8, upTo: 20, payable: 9 },
    { bound: 11, upTo: 20, payable: 12 },
    { bound: 14, upTo: 14, payable: 14 },
    { bound: 14, upTo: 15, payable: 15 },
    { bound: 8, upTo: 1e12, payable: 8 },
  ])("of $bound rise to $payable, which bars can cost", ({ bound, upTo, payable }) => {
    const bars = [
      { room: 9, cost: 4, onHand: 1 },
      { room: 9, cost: 3, onHand: null },
    ];
    expect(payableFrom({ items: [], setups: [], bars }, bound, upTo)).toBe(payable);
  });

  it("by patterns see what lengths don't: three to a bar of what fits twice", () => {
    // 34 of 100: two a bar, whatever the length says.
    const { bound } = boundByPatterns(plain(100, [[34, 9]]), { pool: [], enough: 99, meter: startMeter() });
    expect([lengthBound(plain(100, [[34, 9]])), bound]).toEqual([4, 5]);
  });
});

describe.each([false, true])("filling one bar, thoroughly: %s", (isThorough) => {
  it("finds what is worth most, families with their setup, or that nothing beats the threshold", () => {
    fc.assert(
      fc.property(
        anyPacking,
        fc.array(fc.integer({ min: 0, max: 50 }), { minLength: 4, maxLength: 4 }),
        (packing, worths) => {
          const bar = packing.bars.length - 1;
          let most = 0;
          const tryAll = (item: number, shares: { item: number; count: number }[], worth: number): void => {
            if (!fits(packing, { bar, shares })) return;
            most = Math.max(most, worth);
            for (let next = item; next < packing.items.length; next += 1)
              for (let count = 1; count <= (packing.items[next]?.demand ?? 0); count += 1)
                tryAll(next + 1, [...shares, { item: next, count }], worth + count * (worths[next] ?? 0));
          };
          tryAll(0, [], 0);
          const fill = fillBar(packing, bar, worths, 0, { meter: startMeter(), isThorough });
          expect(fill.worthAtMost).toBe(most);
          const found = fill.shares ?? [];
          expect(fits(packing, { bar, shares: found })).toBe(true);
          expect(found.reduce((sum, { item, count }) => sum + count * (worths[item] ?? 0), 0)).toBe(most);
          expect(fillBar(packing, bar, worths, most, { meter: startMeter(), isThorough })).toEqual({
            shares: null,
            worthAtMost: most,
          });
          expect(
            fillBar(packing, bar, worths, 0, { meter: startMeter({ work: 1 }), isThorough }).worthAtMost,
          ).toBeGreaterThanOrEqual(most);
        },
      ),
      { numRuns: 300, seed: 5 },
    );
  });
});

describe("packings", () => {
  it("found quickly are the cheapest of those tried", () => {
    // Two pieces on one bar for 10, or one each on two bars for 9.
    const bars = [
      { room: 60, cost: 9, onHand: null },
      { room: 100, cost: 10, onHand: null },
    ];
    const packing = { items: [{ size: 50, demand: 2, family: null }], setups: [], bars };
    expect(packQuickly(packing)).toEqual({
      cost: 10,
      uses: [{ pattern: { bar: 1, shares: [{ item: 0, count: 2 }] }, times: 1 }],
    });
  });

  it("are sound however they are found, and the search bar by bar finds the best and proves it", () => {
    fc.assert(
      fc.property(anyPacking, (packing) => {
        const least = leastCost(packing);
        const quick = packQuickly(packing);
        if (quick) expect(faultsOf(packing, quick)).toEqual([]);
        const start = { best: null, bound: 0, pool: [] };
        const dived = diveForPacking(packing, start, startMeter({ work: 200_000 }));
        if (dived) expect(faultsOf(packing, dived)).toEqual([]);
        const { packed, isProof } = completeBars(packing, { lessThan: moreThanAny(packing), enough: 0 }, startMeter());
        expect(isProof).toBe(true);
        expect(packed?.cost ?? null).toBe(least);
        if (packed) expect(faultsOf(packing, packed)).toEqual([]);
      }),
      { numRuns: 300, seed: 6 },
    );
  });

  it("found bar by bar are no proof when the work ran out", () => {
    const packing = plain(1000, Array.from({ length: 40 }, (_, index) => [251 + 6 * index, 1] as const).toReversed());
    const { isProof } = completeBars(packing, { lessThan: 20, enough: 0 }, startMeter({ work: 50 }));
    expect(isProof).toBe(false);
  });

  it("of 60 pieces three to a bar without any waste come from whole patterns alone", () => {
    // Twenty bars of 1000 cut at random into three parts of 200 to 500 (linear congruential steps, fixed).
    let state = 9;
    const step = () => {
      state = (state * 1103515245 + 12345) % 2147483648;
      return state / 2147483648;
    };
    const sizes = Array.from({ length: 20 }, () => {
      const first = 320 + Math.floor(step() * 120);
      const second = 230 + Math.floor(step() * 60);
      return [first, second, 1000 - first - second];
    }).flat();
    const counts = new Map<number, number>();
    for (const size of sizes) counts.set(size, (counts.get(size) ?? 0) + 1);
    const packing = plain(
      1000,
      [...counts].sort(([a], [b]) => b - a),
    );
    const { bound, pool } = boundByPatterns(packing, { pool: [], enough: 99, meter: startMeter() });
    const dived = diveForPacking(packing, { best: packQuickly(packing), bound, pool }, startMeter());
    expect([bound, dived?.cost]).toEqual([20, 20]);
  });
});
