import { boxCentre, boxOfRegion } from "#shared/geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Point, Region } from "#shared/geometry/path.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import { holeWindow } from "#shared/hardware/hole-window.ts";
import type { CapStud, Hole, Layer } from "#shared/mockup/document.ts";
import { coordinateOf, mostHoles } from "./limits.ts";

/** Coarse: a proposal is looked at and moved, and a layer can have hundreds of pieces. */
const flatnessMm = 0.2;
/** How many places are tried on the way from a corner to the middle. */
const tries = 60;

/**
 * Holes towards the four corners of each piece of a layer, as far out as the cap and the rule for holes near an edge
 * allow. A piece too small for four gets fewer; the first hole of the layer is the fixed one.
 */
export function propose(layer: Layer, { hardware, id }: { hardware: CapStud; id: string }): Hole[] {
  const { fixed, play } = holeDiameters(hardware);
  const edge = Math.max(2 * play, hardware.capDiameter / 2 + 2, play / 2 + layer.thickness);
  const apart = 2 * hardware.capDiameter;
  const points = layer.pieces.flatMap((piece) =>
    corners(placeRegion(flattenPath(piece.path, flatnessMm), piece.placement), edge, apart),
  );
  const places = points.map(({ x, y }) => ({ x: coordinateOf(x), y: coordinateOf(y) })).filter(isPoint);
  return places.slice(0, mostHoles).map(({ x, y }, index) => ({
    id: `${id}-${index + 1}`,
    x,
    y,
    diameter: index === 0 ? fixed : play,
    fixed: index === 0,
  }));
}

function isPoint(place: { x: number | null; y: number | null }): place is Point {
  return place.x !== null && place.y !== null;
}

/**
 * Hole diameters in mm for a proposal, before the panel's movement is known: half a millimetre of play each side for the
 * fixed hole, and for the others the middle of what still hides under the cap with 1 mm of cover (common practice).
 */
export function holeDiameters({ studDiameter, capDiameter, barrelDiameter }: CapStud): { fixed: number; play: number } {
  const { lower, upper } = holeWindow({
    passing: studDiameter,
    cap: capDiameter,
    barrel: barrelDiameter,
    placingError: 0.5,
    movement: 0,
    cover: 1,
  });
  return { fixed: lower, play: Math.max(lower, Math.round(lower + upper) / 2) };
}

function corners(region: Region, edge: number, apart: number): Point[] {
  const box = boxOfRegion(region);
  if (!box) return [];
  const middle = boxCentre(box);
  const found: Point[] = [];
  for (const [dx, dy] of [
    [-1, -1],
    [1, -1],
    [-1, 1],
    [1, 1],
  ] as const) {
    const corner = { x: middle.x + (dx * box.width) / 2, y: middle.y + (dy * box.height) / 2 };
    for (let step = 1; step <= tries; step++) {
      const part = step / tries;
      const point = { x: corner.x + (middle.x - corner.x) * part, y: corner.y + (middle.y - corner.y) * part };
      if (!regionContains(region, point) || distanceToRegionEdgeMm(region, point) < edge) continue;
      if (found.every((other) => Math.hypot(other.x - point.x, other.y - point.y) >= apart)) found.push(point);
      break;
    }
  }
  return found;
}
