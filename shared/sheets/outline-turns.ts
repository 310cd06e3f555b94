import type { Region } from "../geometry/path.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import type { AllowedTurns } from "./nesting.ts";

/** How many turns of a piece that may be turned freely are tried: fewer where there are many pieces to choose from. */
export function freeTurnsFor(pieces: number): number {
  if (pieces <= 200) return 16;
  return pieces <= 800 ? 8 : 4;
}

/** Of a piece that may be turned in steps no more than these are tried. */
const mostTurns = 72;

/**
 * The turns of a piece that are tried on a sheet, in degrees from 0 up to 360, none twice. Those of a piece that may be
 * turned freely are spaced evenly from the turn at which its box is smallest.
 */
export function turnsToTry(
  region: Region,
  allowed: AllowedTurns,
  { grainTurn, freeTurns }: { readonly grainTurn: number; readonly freeTurns: number },
): readonly number[] {
  if (allowed.kind === "free") {
    const along = smallestBox(region)?.turn ?? 0;
    return Array.from({ length: freeTurns }, (_, index) => wholeTurn((index * 360) / freeTurns - along));
  }
  const steps = Math.max(1, Math.round(360 / allowed.every));
  const stride = Math.ceil(steps / mostTurns);
  const turns: number[] = [];
  for (let step = 0; step < steps; step += stride)
    turns.push(wholeTurn(grainTurn + allowed.from + step * allowed.every));
  return turns;
}

/** Whether a turn is one of those allowed, within a millionth of a degree. */
export function isTurnAllowed(turn: number, allowed: AllowedTurns, grainTurn: number): boolean {
  if (allowed.kind === "free") return true;
  const off = (turn - grainTurn - allowed.from) / allowed.every;
  return Math.abs(off - Math.round(off)) * allowed.every < 1e-6;
}

function wholeTurn(degrees: number): number {
  const turn = ((degrees % 360) + 360) % 360;
  // What is a right angle but for its last digits is one, so that its sides come out straight.
  const quarter = Math.round(turn / 90) * 90;
  return Math.abs(turn - quarter) < 1e-9 ? quarter % 360 : turn;
}
