import { seasonalMovementMm } from "../materials/seasonal-movement.ts";
import { checked, lengthRange, type Outcome } from "../units/outcome.ts";
import { slatAngleRange } from "./check-slats.ts";

/** How far wood would move if it were free, mm; grown is more than 0. */
export type MovementOneWay = {
  readonly slats: number;
  readonly substrate: number;
  /** What the slats want to move more than the substrate lets them. */
  readonly difference: number;
};

export type BackerMovement = {
  /** One slat, across its grain. */
  readonly slat: number;
  readonly acrossWidth: MovementOneWay;
  readonly acrossHeight: MovementOneWay;
  /** The larger of the two differences, and where it is: what a board clad on one side only may cup by. */
  readonly held: {
    readonly mm: number;
    readonly along: "width" | "height";
    readonly hollow: "back" | "front" | "neither";
  };
};

/**
 * Free movement of a slat, of the slats over the whole board and of the substrate when moisture goes from one percentage to
 * another: D · C · ΔM · sin²β each (Wood Handbook, GTR-282, equation 13-2), grain along the slats. Slats glued on are held, so
 * the difference bends the board instead: damp slats on a dry substrate make its back hollow, dry ones its front. Moisture 6 to
 * 14 %, angles in degrees, `grain` of the substrate 0 for level and 90 for upright.
 */
export function backerMovement(backer: {
  readonly width: number;
  readonly height: number;
  readonly angle: number;
  readonly slatWidth: number;
  readonly slatPerPoint: number;
  readonly substrate: { readonly perPoint: number; readonly grain: number };
  readonly from: number;
  readonly to: number;
}): Outcome<BackerMovement> {
  const { width, height, angle, slatWidth, slatPerPoint, substrate, from, to } = backer;
  const sizes = checked(
    {
      width: [width, lengthRange],
      height: [height, lengthRange],
      angle: [angle, slatAngleRange],
      slatWidth: [slatWidth, lengthRange],
    },
    () => null,
  );
  if (!sizes.ok) return sizes;
  const moved = (dimension: number, perPoint: number, grainAngle: number) =>
    seasonalMovementMm({ dimension, perPoint, from, to, grainAngle });
  const slat = moved(slatWidth, slatPerPoint, 90);
  // Slats stand at the angle to the upright, so at 90 − angle to the level.
  const slatsLevel = moved(width, slatPerPoint, 90 - angle);
  const slatsUpright = moved(height, slatPerPoint, angle);
  const substrateLevel = moved(width, substrate.perPoint, substrate.grain);
  const substrateUpright = moved(height, substrate.perPoint, 90 - substrate.grain);
  if (!slat.ok) return slat;
  if (!slatsLevel.ok) return slatsLevel;
  if (!slatsUpright.ok) return slatsUpright;
  if (!substrateLevel.ok) return substrateLevel;
  if (!substrateUpright.ok) return substrateUpright;
  const acrossWidth = oneWay(slatsLevel.value, substrateLevel.value);
  const acrossHeight = oneWay(slatsUpright.value, substrateUpright.value);
  return { ok: true, value: { slat: slat.value, acrossWidth, acrossHeight, held: heldOf(acrossWidth, acrossHeight) } };
}

const oneWay = (slats: number, substrate: number): MovementOneWay => ({
  slats,
  substrate,
  difference: slats - substrate,
});

function heldOf(acrossWidth: MovementOneWay, acrossHeight: MovementOneWay): BackerMovement["held"] {
  const wide = Math.abs(acrossWidth.difference) >= Math.abs(acrossHeight.difference);
  const { difference } = wide ? acrossWidth : acrossHeight;
  const hollow = difference > 0 ? "back" : difference < 0 ? "front" : "neither";
  return { mm: Math.abs(difference), along: wide ? "width" : "height", hollow };
}
