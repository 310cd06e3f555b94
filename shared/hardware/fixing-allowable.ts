import { threadedShare } from "../materials/wood-screw-threads.ts";
import { nearestGauge } from "../materials/wood-screws.ts";
import type { Hardware, Wood } from "../mockup/document.ts";
import { gravityRange, type Outcome } from "../units/outcome.ts";
import { rangeClamp } from "../units/range-clamp.ts";
import { allowableLateralN, lateralGravities, screwLateral } from "./lateral.ts";
import { allowableWithdrawalN, isWithdrawalSize } from "./withdrawal.ts";

/** Why an allowable load is an estimate of ours and no published one. */
export type Unproven = "shallow" | "size" | "glued stud" | "light wood";

export type FixingAllowable = {
  /** Across it and along it, N. */
  readonly lateralN: number;
  readonly withdrawalN: number;
  readonly unproven: readonly Unproven[];
};

/**
 * What one standoff may carry in the wood, N, by how many mm of it are in there at the least; nothing when none is. The
 * published loads over the divisors; outside their range an estimate that says so:
 * - shallower than 4 D: in proportion on, as lateral.ts says;
 * - a size that the handbook's list does not have, with the formula of its neighbours (our choice); a screw that is not
 *   made by number counts as the nearest one;
 * - a glued stud as a screw of its thickness with thread all along (our choice: glue holds no worse than thread);
 * - wood lighter than the table in proportion to its gravity, in withdrawal to its square; heavier wood as the table's
 *   heaviest, which is on the safe side.
 */
export function fixingAllowable(
  hardware: Hardware,
  wood: Pick<Wood, "gravity" | "hardness">,
  inWoodMm: number,
  divisors: { readonly lateral: number; readonly withdrawal: number },
): Outcome<FixingAllowable> {
  const unproven: Unproven[] = [];
  if (!(inWoodMm > 0)) return { ok: true, value: { lateralN: 0, withdrawalN: 0, unproven } };
  const { diameter, thread } = shankOf(hardware);
  const range = lateralGravities[wood.hardness];
  const across = { hardness: wood.hardness, gravity: rangeClamp(wood.gravity, range), diameter, penetration: inWoodMm };
  const lateral = allowableLateralN(across, divisors.lateral);
  const along = { gravity: rangeClamp(wood.gravity, gravityRange), diameter, threadInWood: Math.min(inWoodMm, thread) };
  const withdrawal = allowableWithdrawalN(along, divisors.withdrawal);
  const depth = screwLateral(across);
  if (!lateral.ok) return lateral;
  if (!withdrawal.ok) return withdrawal;
  if (depth.ok && depth.value.tooShallow) unproven.push("shallow");
  if (hardware.kind === "blindStud") unproven.push("glued stud");
  else if (!isWithdrawalSize(hardware.screw.gauge ?? nearestGauge(diameter), hardware.screw.length))
    unproven.push("size");
  if (across.gravity > wood.gravity + 0.005) unproven.push("light wood");
  return {
    ok: true,
    value: {
      lateralN: lateral.value * Math.min(1, wood.gravity / across.gravity),
      withdrawalN: withdrawal.value * Math.min(1, wood.gravity / along.gravity) ** 2,
      unproven,
    },
  };
}

function shankOf(hardware: Hardware): { readonly diameter: number; readonly thread: number } {
  if (hardware.kind === "blindStud") return { diameter: hardware.studDiameter, thread: hardware.studLength };
  return { diameter: hardware.screw.diameter, thread: threadedShare * hardware.screw.length };
}
