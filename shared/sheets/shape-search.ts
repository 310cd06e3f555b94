import type { CutShape } from "./cut-shape.ts";
import type { Item } from "./filler.ts";
import type { WorkMeter } from "./occupancy.ts";
import { type Bin, findLaying, type Laying, lay, takeUp, type Way } from "./yard.ts";

/** Where everything lies, and what could not be laid. */
export type Arrangement = {
  readonly layings: readonly Laying[];
  readonly left: readonly Item[];
  /** What the sheets lose, mm², and a little for pieces that lie far out; with a penalty for what is left. */
  readonly cost: number;
};

export type SearchControl = {
  readonly meter: WorkMeter;
  /** Looks at the grid after which the search ends. */
  readonly probes: number;
  readonly random: () => number;
  readonly shouldStop: () => boolean;
  readonly onProgress: (done: number, best: Arrangement) => void;
};

/** Lays items one after the other, each in the first bin with room for it. Gives those that went nowhere. */
export function layInOrder(
  items: readonly Item[],
  bins: readonly Bin[],
  meter: WorkMeter,
  shouldStop: () => boolean,
): Item[] {
  const left: Item[] = [];
  for (const item of items) {
    const laying = shouldStop() ? null : firstLaying(item, bins, meter);
    if (laying) lay(laying);
    else left.push(item);
  }
  return left;
}

function firstLaying(
  item: Item,
  bins: readonly Bin[],
  meter: WorkMeter,
  isTried?: (way: Way) => boolean,
): Laying | null {
  for (const bin of bins) {
    const laying = findLaying(item, bin, meter, isTried);
    if (laying) return laying;
  }
  return null;
}

/** What lies in the bins now. */
export function arrangementOf(bins: readonly Bin[], left: readonly Item[], shapes: readonly CutShape[]): Arrangement {
  return { layings: bins.flatMap((bin) => [...bin.laid]), left, cost: costOf(bins, left, shapes) };
}

/** Weight of how far out pieces lie against the end of the last one: enough to tell which way is better, where the ends are equal. */
const farOutWeight = 0.5;

function costOf(bins: readonly Bin[], left: readonly Item[], shapes: readonly CutShape[]): number {
  let cost = 0;
  const last = bins.findLastIndex(({ laid }) => laid.size > 0);
  for (const [index, { ground, laid }] of bins.entries()) {
    if (index > last) break;
    const { areaMm2, box, along } = ground.field;
    if (index < last) {
      cost += areaMm2;
      continue;
    }
    const length = along === "x" ? box.width : box.height;
    let end = 0;
    let moment = 0;
    let area = 0;
    for (const laying of laid) {
      const weight = shapes[laying.item.shape]?.areaMm2 ?? 0;
      end = Math.max(end, laying.end);
      moment += weight * laying.end;
      area += weight;
    }
    cost += (areaMm2 * (end + farOutWeight * (moment / Math.max(area, 1e-9)))) / length;
  }
  for (const { shape } of left) cost += leftPenalty * (shapes[shape]?.areaMm2 ?? 0) + 1;
  return cost;
}

const leftPenalty = 20;

/** Restores an arrangement in the bins it was taken from. */
export function restore(bins: readonly Bin[], arrangement: Arrangement): void {
  const wanted = new Set(arrangement.layings);
  for (const bin of bins) for (const laying of [...bin.laid]) if (!wanted.has(laying)) takeUp(laying);
  for (const laying of arrangement.layings) if (!laying.bin.laid.has(laying)) lay(laying);
}

/**
 * Improves what lies in the bins: takes up some neighbours, lays them again in another order, and keeps the outcome when
 * it is better or, early on, not much worse (ruin and recreate: G. Schrimpf et al., Journal of Computational Physics 159,
 * 2000). Ends after so much work, when told to stop, or when nothing is left to gain. Leaves the best in the bins.
 */
