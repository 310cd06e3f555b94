import type { Point, Polygon, Region } from "./path.ts";
import { ringDepths } from "./ring-depths.ts";

/**
 * Area of a ring in mm² by the shoelace formula: positive when it runs clockwise as seen on the sheet (x right, y down).
 * Rings with fewer than three points have none.
 */
export function signedRingArea(ring: Polygon): number {
  // Measured from the first point: far from the origin the products would eat the digits.
  const origin = ring[0];
  let previous = ring.at(-1);
  if (!origin || !previous) return 0;
  let twice = 0;
  for (const point of ring) {
    twice += (previous.x - origin.x) * (point.y - origin.y) - (point.x - origin.x) * (previous.y - origin.y);
    previous = point;
  }
  return twice / 2;
}

/**
 * Area in mm² of a region without crossings, as the kernel returns it: each ring counts against the ones it lies in.
 * The rings may run either way.
 */
export function regionAreaMm2(region: Region): number {
  return depthSigns(region).reduce((sum, sign, index) => sum + sign * Math.abs(signedRingArea(region[index] ?? [])), 0);
}

/** Centroid of a region without crossings, in mm; the middle of its points when it has no area; null when it is empty. */
export function regionCentroid(region: Region): Point | null {
  const points = region.flat();
  const origin = points[0];
  if (!origin) return null;
  const signs = depthSigns(region);
  let area = 0;
  let x = 0;
  let y = 0;
  for (const [index, ring] of region.entries()) {
    const turned = signedRingArea(ring) < 0 ? -1 : 1;
    const sign = (signs[index] ?? 1) * turned;
    let previous = ring.at(-1) ?? origin;
    for (const point of ring) {
      const cross =
        sign * ((previous.x - origin.x) * (point.y - origin.y) - (point.x - origin.x) * (previous.y - origin.y));
      area += cross / 2;
      x += (cross * (previous.x + point.x - 2 * origin.x)) / 6;
      y += (cross * (previous.y + point.y - 2 * origin.y)) / 6;
      previous = point;
    }
  }
  if (Math.abs(area) < 1e-9) {
    const sum = points.reduce((all, point) => ({ x: all.x + point.x, y: all.y + point.y }), { x: 0, y: 0 });
    return { x: sum.x / points.length, y: sum.y / points.length };
  }
  return { x: origin.x + x / area, y: origin.y + y / area };
}

/** Length in mm of all edges of a region, holes included: what a cutter travels. */
export function regionPerimeterMm(region: Region): number {
  let length = 0;
  for (const ring of region) {
    let previous = ring.at(-1);
    for (const point of ring) {
      if (previous) length += Math.hypot(point.x - previous.x, point.y - previous.y);
      previous = point;
    }
  }
  return length;
}

/** +1 for a ring that bounds material from outside, −1 for a hole: by how many other rings it lies in. */
function depthSigns(region: Region): number[] {
  if (region.length < 2) return region.map(() => 1);
  return ringDepths(region).map((depth) => (depth % 2 === 0 ? 1 : -1));
}
