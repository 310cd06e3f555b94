import type { CuttingJob } from "./cutting-job.ts";
import type { Use } from "./packing.ts";
import type { JobPacking, TakenPart } from "./packing-of-job.ts";

/** A part on its bar, from its first long point to its last, mm from the bar's first end. */
export type PlacedPart = {
  readonly partId: string;
  readonly label: string;
  readonly fromMm: number;
  readonly toMm: number;
  /** What the cut after it takes along the bar. */
  readonly kerfMm: number;
  /** Whether its first cut is the last one of the part before it. */
  readonly isNested: boolean;
};

/** Bars cut alike. */
export type CutBar = {
  readonly stockId: string;
  readonly times: number;
  readonly lengthMm: number;
  /** Cut off to begin with. */
  readonly squaringMm: number;
  readonly places: readonly PlacedPart[];
  /** What is left behind the last cut, mm; knots that are cut out come out of it. */
  readonly leftMm: number;
};

/**
 * Gives every bar its parts and every part its place: families together, so that they lie in each other, then the others
 * by angle and length. Parts of one item are given out in the order of the job.
 */
export function layBars(job: CuttingJob, { partsOfItem, packing }: JobPacking, uses: readonly Use[]): CutBar[] {
  const queues = partsOfItem.map((parts) => parts.map((taken) => ({ taken, left: taken.part.quantity })));
  const next = (item: number): TakenPart[] => {
    const queue = queues[item] ?? [];
    while (queue[0]?.left === 0) queue.shift();
    const head = queue[0];
    if (!head) return [];
    head.left -= 1;
    return [head.taken];
  };
  const bars = new Map<string, CutBar>();
  for (const { pattern, times } of uses) {
    const stock = job.stock[pattern.bar];
    if (!stock) continue;
    for (let time = 0; time < times; time += 1) {
      // A pattern may hold a piece more than is still asked for; that one isn't cut.
      const parts = pattern.shares.flatMap(({ item, count }) => Array.from({ length: count }, () => next(item)).flat());
      if (parts.length === 0) continue;
      const places = place(parts, job.saw.squaringMm);
      const last = places.at(-1);
      const key = `${stock.id}:${places.map(({ partId }) => partId).join("|")}`;
      const leftMm = Math.max(0, stock.lengthMm - (last ? last.toMm + last.kerfMm : 0));
      bars.set(key, {
        stockId: stock.id,
        times: (bars.get(key)?.times ?? 0) + 1,
        lengthMm: stock.lengthMm,
        squaringMm: job.saw.squaringMm,
        places,
        leftMm,
      });
    }
  }
  const uncut = queues.flat().reduce((sum, { left }) => sum + left, 0);
  if (uncut > 0) throw new Error(`${uncut} of ${packing.items.length} items' parts were not cut.`);
  return [...bars.values()];
}

function place(parts: readonly TakenPart[], squaringMm: number): PlacedPart[] {
  const places: PlacedPart[] = [];
  let at = squaringMm;
  let before: TakenPart | null = null;
  for (const taken of parts.toSorted(bySaw)) {
    const { part, kerfMm, family } = taken;
    const isNested = family !== null && before?.family?.index === family.index;
    const fromMm = isNested ? at - family.cutRunMm : at;
    const toMm = fromMm + part.lengthMm;
    places.push({ partId: part.id, label: part.label, fromMm, toMm, kerfMm, isNested });
    at = toMm + kerfMm;
    before = taken;
  }
  return places;
}

/** Families first, each together; then by the angle of the saw, long parts before short ones, and by id. */
function bySaw(a: TakenPart, b: TakenPart): number {
  const family = (taken: TakenPart) => taken.family?.index ?? Number.MAX_SAFE_INTEGER;
  return (
    family(a) - family(b) ||
    a.part.end.angle - b.part.end.angle ||
    b.part.lengthMm - a.part.lengthMm ||
    (a.part.id < b.part.id ? -1 : Number(a.part.id !== b.part.id))
  );
}
