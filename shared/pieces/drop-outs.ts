import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Point, Region } from "../geometry/path.ts";
import { ringDepths } from "../geometry/ring-depths.ts";

export type DropOut = { readonly region: Region; readonly areaMm2: number; readonly where: Point };

/**
 * Islands inside the openings of a plate or a template (the middle of an O): nothing holds them once it is cut. Each
 * with its own holes, in the order of their outlines. The region as the kernel gives it.
 */
export function dropOuts(plate: Region): DropOut[] {
  const depths = ringDepths(plate);
  const inside = new Set(plate.filter((_, index) => (depths[index] ?? 0) >= 2 && (depths[index] ?? 0) % 2 === 0));
  return connectedPieces(plate)
    .filter(([outline]) => outline !== undefined && inside.has(outline))
    .map((region) => ({
      region,
      areaMm2: regionAreaMm2(region),
      where: regionCentroid(region) ?? region[0]?.[0] ?? { x: 0, y: 0 },
    }));
}
