import { isShorter } from "../geometry/tolerance.ts";
import type { CapStud } from "../mockup/document.ts";

/** What keeps a wood screw from going into its barrel, with both diameters in mm. */
export type ScrewMisfit = {
  readonly at: "floor hole" | "bore";
  readonly hasMm: number;
  readonly needsMm: number;
};

/** Whether the screw's shank passes the floor and its head the bore; an empty list when it fits. */
export function screwMisfits(hardware: CapStud): ScrewMisfit[] {
  const misfits: ScrewMisfit[] = [];
  const { floorHole, boreDiameter, screw } = hardware;
  if (isShorter(floorHole, screw.diameter))
    misfits.push({ at: "floor hole", hasMm: floorHole, needsMm: screw.diameter });
  if (isShorter(boreDiameter, screw.headDiameter)) {
    misfits.push({ at: "bore", hasMm: boreDiameter, needsMm: screw.headDiameter });
  }
  return misfits;
}
