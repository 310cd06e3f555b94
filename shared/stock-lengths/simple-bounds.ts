import { countPieces, type Packing } from "./packing.ts";

/**
 * No packing costs less: all lengths, setups left out, at the cheapest rate a length there is, bars on hand as far as they go.
 * Whole numbers throughout, so that a sum that comes out even is not rounded up.
 */
export function lengthBound({ items, bars }: Packing): number {
  let length = items.reduce((sum, { size, demand }) => sum + BigInt(size) * BigInt(demand), 0n);
  let spent = 0n;
  const byRate = bars.toSorted((a, b) => a.cost * b.room - b.cost * a.room);
  for (const { cost, room, onHand } of byRate) {
    if (onHand === null || length <= BigInt(onHand) * BigInt(room)) {
      return Number(spent + (length * BigInt(cost) + BigInt(room) - 1n) / BigInt(room));
    }
    length -= BigInt(onHand) * BigInt(room);
    spent += BigInt(onHand) * BigInt(cost);
  }
  // More than all bars hold.
  return Number(spent);
}

/**
 * No packing into bars of one length costs less: pieces longer than half a bar can't share one, and for every k up to half a bar
 * those longer than the bar less k leave no room for what is k or longer (bound L2 of S. Martello and P. Toth, Discrete
 * Applied Mathematics 28(1), 1990). 0 with several lengths.
 */
export function longPiecesBound(packing: Packing): number {
  const [bar, ...others] = packing.bars;
  if (!bar || others.length > 0) return 0;
  const { room, cost } = bar;
  const sizes = packing.items.toSorted((a, b) => b.size - a.size);
  // Counts and lengths of the pieces longer than each, longest first.
  const counts = [0];
  const lengths = [0];
  for (const { size, demand } of sizes) {
    counts.push((counts.at(-1) ?? 0) + demand);
    lengths.push((lengths.at(-1) ?? 0) + size * demand);
  }
  const placeOf = (isBefore: (size: number) => boolean) => {
    const at = sizes.findIndex(({ size }) => !isBefore(size));
    return at < 0 ? sizes.length : at;
  };
  const half = placeOf((size) => 2 * size > room);
  let most = counts[half] ?? 0;
  for (const { size: k } of sizes.slice(half)) {
    const alone = placeOf((size) => size > room - k);
    const upTo = placeOf((size) => size >= k);
    const between = counts[half] ?? 0;
    const length = (lengths[upTo] ?? 0) - (lengths[alone] ?? 0);
    const free = (between - (counts[alone] ?? 0)) * room;
    most = Math.max(most, between + Math.max(0, Math.ceil((length - free) / room - 1e-12)));
  }
  return most * cost;
}

/** More than any packing costs that leaves no bar empty. */
export const moreThanAny = (packing: Packing): number =>
  countPieces(packing) * Math.max(...packing.bars.map(({ cost }) => cost)) + 1;

/** Sums of costs are looked through up to here; what is larger keeps its bound as it is. */
const mostCostLookedThrough = 4_000_000;

/**
 * The least cost from `bound` on that any choice of bars comes to at all, `upTo` at most: bars cost what they cost, and not every
 * sum is one of theirs. `bound` itself when the costs are too large to look through.
 */
export function payableFrom({ bars }: Packing, bound: number, upTo: number): number {
  if (!(upTo <= mostCostLookedThrough) || bound >= upTo) return bound;
  // For every sum whether it is one, and how many of the present bar it takes.
  const isSum = new Uint8Array(upTo + 1);
  isSum[0] = 1;
  for (const { cost, onHand } of bars) {
    if (cost === 0) continue;
    const taken = new Uint32Array(upTo + 1);
    for (let sum = cost; sum <= upTo; sum += 1) {
      const count = (taken[sum - cost] ?? 0) + 1;
      if (isSum[sum] === 1 || isSum[sum - cost] !== 1 || (onHand !== null && count > onHand)) continue;
      isSum[sum] = 1;
      taken[sum] = count;
    }
  }
  const found = isSum.indexOf(1, bound);
  return found < 0 ? upTo : found;
}
