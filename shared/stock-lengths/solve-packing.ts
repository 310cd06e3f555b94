import { completeBars } from "./complete-bars.ts";
import { diveForPacking } from "./dive.ts";
import { packQuickly } from "./first-fit.ts";
import { countPieces, gathered, type Packed, type Packing } from "./packing.ts";
import { boundByPatterns } from "./pattern-bound.ts";
import { lengthBound, longPiecesBound, moreThanAny, payableFrom } from "./simple-bounds.ts";
import { type Effort, startMeter } from "./work-meter.ts";

export type Solved = {
  /** The cheapest packing found; null when the bars on hand did not suffice for any that was tried. */
  readonly packed: Packed | null;
  /** No packing costs less. */
  readonly bound: number;
  /** Why the search ended: nothing better exists, its work was used up, or somebody asked. */
  readonly ended: "proved" | "work" | "asked";
};

/** Up to so many pieces the search bar by bar is tried. */
const mostPiecesToComplete = 1_500;
/** Up to so many different items the bound by patterns is computed: its work grows with their square and more. */
const mostItemsToBound = 300;

/**
 * The cheapest packing that can be found with the effort given, and how far it may be from the best there is. The same
 * packing and work give the same answer.
 */
export function solvePacking(packing: Packing, effort: Effort = {}): Solved {
  const meter = startMeter(effort);
  const pieces = countPieces(packing);
  let packed = packQuickly(packing);
  let bound = 0;
  const raise = (found: number) => {
    if (found > bound) bound = payableFrom(packing, found, packed?.cost ?? Number.POSITIVE_INFINITY);
  };
  raise(Math.max(lengthBound(packing), longPiecesBound(packing)));
  const isProved = () => packed !== null && packed.cost <= bound;
  const improve = (found: Packed | null) => {
    if (found && (packed === null || found.cost < packed.cost)) packed = found;
  };
  const complete = (work: number) => {
    if (isProved() || pieces > mostPiecesToComplete) return;
    const lessThan = packed?.cost ?? moreThanAny(packing);
    const found = completeBars(packing, { lessThan, enough: bound }, meter.within(work));
    improve(found.packed);
    if (found.isProof) raise(packed?.cost ?? lessThan);
  };

  complete(meter.left() / 40);
  if (!isProved() && packing.items.length <= mostItemsToBound) {
    const enough = packed?.cost ?? Number.POSITIVE_INFINITY;
    const pool = packed?.uses.map(({ pattern }) => pattern) ?? [];
    const root = boundByPatterns(packing, { pool, enough, meter: meter.within(meter.left() / 2) });
    raise(root.bound);
    if (!isProved())
      improve(diveForPacking(packing, { best: packed, bound, pool: root.pool }, meter.within(meter.left() * 0.7)));
  }
  complete(meter.left());

  const ended = isProved() ? "proved" : meter.isAskedToStop() ? "asked" : "work";
  return { packed: packed && { uses: gathered(packed.uses), cost: packed.cost }, bound, ended };
}
