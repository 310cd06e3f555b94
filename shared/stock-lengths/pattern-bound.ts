import { fillBar } from "./fill-bar.ts";
import { costOfBar, type Packing, type Pattern } from "./packing.ts";
import { type Column, createMaster } from "./pattern-master.ts";
import type { WorkMeter } from "./work-meter.ts";

export type PatternBound = {
  /** No packing costs less; proved in whole numbers. */
  readonly bound: number;
  /** Patterns in parts of a bar, of the cheapest such programme that was reached. */
  readonly values: readonly { readonly pattern: Pattern; readonly value: number }[];
  /** Patterns met on the way, to start the next search with. */
  readonly pool: readonly Pattern[];
};

/** Worths are rounded down to whole multiples of this part of the dearest bar. */
const worthSteps = 2 ** 44;
/** A pattern must be better than the bound by this share to be brought in. */
const leastGain = 1e-8;
/** Share of the work kept for the bound at the end. */
const shareOfLastLook = 0.15;
/** Rounding that the programme's cost may have in it. */
const tinyCost = 1e-6;
/** Work after which a better filling that was found is taken as it is. */
const workOfGlance = 4_000;

/**
 * Lower bound by column generation (P. C. Gilmore and R. E. Gomory, Operations Research 9(6), 1961). The prices of the
 * items are rounded down to whole numbers and scaled until no bar can be filled for more than it costs; what is then
 * asked of them is a bound whatever the programme's rounding was (A. A. Farley, Operations Research 38(5), 1990).
 * Ends early once the bound reaches `enough`.
 */
export function boundByPatterns(
  packing: Packing,
  { pool, enough, meter }: { readonly pool: readonly Pattern[]; readonly enough: number; readonly meter: WorkMeter },
): PatternBound {
  const rows = packing.items.flatMap(({ demand }, item) => (demand > 0 ? [item] : []));
  const rowOfItem = new Map(rows.map((item, row) => [item, row]));
  const limited = packing.bars.flatMap(({ onHand }, bar) => (onHand === null ? [] : [bar]));
  const dearest = Math.max(1, ...packing.bars.map(({ cost }) => cost));
  const steps = Math.floor(worthSteps / dearest);
  const master = createMaster(
    rows.map((item) => packing.items[item]?.demand ?? 0),
    limited.map((bar) => packing.bars[bar]?.onHand ?? 0),
    // Dearer than a bar for every single piece.
    10 * dearest,
  );
  const columnOf = (pattern: Pattern): Column => {
    const limit = limited.indexOf(pattern.bar);
    const entries = pattern.shares.map(({ item, count }): [number, number] => [rowOfItem.get(item) ?? 0, count]);
    return {
      pattern,
      cost: costOfBar(packing, pattern.bar),
      entries: limit < 0 ? entries : [...entries, [rows.length + limit, 1]],
    };
  };
  const columns = pool.filter((pattern) => isProper(packing, pattern)).map(columnOf);
  const workOfExchange = 1 + (rows.length * rows.length) / 200;
  // Some work is kept for a last look at the prices that the programme ended with.
  const loop = meter.within(meter.left() * (1 - shareOfLastLook));
  let counted = 0;
  let bound = 0;
  for (;;) {
    master.settle();
    const exchanges = master.exchanges() - counted;
    counted += exchanges;
    if (!loop.spend(exchanges * workOfExchange + columns.length / 10)) break;
    const duals = master.duals();
    let best = bestColumn(columns, duals);
    if (!best) {
      const priced = price(packing, { rows, limited, duals, steps, meter: loop, isLast: false });
      if (priced.bound > bound) bound = priced.bound;
      // Costs are whole: once the programme's own cost rounds up to the bound, nothing can lift it any more.
      if (bound >= enough || bound >= Math.ceil(master.cost() - tinyCost)) return result();
      const found = priced.patterns.map(columnOf);
      columns.push(...found);
      best = bestColumn(found, duals);
    }
    if (!best) return result();
    if (!master.enter(best)) break;
  }
  const last = price(packing, { rows, limited, duals: master.duals(), steps, meter, isLast: true });
  bound = Math.max(bound, last.bound);
  return result();

  function result(): PatternBound {
    return {
      bound,
      values: master.values().map(({ column, value }) => ({ pattern: column.pattern, value })),
      pool: columns.map(({ pattern }) => pattern),
    };
  }
}

