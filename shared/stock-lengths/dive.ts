import { completeBars } from "./complete-bars.ts";
import { packQuickly } from "./first-fit.ts";
import { costOfUses, countPieces, type Packed, type Packing, type Pattern, type Use, withoutUses } from "./packing.ts";
import { boundByPatterns } from "./pattern-bound.ts";
import type { WorkMeter } from "./work-meter.ts";

/** How often a dive may take another pattern than the first choice before it is given up. */
const mostDetours = 8;
/** Next-best patterns that a detour may take. */
const mostChoices = 6;
/** With so few pieces left the rest is searched to the end. */
const fewPieces = 36;
/** Work that such a rest is given. */
const workOfRest = 150_000;

/** So little short of a whole bar is rounding. */
const wholeHair = 1e-3;

type Found = { best: Packed | null; pool: readonly Pattern[] };

/**
 * Whole bars out of parts of bars: what the bound's programme uses whole is kept, else the pattern it uses most, and
 * what is left is bound anew. First without, then with more and more detours (limited discrepancy search, W. Harvey and
 * M. Ginsberg, 1995). Gives something better than `best`, or `best`; stops at `bound`.
 */
export function diveForPacking(
  packing: Packing,
  start: { readonly best: Packed | null; readonly bound: number; readonly pool: readonly Pattern[] },
  meter: WorkMeter,
): Packed | null {
  const found: Found = { best: start.best, pool: start.pool };
  const isDone = () => meter.left() <= 0 || (found.best !== null && found.best.cost <= start.bound);
  for (let detours = 0; detours <= mostDetours && !isDone(); detours += 1) {
    dive(packing, [], detours);
  }
  return found.best;

  function dive(rest: Packing, taken: readonly Use[], detours: number): void {
    if (isDone()) return;
    const spent = costOfUses(packing, taken);
    keep(packQuickly(rest), taken);
    const pieces = countPieces(rest);
    if (pieces === 0) return;
    const enough = (found.best?.cost ?? Number.POSITIVE_INFINITY) - spent;
    if (pieces <= fewPieces) {
      const { packed } = completeBars(
        rest,
        { lessThan: enough, enough: start.bound - spent },
        meter.within(workOfRest),
      );
      keep(packed, taken);
      return;
    }
    const { bound, values, pool } = boundByPatterns(rest, { pool: found.pool, enough, meter });
    found.pool = pool.length > found.pool.length ? pool : found.pool;
    if (bound >= enough || isDone()) return;
    const whole = values.flatMap(({ pattern, value }) => {
      const times = Math.floor(value + wholeHair);
      return times > 0 ? [{ pattern, times }] : [];
    });
    if (whole.length > 0 && detours === 0) {
      dive(withoutUses(rest, whole), [...taken, ...whole], 0);
      return;
    }
    const choices = values.toSorted((a, b) => b.value - a.value || compare(a.pattern, b.pattern)).slice(0, mostChoices);
    for (const [order, { pattern }] of choices.entries()) {
      if (order > detours) return;
      const use = { pattern, times: 1 };
      dive(withoutUses(rest, [use]), [...taken, use], detours - order);
    }
  }

  function keep(packed: Packed | null, taken: readonly Use[]): void {
    if (!packed) return;
    const cost = packed.cost + costOfUses(packing, taken);
    if (found.best === null || cost < found.best.cost) found.best = { uses: [...taken, ...packed.uses], cost };
  }
}

/** An order of patterns that does not hang on when they were found. */
function compare(a: Pattern, b: Pattern): number {
  const text = ({ bar, shares }: Pattern) => `${bar}:${shares.map(({ item, count }) => `${item}x${count}`).join()}`;
  return text(a) < text(b) ? -1 : 1;
}
