import { checked, type Outcome, type Range, spanRange } from "../units/outcome.ts";
import type { WoodMovement } from "./wood-movement.ts";

/** How a board was sawn: which of the two movements works across its face. */
export type Sawn = "flatsawn" | "quartersawn" | "unknown";

/** Moisture in percent that the handbook's coefficients hold for. */
export const movementMoisture: Range = { least: 6, most: 14 };

/** Movement across the face per point of moisture: tangential unless the board is quartersawn. */
export function movementAcross({ radial, tangential }: WoodMovement, sawn: Sawn): number {
  return sawn === "quartersawn" ? radial : tangential;
}

/**
 * How much a wooden thing free to move grows (positive) or shrinks in mm when its moisture goes from one percentage to
 * another: ΔD = D · C · (M₁ − M₀) · sin²β (Wood Handbook, GTR-282, equation 13-2), with D its dimension in mm and β the
 * angle in degrees between that dimension and the grain; along the grain wood hardly moves. 6 to 14 % moisture.
 */
export function seasonalMovementMm(wood: {
  readonly dimension: number;
  readonly perPoint: number;
  readonly from: number;
  readonly to: number;
  readonly grainAngle: number;
}): Outcome<number> {
  const { dimension, perPoint, from, to, grainAngle } = wood;
  return checked(
    {
      dimension: [dimension, spanRange],
      perPoint: [perPoint, { least: 0, most: 0.01 }],
      from: [from, movementMoisture],
      to: [to, movementMoisture],
      grainAngle: [grainAngle, { least: -360, most: 360 }],
    },
    () => dimension * perPoint * (to - from) * Math.sin((grainAngle * Math.PI) / 180) ** 2,
  );
}
