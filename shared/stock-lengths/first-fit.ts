import { costOfUses, gathered, type Packed, type Packing, type Share, type Use } from "./packing.ts";

type OpenBar = { bar: number; left: number; readonly families: Set<number>; readonly shares: Share[] };

/** With more pieces than this only the first bar with room is looked for, not the one with the least, and few favourites are tried. */
const manyPieces = 3_000;
const favouritesOfMany = 3;

/**
 * A quick packing: longest first, each into the first bar with room, and again into the bar with least room; with
 * several lengths each is tried as the favourite. The cheapest of all, or null when the bars on hand ran out each time.
 * (First fit and best fit decreasing: D. S. Johnson et al., SIAM Journal on Computing 3(4), 1974.)
 */
export function packQuickly(packing: Packing): Packed | null {
  const pieces = packing.items.reduce((sum, { demand }) => sum + demand, 0);
  const fits = pieces > manyPieces ? (["first"] as const) : (["first", "best"] as const);
  const orders = favourites(packing);
  let best: Packed | null = null;
  for (const order of pieces > manyPieces ? orders.slice(0, favouritesOfMany) : orders) {
    for (const fit of fits) {
      const found = packInOrder(packing, order, fit);
      if (found && (best === null || found.cost < best.cost)) best = found;
    }
  }
  return best;
}

/** Orders in which new bars are taken: by cost a length, with each bar in turn put first. */
function favourites({ bars }: Packing): number[][] {
  const rate = (index: number) => (bars[index]?.cost ?? 0) / (bars[index]?.room || 1);
  const byRate = bars.map((_, index) => index).sort((a, b) => rate(a) - rate(b) || a - b);
  return byRate.map((first) => [first, ...byRate.filter((index) => index !== first)]);
}

/** One packing, new bars taken in the order given; null when they run out. */
export function packInOrder(packing: Packing, order: readonly number[], fit: "first" | "best"): Packed | null {
  const { items, setups, bars } = packing;
  const onHand = bars.map((bar) => bar.onHand ?? Number.POSITIVE_INFINITY);
  const open: OpenBar[] = [];
  for (const [item, { size, demand, family }] of items.entries()) {
    const setup = family === null ? 0 : (setups[family] ?? 0);
    const needed = ({ families }: OpenBar) => size + (family !== null && !families.has(family) ? setup : 0);
    // A bar that had no room for the last piece has none for the next of the same size.
    let from = 0;
    for (let piece = 0; piece < demand; piece += 1) {
      let chosen: OpenBar | undefined;
      for (let index = from; index < open.length; index += 1) {
        const bar = open[index];
        if (!bar || bar.left < needed(bar)) continue;
        if (fit === "first") {
          chosen = bar;
          from = index;
          break;
        }
        if (!chosen || bar.left < chosen.left) chosen = bar;
      }
      if (!chosen) {
        const bar = order.find((each) => (onHand[each] ?? 0) > 0 && (bars[each]?.room ?? 0) >= size + setup);
        if (bar === undefined) return null;
        onHand[bar] = (onHand[bar] ?? 0) - 1;
        chosen = { bar, left: bars[bar]?.room ?? 0, families: new Set(), shares: [] };
        if (fit === "first") from = open.length;
        open.push(chosen);
      }
      chosen.left -= needed(chosen);
      if (family !== null) chosen.families.add(family);
      addTo(chosen.shares, item);
    }
  }
  return packed(packing, open, onHand);
}

function addTo(shares: Share[], item: number): void {
  const last = shares.at(-1);
  if (last?.item === item) shares[shares.length - 1] = { item, count: last.count + 1 };
  else shares.push({ item, count: 1 });
}

/** The bars as they are, each exchanged for the cheapest one that still holds what is on it. */
function packed(packing: Packing, open: readonly OpenBar[], onHand: number[]): Packed {
  const uses = open.map(({ bar, left, shares }): Use => {
    const load = (packing.bars[bar]?.room ?? 0) - left;
    let cheapest = bar;
    for (const [index, { room, cost }] of packing.bars.entries()) {
      if (room >= load && (onHand[index] ?? 0) > 0 && cost < (packing.bars[cheapest]?.cost ?? 0)) cheapest = index;
    }
    if (cheapest !== bar) {
      onHand[bar] = (onHand[bar] ?? 0) + 1;
      onHand[cheapest] = (onHand[cheapest] ?? 0) - 1;
    }
    return { pattern: { bar: cheapest, shares }, times: 1 };
  });
  return { uses: gathered(uses), cost: costOfUses(packing, uses) };
}
