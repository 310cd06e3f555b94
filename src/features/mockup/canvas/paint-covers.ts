import { Circle, type FabricObject } from "fabric/es";
import type { CapCover } from "../model/cap-covers.ts";

/** The theme's graphite and oxblood: a canvas has no classes. */
const graphite = "#57524A";
const oxblood = "#7A1F2B";

const still = { selectable: false, evented: false, objectCaching: false, fill: "transparent" } as const;

/** Holes under their caps, dashed as what is hidden is drawn; one that its cap does not hide, and that cap, in the colour of a fault. */
export function paintCovers(covers: readonly CapCover[], mmPerPx: number): FabricObject[] {
  return covers.flatMap(({ x, y, hole, cap, isEnough }) => {
    const stroke = isEnough ? graphite : oxblood;
    const ring = { ...still, left: x, top: y, stroke, strokeWidth: mmPerPx };
    return [
      new Circle({ ...ring, radius: hole / 2, strokeDashArray: [3 * mmPerPx, 2 * mmPerPx] }),
      new Circle({ ...ring, radius: cap / 2 }),
    ];
  });
}
