import type { Outcome } from "../units/outcome.ts";
import { cutRunMm, kerfAlongMm, usableLengthMm } from "./bar-take.ts";
import { type BarPart, type CuttingJob, hasParallelCuts } from "./cutting-job.ts";
import type { PackBar, PackItem, Packing } from "./packing.ts";

/** What the cheapest plan is reckoned in. */
export type CostKind = "bars" | "length" | "price";

/** A part with what it takes on a bar, in mm. */
export type TakenPart = {
  readonly part: BarPart;
  /** Along the bar, for the cut after it. */
  readonly kerfMm: number;
  /** What its parallel cuts lie into the next part of its family; null for a part that lies alone. */
  readonly family: { readonly index: number; readonly cutRunMm: number } | null;
};

/** A job in whole numbers, and the way back. */
export type JobPacking = {
  readonly packing: Packing;
  /** Parts of each item, in the order of the job. */
  readonly partsOfItem: readonly (readonly TakenPart[])[];
  readonly costKind: CostKind;
  /** What one unit of the packing's cost is, in bars, mm or minor units. */
  readonly costUnit: number;
};

const stepsPerMm = 1_000;
/** Less than this is rounding of the figures, not length. */
const hairMm = 1e-6;
const stepsUp = (mm: number): number => Math.ceil((mm - hairMm) * stepsPerMm);

/**
 * The job as a packing problem in thousandths of a mm, sizes rounded up and bars down. The last cut of a bar may fall off
 * its end, so every bar has the smallest kerf of all parts to spare. The job must have passed its check.
 */
export function packingOfJob(job: CuttingJob): JobPacking {
  const taken = takenParts(job);
  const setups: number[] = [];
  for (const { family } of taken) if (family) setups[family.index] = stepsUp(family.cutRunMm);
  const spare = Math.min(...taken.map(({ kerfMm }) => stepsUp(kerfMm)));
  const rooms = job.stock.map(({ lengthMm }) =>
    Math.floor((soundValue(usableLengthMm({ lengthMm, ...job.saw })) + hairMm) * stepsPerMm),
  );
  const costKind = costKindOf(job);
  const costs = job.stock.map(
    ({ lengthMm, price }) => ({ bars: 1, length: stepsUp(lengthMm), price: price ?? 0 })[costKind],
  );
  const unit = costs.reduce(commonDivisor, 0) || 1;
  const bars = job.stock.map(
    ({ onHand }, index): PackBar => ({
      // A bar that squaring and knots use up stays on the list, with no room to speak of.
      room: Math.max(1, (rooms[index] ?? 0) + spare),
      cost: (costs[index] ?? 0) / unit,
      onHand,
    }),
  );
  const most = Math.max(...bars.map(({ room, onHand }) => (onHand === 0 ? 0 : room)));
  const byKey = new Map<string, { item: PackItem; parts: TakenPart[] }>();
  for (const each of taken) {
    const { part, kerfMm, family } = each;
    const setup = family ? (setups[family.index] ?? 0) : 0;
    // A part as long as the longest bar has it to itself, whatever its last cut would take.
    const size = Math.max(1, Math.min(stepsUp(part.lengthMm) - setup + stepsUp(kerfMm), most - setup));
    const key = `${size}:${family?.index ?? ""}`;
    const known = byKey.get(key);
    const demand = (known?.item.demand ?? 0) + part.quantity;
    byKey.set(key, {
      item: { size, demand, family: family?.index ?? null },
      parts: [...(known?.parts ?? []), each],
    });
  }
  const entries = [...byKey.values()].sort(
    (a, b) => b.item.size - a.item.size || (a.item.family ?? -1) - (b.item.family ?? -1),
  );
  return {
    packing: { items: entries.map(({ item }) => item), setups, bars },
    partsOfItem: entries.map(({ parts }) => parts),
    costKind,
    costUnit: costKind === "length" ? unit / stepsPerMm : unit,
  };
}

/** By price when every length has one and not all are free, else by length, or by count when there is one length only. */
function costKindOf({ stock }: CuttingJob): CostKind {
  if (stock.every(({ price }) => price !== null) && stock.some(({ price }) => price !== 0)) return "price";
  return stock.length > 1 ? "length" : "bars";
}

function takenParts({ parts, saw, widthMm }: CuttingJob): TakenPart[] {
  const families = new Map<string, number>();
  return parts.map((part) => {
    const { start, end, lengthMm } = part;
    const kerfMm = soundValue(kerfAlongMm(saw.kerfMm, Math.min(start.angle, end.angle)));
    const run = soundValue(cutRunMm(widthMm, start.angle));
    // Shorter than its own mitre it is no parallelogram.
    if (!saw.nests || !hasParallelCuts(part) || lengthMm <= run + hairMm) return { part, kerfMm, family: null };
    const key = `${start.angle}:${start.longPoint}`;
    const index = families.get(key) ?? families.size;
    families.set(key, index);
    return { part, kerfMm, family: { index, cutRunMm: run } };
  });
}

/** The value of an outcome that the job's check has made sure of. */
export function soundValue<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw new RangeError(`The job was not checked: ${outcome.reason.field}.`);
}

function commonDivisor(a: number, b: number): number {
  return b === 0 ? a : commonDivisor(b, a % b);
}
