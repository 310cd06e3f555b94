import { costOfBar, gathered, type Packed, type Packing, type Share, type Use } from "./packing.ts";
import type { WorkMeter } from "./work-meter.ts";

type Goal = {
  /** Only packings cheaper than this are looked for. */
  readonly lessThan: number;
  /** Nothing can be cheaper than this: the first packing at this cost ends the search. */
  readonly enough: number;
};

type Filling = { readonly shares: readonly Share[]; readonly length: number; readonly load: number };

/** Counts that are remembered in all, in states of one count an item, so that the same rest is not searched twice. */
const mostCounts = 3_000_000;
/** Fillings of one bar that are weighed against each other; more are left out, and the search is no proof then. */
const mostFillings = 4_000;

/**
 * Searches bar by bar: the longest piece left is on the next one, whichever bar that is, with every filling that leaves
 * no room for another piece and wastes no more than the goal allows, the fullest first (R. E. Korf, Bin completion,
 * AAAI 2002). `isProof` says that every possibility was seen, so that nothing cheaper exists than what was found, or,
 * when nothing was, than `lessThan`.
 */
export function completeBars(
  packing: Packing,
  goal: Goal,
  meter: WorkMeter,
): { readonly packed: Packed | null; readonly isProof: boolean } {
  const { items, bars } = packing;
  const left = items.map(({ demand }) => demand);
  const onHand = bars.map((bar) => bar.onHand);
  const hasLimits = onHand.some((count) => count !== null);
  const rate = Math.min(...bars.map(({ cost, room }) => cost / room));
  const states = new Map<string, number>();
  const taken: Use[] = [];
  let lessThan = goal.lessThan;
  let packed: Packed | null = null;
  let isProof = true;
  // Writing a state down goes over all items.
  const workOfState = 3 + items.length / 8;
  const isDone = () => packed !== null && packed.cost <= goal.enough;

  function search(cost: number, length: number): void {
    const first = left.findIndex((count) => count > 0);
    if (first < 0) {
      if (cost < lessThan) {
        packed = { uses: gathered(taken), cost };
        lessThan = cost;
      }
      return;
    }
    if (cost + Math.ceil(length * rate - 1e-7) >= lessThan) return;
    const key = hasLimits ? `${left.join()};${onHand.join()}` : left.join();
    const known = states.get(key);
    if (known !== undefined && known <= cost) return;
    if (states.size * items.length < mostCounts) states.set(key, cost);
    for (const { bar, filling } of nextBars(first, cost, length)) {
      if (isDone()) return;
      if (!meter.spend(workOfState)) {
        isProof = false;
        return;
      }
      take(bar, filling.shares, -1);
      search(cost + costOfBar(packing, bar), length - filling.length);
      take(bar, filling.shares, 1);
    }
  }

  function take(bar: number, shares: readonly Share[], sign: 1 | -1): void {
    for (const { item, count } of shares) left[item] = (left[item] ?? 0) + sign * count;
    const count = onHand[bar];
    if (typeof count === "number") onHand[bar] = count + sign;
    if (sign < 0) taken.push({ pattern: { bar, shares }, times: 1 });
    else taken.pop();
  }

  /** Every filling worth trying with piece `first` on it, the one that wastes least for its cost first. */
  function nextBars(first: number, cost: number, length: number): { bar: number; filling: Filling }[] {
    const found = bars.flatMap((bar, index) => {
      if (onHand[index] === 0) return [];
      // What must be on this bar so that the rest can still be cut for less.
      const affordable = lessThan - 1 - cost - bar.cost;
      const least = rate > 0 ? length - affordable / rate - 1e-6 * length - 1 : 0;
      const { fillings, isAll } = fillingsOf(packing, { left, first, room: bar.room, least }, meter);
      if (!isAll) isProof = false;
      return fillings.map((filling) => ({ bar: index, filling }));
    });
    const waste = ({ bar, filling }: { bar: number; filling: Filling }) =>
      costOfBar(packing, bar) - filling.length * rate;
    return found
      .map((each, order) => ({ each, order, waste: waste(each) }))
      .sort((a, b) => a.waste - b.waste || a.order - b.order)
      .map(({ each }) => each);
  }

  search(
    0,
    items.reduce((sum, { size, demand }) => sum + size * demand, 0),
  );
  return { packed, isProof };
}

type Wanted = {
  readonly left: readonly number[];
  readonly first: number;
  readonly room: number;
  readonly least: number;
};

/** Fillings of one bar with piece `first`, at least `least` of length on it, that leave no room for any piece left. */
function fillingsOf(
  { items, setups }: Packing,
  { left, first, room, least }: Wanted,
  meter: WorkMeter,
): { fillings: Filling[]; isAll: boolean } {
  const fillings: Filling[] = [];
  const chosen: Share[] = [];
  const onBar = setups.map(() => 0);
  const setupOf = (family: number | null) => (family !== null && onBar[family] === 0 ? (setups[family] ?? 0) : 0);
  // Length of all pieces from an item on, to see early that a bar can't become full enough.
  const lengthFrom = new Float64Array(items.length + 1);
  for (let item = items.length - 1; item >= 0; item -= 1) {
    lengthFrom[item] = (lengthFrom[item + 1] ?? 0) + (items[item]?.size ?? 0) * (left[item] ?? 0);
  }
  let isAll = true;

  function choose(item: number, free: number, length: number, skipped: number): void {
    if (!isAll || length + Math.min(free, lengthFrom[item] ?? 0) < least) return;
    isAll = meter.spend(1);
    let next = item;
    while (next < items.length && ((left[next] ?? 0) === 0 || (items[next]?.size ?? 0) > free)) next += 1;
    const { size, family } = items[next] ?? { size: 0, family: null };
    if (size === 0) {
      if (free >= skipped) return;
      isAll &&= fillings.length < mostFillings;
      fillings.push({ shares: [...chosen], length, load: room - free });
      return;
    }
    const setup = setupOf(family);
    const available = left[next] ?? 0;
    const most = Math.min(available, Math.max(0, Math.floor((free - setup) / size)));
    for (let count = most; count >= (next === first ? 1 : 0); count -= 1) {
      // A piece left out that would still have room makes the filling a lesser one; it is seen elsewhere.
      const lacking = count < available ? Math.min(skipped, size + (count > 0 ? 0 : setup)) : skipped;
      if (count > 0) {
        chosen.push({ item: next, count });
        if (family !== null) onBar[family] = (onBar[family] ?? 0) + 1;
        choose(next + 1, free - setup - count * size, length + count * size, lacking);
        if (family !== null) onBar[family] = (onBar[family] ?? 0) - 1;
        chosen.pop();
      } else choose(next + 1, free, length, lacking);
    }
  }

  choose(first, room, 0, Number.POSITIVE_INFINITY);
  return { fillings, isAll };
}
