import type { Point } from "../geometry/path.ts";

const farthestMm = 80;
/** From one ring to the next: a millimetre, farther out a tenth of the way. */
const stepMm = (radius: number): number => Math.max(1, radius / 10);
/** Places are in tenths of a mm, as a hand would set them. */
const tenth = (mm: number): number => Math.round(mm * 10) / 10;

/**
 * A place next to `from` that a test lets pass, in tenths of a mm; null when there is none within 80 mm. Rings are tried
 * from the inside out, so that it may lie a tenth farther off than the nearest there is; on the way back what the rings
 * left out is made good to a tenth of a mm.
 */
export function nearestPlace(from: Point, fits: (place: Point) => boolean): Point | null {
  for (let radius = 1; radius <= farthestMm; radius += stepMm(radius)) {
    const found = onRing(from, radius, fits);
    if (found) return nearerOn(from, found, fits);
  }
  return null;
}

function onRing(from: Point, radius: number, fits: (place: Point) => boolean): Point | null {
  const count = Math.max(8, Math.ceil((2 * Math.PI * radius) / (2 * stepMm(radius))));
  for (let index = 0; index < count; index++) {
    const angle = (2 * Math.PI * index) / count;
    const place = { x: tenth(from.x + radius * Math.cos(angle)), y: tenth(from.y + radius * Math.sin(angle)) };
    if (fits(place)) return place;
  }
  return null;
}

/** The nearest place on the last step of the way that passes too. */
function nearerOn(from: Point, found: Point, fits: (place: Point) => boolean): Point {
  const radius = Math.hypot(found.x - from.x, found.y - from.y);
  const wayX = (found.x - from.x) / radius;
  const wayY = (found.y - from.y) / radius;
  for (let less = stepMm(radius); less > 0.05; less -= 0.1) {
    const nearer = { x: tenth(from.x + wayX * (radius - less)), y: tenth(from.y + wayY * (radius - less)) };
    if (fits(nearer)) return nearer;
  }
  return found;
}
