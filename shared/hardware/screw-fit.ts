import { isShorter } from "../geometry/tolerance.ts";
import type { Hardware, Screw } from "../mockup/document.ts";

/** What keeps a wood screw from going into its standoff, with both diameters in mm. */
export type ScrewMisfit = {
  readonly at: "floor hole" | "bore" | "spacer";
  readonly hasMm: number;
  readonly needsMm: number;
};

/**
 * Whether a screw goes into a standoff: its shank through the floor and its head through the bore of a barrel, its shank
 * through the floor of an edge grip, which is open above, and through a spacer's bore. An empty list when it fits, and for
 * a stud, which takes no screw.
 */
export function screwMisfits(hardware: Hardware): ScrewMisfit[] {
  switch (hardware.kind) {
    case "capStud": {
      const { floorHole, boreDiameter, screw } = hardware;
      return [
        ...narrower("floor hole", floorHole, screw.diameter),
        ...narrower("bore", boreDiameter, screw.headDiameter),
      ];
    }
    case "edgeGrip":
      return narrower("floor hole", hardware.floorHole, hardware.screw.diameter);
    case "throughScrew":
      return narrower("spacer", hardware.boreDiameter, hardware.screw.diameter);
    case "blindStud":
      return [];
  }
}

/** Hardware with another screw; the same for a stud, which takes none. */
export function withScrew(hardware: Hardware, screw: Screw): Hardware {
  return hardware.kind === "blindStud" ? hardware : { ...hardware, screw };
}

function narrower(at: ScrewMisfit["at"], hasMm: number, needsMm: number): ScrewMisfit[] {
  return isShorter(hasMm, needsMm) ? [{ at, hasMm, needsMm }] : [];
}
