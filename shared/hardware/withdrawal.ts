import { mmToInches } from "../units/length.ts";
import { checked, gravityRange, lengthRange, type Outcome } from "../units/outcome.ts";

/** Ultimate load over allowable load; the least that the two published formulas leave between them is 5.5. */
export const withdrawalSafety = 5.5;

/**
 * Load in N at which a wood screw pulls out of the side grain of seasoned wood: 108.25 G² D L (Wood Handbook, GTR-282,
 * equation 8-10), with the specific gravity at 12 % moisture, the shank's diameter and the length of thread in the wood,
 * both in mm, and a pilot hole of 70 % of the root diameter in softwood, 90 % in hardwood. End grain holds about 75 %
 * of it and is erratic.
 */
export function screwWithdrawalN(screw: {
  readonly gravity: number;
  readonly diameter: number;
  readonly threadInWood: number;
}): Outcome<number> {
  const { gravity, diameter, threadInWood } = screw;
  return checked(
    {
      gravity: [gravity, gravityRange],
      diameter: [diameter, lengthRange],
      threadInWood: [threadInWood, { least: 0, most: 1000 }],
    },
    () => 108.25 * gravity ** 2 * diameter * threadInWood,
  );
}

/** Allowable withdrawal in N: the ultimate load over 5.5, as the National Design Specification's 2850 G² D has it. */
export function allowableWithdrawalN(
  screw: Parameters<typeof screwWithdrawalN>[0],
  divisor: number = withdrawalSafety,
): Outcome<number> {
  const ultimate = screwWithdrawalN(screw);
  return ultimate.ok ? { ok: true, value: ultimate.value / divisor } : ultimate;
}

/** Gauges for which the formula was found, by the screw's length in inches (Wood Handbook, chapter 8; from memory). */
const gaugesByLength = [
  { inches: 0.5, from: 1, to: 6 },
  { inches: 0.75, from: 2, to: 11 },
  { inches: 1, from: 3, to: 12 },
  { inches: 1.5, from: 5, to: 14 },
  { inches: 2, from: 7, to: 16 },
  { inches: 2.5, from: 9, to: 18 },
  { inches: 3, from: 12, to: 20 },
] as const;

/** A screw sold by the mm counts as the inch length it stands for (our choice). */
const sameLengthInches = mmToInches(1);

/**
 * Whether the withdrawal formula was found for screws of that gauge and length in mm. Between two listed lengths both
 * must list the gauge; shorter than 1/2 in and longer than 3 in none does.
 */
export function isWithdrawalSize(gauge: number, lengthMm: number): boolean {
  const inches = mmToInches(lengthMm);
  const same = gaugesByLength.find((row) => Math.abs(row.inches - inches) <= sameLengthInches);
  const shorter = same ?? gaugesByLength.findLast((row) => row.inches < inches);
  const longer = same ?? gaugesByLength.find((row) => row.inches > inches);
  if (!shorter || !longer) return false;
  return [shorter, longer].every(({ from, to }) => gauge >= from && gauge <= to);
}
