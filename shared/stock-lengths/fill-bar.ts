import type { Packing, Share } from "./packing.ts";
import type { WorkMeter } from "./work-meter.ts";
import { worthTable } from "./worth-table.ts";

export type Fill = {
  /** The best filling worth more than asked for; null when none was found. */
  readonly shares: readonly Share[] | null;
  /** No filling is worth more than this: exactly so when the search ran to its end, else an upper bound. */
  readonly worthAtMost: number;
};

type Candidate = {
  readonly item: number;
  readonly size: number;
  readonly worth: number;
  readonly demand: number;
  readonly family: number | null;
};

/**
 * The filling of one bar that is worth most, if it is worth more than `moreThan`: a bounded knapsack by branch and
 * bound, items by worth a length (E. Horowitz and S. Sahni, Journal of the ACM 21(2), 1974). Worths are whole numbers,
 * one an item. A family's setup is left out of the bound, which is then only
 * higher. Thorough is a search with a table of better bounds, which costs something to make.
 */
export function fillBar(
  packing: Packing,
  bar: number,
  worths: readonly number[],
  moreThan: number,
  { meter, isThorough }: { readonly meter: WorkMeter; readonly isThorough: boolean },
): Fill {
  const room = packing.bars[bar]?.room ?? 0;
  const setupOf = (family: number | null) => (family === null ? 0 : (packing.setups[family] ?? 0));
  const candidates = packing.items
    .map(({ size, demand, family }, item): Candidate => ({ item, size, worth: worths[item] ?? 0, demand, family }))
    .filter(({ size, worth, demand, family }) => worth > 0 && demand > 0 && size + setupOf(family) <= room)
    .sort((a, b) => b.worth * a.size - a.worth * b.size || a.item - b.item);
  const boundBySingles = singlesBound(candidates);
  const table = isThorough ? worthTable(candidates, room) : null;
  if (table) meter.spend(table.work);
  const chosen: Share[] = [];
  const onBar = packing.setups.map(() => 0);
  let best: Share[] | null = null;
  let bestWorth = moreThan;
  let isCut = false;

  /** The most that candidates from `from` on can be worth in `left`, the last of them in part. */
  function bound(from: number, left: number): number {
    const few = table ? Math.min(table.atMost(from, left), boundBySingles(left)) : boundBySingles(left);
    // Dearer to work out, and of no use where the table says as much already.
    if (table) return few;
    let sum = 0;
    let free = left;
    for (let index = from; index < candidates.length; index += 1) {
      const { size = 1, worth = 0, demand = 0 } = candidates[index] ?? {};
      if (size > left) continue;
      if (sum >= few) return few;
      if (size * demand >= free) return Math.min(few, sum + Math.floor((free * worth) / size) + 1);
      sum += worth * demand;
      free -= size * demand;
    }
    return Math.min(few, sum);
  }

  function search(from: number, left: number, worthSoFar: number): void {
    if (worthSoFar > bestWorth) {
      bestWorth = worthSoFar;
      best = [...chosen];
    }
    for (let index = from; index < candidates.length; index += 1) {
      if (isCut || worthSoFar + bound(index, left) <= bestWorth) return;
      if (!meter.spend(1)) {
        isCut = true;
        return;
      }
      const candidate = candidates[index];
      if (!candidate) return;
      const { item, size, worth, demand, family } = candidate;
      const free = left - (family !== null && onBar[family] === 0 ? setupOf(family) : 0);
      for (let count = Math.min(demand, Math.floor(free / size)); count > 0; count -= 1) {
        chosen.push({ item, count });
        if (family !== null) onBar[family] = (onBar[family] ?? 0) + 1;
        search(index + 1, free - count * size, worthSoFar + count * worth);
        if (family !== null) onBar[family] = (onBar[family] ?? 0) - 1;
        chosen.pop();
      }
    }
  }

  const atMost = Math.max(moreThan, bound(0, room));
  search(0, room, 0);
  return { shares: inOrder(best), worthAtMost: isCut ? atMost : bestWorth };
}

/** The most that any candidates can be worth in a length: as many as the shortest allows, each worth as much as any that fits. */
function singlesBound(candidates: readonly Candidate[]): (left: number) => number {
  const bySize = candidates.toSorted((a, b) => a.size - b.size);
  const sizes = Float64Array.from(bySize, ({ size }) => size);
  const most = Float64Array.from(bySize, ({ worth }) => worth);
  for (let index = 1; index < most.length; index += 1) most[index] = Math.max(most[index] ?? 0, most[index - 1] ?? 0);
  const shortest = sizes[0] ?? 1;
  return (left) => {
    let [low, high] = [0, sizes.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((sizes[middle] ?? 0) <= left) low = middle + 1;
      else high = middle;
    }
    return low === 0 ? 0 : Math.floor(left / shortest) * (most[low - 1] ?? 0);
  };
}

const inOrder = (shares: readonly Share[] | null): Share[] | null =>
  shares === null ? null : shares.toSorted((a, b) => a.item - b.item);
