import { type Entries, unitInverse } from "./basis-inverse.ts";
import type { Pattern } from "./packing.ts";

/** A column of the master programme: what it costs, and how much of each row it covers. */
export type Column = { readonly pattern: Pattern; readonly cost: number; readonly entries: Entries };

export type PatternMaster = {
  /** Brings a column in, and one out. False when nothing could be exchanged. */
  readonly enter: (column: Column) => boolean;
  /** Leaves bars of the limited kinds unused as long as that pays. */
  readonly settle: () => void;
  /** What one more of each row would cost. */
  readonly duals: () => Float64Array;
  /** Columns in use and how often, in parts of a bar. */
  readonly values: () => { readonly column: Column; readonly value: number }[];
  /** What the columns in use cost, with the penalty for what is missing, the lifting left out. */
  readonly cost: () => number;
  /** Exchanges made so far. */
  readonly exchanges: () => number;
};

type Basic = { readonly column: Column | null; readonly cost: number; readonly entries: Entries };

/** Smaller pivots, gains and amounts are taken for nothing. */
const tiny = 1e-9;
/**
 * Every side is lifted a little, each by another amount: with many equal ones the programme would go in circles. What is
 * given back is none the less right: the bound is taken from the duals alone.
 */
const lift = 1e-5;
const goldenShare = (Math.sqrt(5) - 1) / 2;
/** Amounts that come from the lifting alone are left out. */
const leastValue = 1e-3;
/** After so many exchanges, and two more a row, the inverse is worked out anew, so that rounding does not pile up. */
const exchangesBeforeRenewal = 100;

/**
 * Least cost of patterns, each in any part of a bar, that make up `demands`, row by row, and use `atMost` of each of the rows
 * after those; a missing unit costs `penalty`. Nothing is cut that isn't asked for: every pattern with a piece less is a
 * pattern too, so that this costs nothing, and a piece nobody wants has a price below 0. Columns are brought in one by one
 * by whoever prices them. Revised simplex method with an explicit inverse (V. Chvátal, Linear Programming, 1983, chapters
 * 7 and 13).
 */
export function createMaster(demands: readonly number[], atMost: readonly number[], penalty: number): PatternMaster {
  const asked = Float64Array.from([...demands, ...atMost]);
  const sides = asked.map((side, row) => side + lift * (1 + ((row * goldenShare) % 1)));
  const size = sides.length;
  const isDemand = (row: number) => row < demands.length;
  const basis = Array.from(
    sides,
    (_, row): Basic => ({ column: null, cost: isDemand(row) ? penalty : 0, entries: [[row, 1]] }),
  );
  const inverse = unitInverse(size);
  const amounts = sides.slice();
  const duals = Float64Array.from(basis, ({ cost }) => cost);
  let exchanges = 0;

  function exchange(entering: Basic): boolean {
    const direction = inverse.times(entering.entries);
    const leaving = leavingRow(direction, amounts);
    if (leaving < 0) return false;
    const step = Math.max(0, amounts[leaving] ?? 0) / (direction[leaving] ?? 1);
    const gain = entering.entries.reduce((sum, [row, amount]) => sum - (duals[row] ?? 0) * amount, entering.cost);
    inverse.exchange(direction, leaving);
    for (let row = 0; row < size; row += 1) amounts[row] = (amounts[row] ?? 0) - step * (direction[row] ?? 0);
    amounts[leaving] = step;
    addTimes(duals, inverse.row(leaving), gain);
    basis[leaving] = entering;
    exchanges += 1;
    if (exchanges % (exchangesBeforeRenewal + 2 * size) === 0) renew();
    return true;
  }

  function renew(): void {
    if (!inverse.renew(basis.map(({ entries }) => entries))) return;
    duals.fill(0);
    for (const [row, { cost }] of basis.entries()) {
      const line = inverse.row(row);
      amounts[row] = line.reduce((sum, value, index) => sum + value * (sides[index] ?? 0), 0);
      addTimes(duals, line, cost);
    }
  }

  function settle(): void {
    for (let round = 0; round < 2 * atMost.length; round += 1) {
      let most = -1;
      let mostGain = tiny;
      for (let row = demands.length; row < size; row += 1) {
        const gain = duals[row] ?? 0;
        if (gain <= mostGain) continue;
        most = row;
        mostGain = gain;
      }
      if (most < 0 || !exchange({ column: null, cost: 0, entries: [[most, 1]] })) return;
    }
  }

  return {
    enter: (column) => exchange({ column, cost: column.cost, entries: column.entries }),
    settle,
    duals: () => duals,
    values: () =>
      basis.flatMap(({ column }, row) => {
        const value = amounts[row] ?? 0;
        return column && value > leastValue ? [{ column, value }] : [];
      }),
    cost: () => asked.reduce((sum, side, row) => sum + side * (duals[row] ?? 0), 0),
    exchanges: () => exchanges,
  };
}

/** The row whose amount is used up first; of equals the one with the largest pivot, which is the soundest. -1 for none. */
function leavingRow(direction: Float64Array, amounts: Float64Array): number {
  let leaving = -1;
  let least = Number.POSITIVE_INFINITY;
  for (const [row, step] of direction.entries()) {
    if (step <= tiny) continue;
    const ratio = Math.max(0, amounts[row] ?? 0) / step;
    const isTie = leaving >= 0 && Math.abs(ratio - least) <= tiny;
    if (isTie ? step <= (direction[leaving] ?? 0) : ratio >= least) continue;
    least = Math.min(least, ratio);
    leaving = row;
  }
  return leaving;
}

function addTimes(sums: Float64Array, line: Float64Array, times: number): void {
  for (let index = 0; index < sums.length; index += 1) sums[index] = (sums[index] ?? 0) + times * (line[index] ?? 0);
}
