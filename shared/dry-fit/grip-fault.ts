import { isShorter } from "../geometry/tolerance.ts";
import { edgeOverlapMm, slotPlayMm } from "../hardware/edge-grip.ts";
import { capStudGrip } from "../hardware/grip.ts";
import type { Hardware, Hole } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { Banded } from "../units/banded.ts";
import type { Limits } from "./limits.ts";

/** Why a standoff does not grip, with what was measured and its limit, mm. */
export type GripFault = {
  readonly kind:
    | "stud too short"
    | "stud too long"
    | "stud not in the wood"
    | "slot too narrow"
    | "slot too wide"
    | "overlap too small"
    | "overlap too deep";
  readonly valueMm: number;
  readonly limitMm: number;
};

const fault = (kind: GripFault["kind"], valueMm: number, limitMm: number): GripFault => ({ kind, valueMm, limitMm });

/**
 * Whether hardware grips a panel: the cap's stud in the barrel, a glued stud in the wood, a slot round the sheet at both
 * ends of its tolerance. `stack` is what lies between barrel and front. A screw through the panel always grips.
 */
export function gripFault(
  hardware: Hardware,
  { stack, offset }: { readonly stack: Banded; readonly offset: number },
  limits: Limits,
): GripFault | null {
  switch (hardware.kind) {
    case "capStud": {
      const { least, most, needed, room } = capStudGrip(hardware, stack, limits.gripDiameters);
      if (isShorter(least, needed)) return fault("stud too short", least, needed);
      return isShorter(room, most) ? fault("stud too long", most, room) : null;
    }
    case "blindStud": {
      const inWood = hardware.studLength - offset;
      const needed = limits.studDiameters * hardware.studDiameter;
      return isShorter(inWood, needed) ? fault("stud not in the wood", inWood, needed) : null;
    }
    case "edgeGrip": {
      const { thickest, thinnest } = slotPlayMm(hardware.slotWidth, stack);
      if (isShorter(thickest, 0)) return fault("slot too narrow", hardware.slotWidth, stack.most);
      return isShorter(limits.slotPlayMm, thinnest) ? fault("slot too wide", thinnest, limits.slotPlayMm) : null;
    }
    case "throughScrew":
      return null;
  }
}

/** Whether an edge grip reaches over its panel's edge, and no deeper than its slot; null for any other hardware. */
export function overlapFault(hardware: Hardware, piece: PieceFigures, hole: Hole, limits: Limits): GripFault | null {
  if (hardware.kind !== "edgeGrip") return null;
  const overlap = edgeOverlapMm(hardware.barrelDiameter, piece.region, hole);
  if (isShorter(overlap, limits.edgeGripMm)) return fault("overlap too small", overlap, limits.edgeGripMm);
  const deepest = hardware.gripDepth + limits.placingErrorMm;
  return isShorter(deepest, overlap) ? fault("overlap too deep", overlap, hardware.gripDepth) : null;
}
