import { checked, type Outcome, type Range, spanRange } from "../units/outcome.ts";

/** How a material moves, per mm of length: by kelvin, and by point of moisture. */
export type Movement = { readonly perK: number; readonly perPoint: number };

const perKRange: Range = { least: 0, most: 0.001 };
const perPointRange: Range = { least: 0, most: 0.01 };

/**
 * How far in mm two materials bonded to each other want to part at the end of the bond: half its longest dimension times
 * what they move differently, |α₁ − α₂|·|ΔT| + |C₁ − C₂|·|ΔM|. Nothing for equal materials. Arithmetic; warmth and damp
 * are taken at their worst together.
 */
export function movementMismatchMm(bond: {
  readonly longest: number;
  readonly one: Movement;
  readonly other: Movement;
  readonly temperatureK: number;
  readonly moisturePoints: number;
}): Outcome<number> {
  const { longest, one, other, temperatureK, moisturePoints } = bond;
  return checked(
    {
      longest: [longest, spanRange],
      onePerK: [one.perK, perKRange],
      onePerPoint: [one.perPoint, perPointRange],
      otherPerK: [other.perK, perKRange],
      otherPerPoint: [other.perPoint, perPointRange],
      temperatureK: [temperatureK, { least: -200, most: 200 }],
      moisturePoints: [moisturePoints, { least: -30, most: 30 }],
    },
    () =>
      (longest / 2) *
      (Math.abs(one.perK - other.perK) * Math.abs(temperatureK) +
        Math.abs(one.perPoint - other.perPoint) * Math.abs(moisturePoints)),
  );
}