/** Whether a pattern cuts no more than is asked for, from a bar that is there. */
function isProper({ items, bars }: Packing, { bar, shares }: Pattern): boolean {
  return bars[bar]?.onHand !== 0 && shares.every(({ item, count }) => count <= (items[item]?.demand ?? 0));
}

/** The column that saves most a unit, the first of equals; null when none saves anything. */
function bestColumn(columns: readonly Column[], duals: Float64Array): Column | null {
  let best: Column | null = null;
  let most = leastGain;
  for (const column of columns) {
    const saved = column.entries.reduce((sum, [row, amount]) => sum + (duals[row] ?? 0) * amount, 0) - column.cost;
    if (saved > most * Math.max(1, column.cost)) {
      best = column;
      most = saved / Math.max(1, column.cost);
    }
  }
  return best;
}

type Prices = {
  readonly rows: readonly number[];
  readonly limited: readonly number[];
  readonly duals: Float64Array;
  readonly steps: number;
  readonly meter: WorkMeter;
  /** Whether no exchange follows, so that the bound alone matters. */
  readonly isLast: boolean;
};

/** The most valuable filling of each bar at the present prices, and the bound that they give. */
function price(
  packing: Packing,
  { rows, limited, duals, steps, meter, isLast }: Prices,
): { bound: number; patterns: Pattern[] } {
  const worths = packing.items.map(() => 0);
  let asked = 0n;
  for (const [row, item] of rows.entries()) {
    const worth = Math.max(0, Math.floor((duals[row] ?? 0) * steps));
    worths[item] = worth;
    asked += BigInt(worth) * BigInt(packing.items[item]?.demand ?? 0);
  }
  const patterns: Pattern[] = [];
  const fills = packing.bars.map((bar, index) => {
    const limit = limited.indexOf(index);
    const due = bar.cost - (limit < 0 ? 0 : Math.min(0, duals[rows.length + limit] ?? 0));
    const threshold = Math.ceil((due + leastGain * Math.max(1, due)) * steps);
    // Any better filling will do; only that there is none must be searched to the end.
    const glance = { meter: meter.within(isLast ? 0 : workOfGlance), isThorough: false };
    const search = { meter: meter.within(meter.left() / (2 * packing.bars.length)), isThorough: true };
    const seen = fillBar(packing, index, worths, threshold, glance);
    const { shares, worthAtMost } = seen.shares && !isLast ? seen : fillBar(packing, index, worths, threshold, search);
    if (shares) patterns.push({ bar: index, shares });
    return { worth: BigInt(worthAtMost), cost: BigInt(bar.cost) * BigInt(steps), onHand: bar.onHand };
  });
  // Scaled by the worst of the bars there is no end of, so that none of these is worth more than it costs.
  let [scale, by] = [1n, 1n];
  for (const { worth, cost, onHand } of fills) {
    if (onHand === null && worth * scale > cost * by) [scale, by] = [cost, worth];
  }
  let bound = asked * scale;
  for (const { worth, cost, onHand } of fills) {
    const over = worth * scale - cost * by;
    if (onHand !== null && over > 0n) bound -= BigInt(onHand) * over;
  }
  return { bound: ceilDivided(bound, by * BigInt(steps)), patterns };
}

/** The quotient rounded up, as a plain number, 0 at the least. */
function ceilDivided(value: bigint, by: bigint): number {
  return value <= 0n || by <= 0n ? 0 : Number((value + by - 1n) / by);
}
