import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { connectedPieces } from "../geometry/connected.ts";
import { flattenRing } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path, Placement, Region } from "../geometry/path.ts";
import { placePath } from "../geometry/placement.ts";
import { asOnBoard, coveredBy, flatMm, type Outline, tracedPath } from "./shaped.ts";

/** One part of an outline that hangs together: in the outline's plane, and what it covers on the board. */
export type Part = { readonly path: Path; readonly region: Region };

/** The parts of an outline that nothing holds together, in one plane. */
export type Parted = { readonly placement: Placement; readonly parts: readonly Part[] };

/** Half a step of the kernel's grid: how far it may have moved an edge. */
const gridMm = 0.0005;

/**
 * Takes an outline apart where nothing holds it together. Its own curves are kept, ring by ring; only where rings cross, so
 * that no ring is a part's border, are the parts traced anew. Empty for an outline that covers nothing.
 */
export function partsOfOutline(outline: Outline, kernel: Kernel): Parted {
  const covered = coveredBy(outline, kernel);
  const rings = placePath(outline.path, outline.placement).map((ring, index) => ({
    polygon: flattenRing(ring, flatMm),
    own: outline.path[index],
  }));
  const drawn = rings.map(({ polygon }) => polygon).filter((polygon) => polygon.length >= 3);
  const isClean =
    drawn.length === covered.length &&
    Math.abs(regionAreaMm2(drawn) - regionAreaMm2(covered)) <= 2 * gridMm * regionPerimeterMm(covered) + 1e-6;
  if (isClean) {
    const ownOf = new Map(rings.map(({ polygon, own }) => [polygon, own]));
    const parts = connectedPieces(drawn).map((region) => ({
      region,
      path: region.flatMap((polygon) => ownOf.get(polygon) ?? []),
    }));
    return { placement: outline.placement, parts };
  }
  const parts = connectedPieces(covered).map((region) => ({ region, path: tracedPath(region) }));
  return { placement: asOnBoard, parts };
}
