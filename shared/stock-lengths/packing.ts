/**
 * The cutting problem in whole numbers: thousandths of a millimetre and units of cost. Searches know nothing of slats.
 * Sizes carry their kerf. What belongs to one family takes `setups[family]` once more on every bar it stands on.
 */
export type Packing = {
  /** Longest first, each size and family once. */
  readonly items: readonly PackItem[];
  readonly setups: readonly number[];
  readonly bars: readonly PackBar[];
};

export type PackItem = { readonly size: number; readonly demand: number; readonly family: number | null };

export type PackBar = {
  readonly room: number;
  /** A whole number, 0 or more. */
  readonly cost: number;
  /** How many there are; null for as many as one likes. */
  readonly onHand: number | null;
};

export type Share = { readonly item: number; readonly count: number };

/** What is cut from one bar: `bar` by its place in the packing, items in their order, each with a count of 1 or more. */
export type Pattern = { readonly bar: number; readonly shares: readonly Share[] };

export type Use = { readonly pattern: Pattern; readonly times: number };

export type Packed = { readonly uses: readonly Use[]; readonly cost: number };

/** How far the parts of a bar reach, setups of their families with them. */
export function loadOf({ items, setups }: Packing, shares: readonly Share[]): number {
  const families = new Set<number>();
  let load = 0;
  for (const { item, count } of shares) {
    const { size = 0, family = null } = items[item] ?? {};
    load += size * count;
    if (family !== null && !families.has(family)) {
      families.add(family);
      load += setups[family] ?? 0;
    }
  }
  return load;
}

/** What a bar costs, by its place. */
export const costOfBar = ({ bars }: Packing, bar: number): number => bars[bar]?.cost ?? 0;

/** The same packing with other demands, in the order of its items. */
export function withDemands(packing: Packing, demands: readonly number[]): Packing {
  return { ...packing, items: packing.items.map((item, index) => ({ ...item, demand: demands[index] ?? 0 })) };
}

/** The same packing after some bars were cut: less to cut, fewer bars. */
export function withoutUses(packing: Packing, uses: readonly Use[]): Packing {
  const demands = packing.items.map(({ demand }) => demand);
  const onHand = packing.bars.map((bar) => bar.onHand);
  for (const { pattern, times } of uses) {
    const left = onHand[pattern.bar];
    if (typeof left === "number") onHand[pattern.bar] = left - times;
    for (const { item, count } of pattern.shares) demands[item] = Math.max(0, (demands[item] ?? 0) - count * times);
  }
  return {
    ...withDemands(packing, demands),
    bars: packing.bars.map((bar, index) => ({ ...bar, onHand: onHand[index] ?? null })),
  };
}

/** Bars cut alike put together, in the order they first appear. */
export function gathered(uses: readonly Use[]): Use[] {
  const found = new Map<string, { pattern: Pattern; times: number }>();
  for (const { pattern, times } of uses) {
    const key = `${pattern.bar}:${pattern.shares.map(({ item, count }) => `${item}x${count}`).join()}`;
    const known = found.get(key);
    if (known) known.times += times;
    else found.set(key, { pattern, times });
  }
  return [...found.values()];
}

/** Cost of all bars. */
export const costOfUses = (packing: Packing, uses: readonly Use[]): number =>
  uses.reduce((sum, { pattern, times }) => sum + costOfBar(packing, pattern.bar) * times, 0);

/** Pieces to cut, all items together. */
export const countPieces = ({ items }: Packing): number => items.reduce((sum, { demand }) => sum + demand, 0);
