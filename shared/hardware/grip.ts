import type { Banded } from "../units/banded.ts";

/** How much of a cap's stud is in the barrel, and how much must and may be, in mm. */
export type Grip = {
  /** With the thickest panel. */
  readonly least: number;
  /** With the thinnest panel. */
  readonly most: number;
  readonly needed: number;
  readonly room: number;
};

/**
 * The grip of a cap standoff: stud length less the panel under the cap. At the thickest panel at least one stud
 * diameter must be in the barrel; at the thinnest the stud must not meet the screw's head, or the cap never tightens.
 */
export function capStudGrip(
  hardware: {
    readonly studLength: number;
    readonly studDiameter: number;
    readonly boreDepth: number;
    readonly countersunk: boolean;
    readonly screw: { readonly headHeight: number };
  },
  panel: Banded,
): Grip {
  // A flat head in a countersunk floor is flush with it; on a plain floor it stands up in the bore.
  const headAboveFloor = hardware.countersunk ? 0 : hardware.screw.headHeight;
  return {
    least: hardware.studLength - panel.most,
    most: hardware.studLength - panel.least,
    needed: hardware.studDiameter,
    room: hardware.boreDepth - headAboveFloor,
  };
}
