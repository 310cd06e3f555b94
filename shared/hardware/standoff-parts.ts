import type { Hardware } from "../mockup/document.ts";

/** Whether a part of it passes the panel, so that a hole is drilled there. */
export function passesPanel(hardware: Hardware): boolean {
  return hardware.kind === "capStud" || hardware.kind === "throughScrew";
}

/** What of it lies on the panel's face, mm; null when nothing is seen there. */
export function frontOf(hardware: Hardware): { readonly diameter: number; readonly thickness: number } | null {
  switch (hardware.kind) {
    case "capStud":
      return { diameter: hardware.capDiameter, thickness: hardware.capThickness };
    case "throughScrew":
      return hardware.cap ?? { diameter: hardware.screw.headDiameter, thickness: hardware.screw.headHeight };
    case "blindStud":
    case "edgeGrip":
      return null;
  }
}

/** How far it holds the panel's back off the wood, mm: barrel and washers; null where only the glue says so. */
export function heldOffsetMm(hardware: Hardware): number | null {
  switch (hardware.kind) {
    case "capStud":
    case "edgeGrip":
      return hardware.barrelLength;
    case "throughScrew":
      return hardware.barrelLength + hardware.washerThickness;
    case "blindStud":
      return hardware.barrelLength > 0 ? hardware.barrelLength : null;
  }
}

/** What a glued stud without a spacer is set at until the maker says otherwise, mm. */
const gluedOffsetMm = 10;

/** Where a panel comes to lie on it, mm, as long as nobody says otherwise. */
export const usualOffsetMm = (hardware: Hardware): number => heldOffsetMm(hardware) ?? gluedOffsetMm;

/** Height of its front above the wood it stands on, mm, when its panel's face lies at `faceMm`. */
export function frontHeightMm(hardware: Hardware, faceMm: number): number {
  if (hardware.kind === "edgeGrip") return Math.max(hardware.height, faceMm);
  return faceMm + (frontOf(hardware)?.thickness ?? 0);
}

/** Across what marks its place from the front, mm: its front, or its barrel where the panel hides it. */
export function seenDiameterMm(hardware: Hardware): number {
  return frontOf(hardware)?.diameter ?? hardware.barrelDiameter;
}

/** Where a stud or screw passes, mm: the least a hole could be; its own barrel where nothing passes the panel. */
export function passingDiameterMm(hardware: Hardware): number {
  switch (hardware.kind) {
    case "capStud":
    case "blindStud":
      return hardware.studDiameter;
    case "throughScrew":
      return hardware.screw.diameter;
    case "edgeGrip":
      return hardware.barrelDiameter;
  }
}