export function improve(
  start: Arrangement,
  bins: readonly Bin[],
  shapes: readonly CutShape[],
  control: SearchControl,
): Arrangement {
  const { meter, random } = control;
  const began = meter.probes;
  let current = start;
  let best = start;
  let told = 0;
  const total = start.layings.length + start.left.length;
  if (total < 2) return start;
  while (meter.probes - began < control.probes && !control.shouldStop()) {
    const done = (meter.probes - began) / control.probes;
    const taken = ruin(bins, random);
    // Taking pieces up and laying them down is work too, as much as some looks; an empty round is some, so that it ends.
    meter.probes += taken.reduce((sum, { way: { mask } }) => sum + (mask.columns * mask.rows) / 2, 1000);
    for (const laying of taken) takeUp(laying);
    const items = order([...taken.map(({ item }) => item), ...current.left], shapes, random);
    const left: Item[] = [];
    // Trying only some of the ways of a piece is quicker, and brings it where it would not go otherwise.
    const share = 0.25 + 0.5 * random();
    for (const item of items) {
      const laying = firstLaying(item, bins, meter, () => random() < share) ?? firstLaying(item, bins, meter);
      if (laying) lay(laying);
      else left.push(item);
    }
    const next = arrangementOf(bins, left, shapes);
    const warmth = warmest * start.cost * (1 - done) ** 2;
    if (next.cost < current.cost - warmth * Math.log(1 - random())) {
      current = next;
    } else restore(bins, current);
    const isBetter = next.cost < best.cost - 1e-9;
    if (isBetter) best = next;
    if (isBetter || done >= told + tellingStep) {
      told = done;
      control.onProgress(done, best);
    }
  }
  restore(bins, best);
  return best;
}

/** Progress is told at least every so much of the search. */
const tellingStep = 0.02;
/** Neighbours taken up at once; more of them seldom find together again. */
const mostTaken = 4;
/** At first a layout that is worse by this share is still taken about one time in three. */
const warmest = 0.0005;

function ruin(bins: readonly Bin[], random: () => number): Laying[] {
  const used = bins.filter(({ laid }) => laid.size > 0);
  const last = used.at(-1);
  if (!last) return [];
  const pick = <T>(list: readonly T[]): T | undefined => list[Math.floor(random() * list.length)];
  const bin = random() < 0.5 ? last : (pick(used) ?? last);
  const seed = pick([...bin.laid]);
  if (!seed) return [];
  const count = 1 + Math.floor(random() * mostTaken);
  const near = nearest([...bin.laid], seed, count);
  // Something from the end of the last sheet goes with them: it is what a better place is wanted for.
  const ends = [...last.laid].filter((laying) => !near.includes(laying)).sort((a, b) => b.end - a.end);
  const far = ends[Math.floor(random() ** 3 * ends.length)];
  return far ? [...near, far] : near;
}

function nearest(layings: readonly Laying[], seed: Laying, count: number): Laying[] {
  const at = ({ column, row, way }: Laying) => ({ u: column + way.mask.columns / 2, v: row + way.mask.rows / 2 });
  const middle = at(seed);
  return layings
    .map((laying) => {
      const { u, v } = at(laying);
      return { laying, distance: Math.hypot(u - middle.u, v - middle.v) };
    })
    .sort((a, b) => a.distance - b.distance || a.laying.item.index - b.laying.item.index)
    .slice(0, count)
    .map(({ laying }) => laying);
}

function order(items: readonly Item[], shapes: readonly CutShape[], random: () => number): Item[] {
  const bySize = random();
  const key = (item: Item): number => {
    const shape = shapes[item.shape];
    if (!shape || bySize < 0.3) return random();
    return shape.areaMm2 * (0.6 + 0.8 * random());
  };
  return items
    .map((item) => ({ item, key: key(item) }))
    .sort((a, b) => b.key - a.key || a.item.index - b.item.index)
    .map(({ item }) => item);
}
