import type { Screw } from "../mockup/document.ts";
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

/** What of a screw's head stands above a barrel's floor, mm: only a flat one in a countersunk floor is flush with it. */
export function headAboveFloorMm(
  countersunk: boolean,
  { head, headHeight }: Pick<Screw, "head" | "headHeight">,
): number {
  return countersunk && head === "flat" ? 0 : headHeight;
}

/**
 * The grip of a cap standoff: stud length less the panel under the cap. At the thickest panel at least so many stud
 * diameters must be in the barrel (one: common practice); at the thinnest the stud must not meet the screw's head, or the cap never tightens.
 */
export function capStudGrip(
  hardware: {
    readonly studLength: number;
    readonly studDiameter: number;
    readonly boreDepth: number;
    readonly countersunk: boolean;
    readonly screw: Pick<Screw, "head" | "headHeight">;
  },
  panel: Banded,
  gripDiameters = 1,
): Grip {
  return {
    least: hardware.studLength - panel.most,
    most: hardware.studLength - panel.least,
    needed: gripDiameters * hardware.studDiameter,
    room: hardware.boreDepth - headAboveFloorMm(hardware.countersunk, hardware.screw),
  };
}
