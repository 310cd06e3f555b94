import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";
import type { Hardware } from "../mockup/document.ts";

/** Whether a standoff at that place holds a piece: it stands under it, or, gripping its edge, reaches that edge. */
export function holdsPiece(hardware: Hardware, region: Region, place: Point): boolean {
  if (regionContains(region, place)) return true;
  return hardware.kind === "edgeGrip" && distanceToRegionEdgeMm(region, place) <= hardware.barrelDiameter / 2;
}
