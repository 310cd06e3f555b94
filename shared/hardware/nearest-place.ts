import type { Point } from "../geometry/path.ts";

const ringMm = 1;
const farthestMm = 80;
/** Places are in tenths of a mm, as a hand would set them. */
const tenth = (mm: number): number => Math.round(mm * 10) / 10;

/**
 * The place next to `from` that a test lets pass, in tenths of a mm; null when there is none within 80 mm. Rings 1 mm
 * apart are tried from the inside out, so that up to about a millimetre more may be found than is needed; on the way
 * back that is made good to a tenth.
 */
export function nearestPlace(from: Point, fits: (place: Point) => boolean): Point | null {
  for (let radius = ringMm; radius <= farthestMm; radius += ringMm) {
    const found = onRing(from, radius, fits);
    if (found) return nearerOn(from, found, fits);
  }
  return null;
}

function onRing(from: Point, radius: number, fits: (place: Point) => boolean): Point | null {
  const count = Math.max(8, Math.ceil((2 * Math.PI * radius) / (2 * ringMm)));
  for (let index = 0; index < count; index++) {
    const angle = (2 * Math.PI * index) / count;
    const place = { x: tenth(from.x + radius * Math.cos(angle)), y: tenth(from.y + radius * Math.sin(angle)) };
    if (fits(place)) return place;
  }
  return null;
}

/** The nearest place on the last millimetre of the way that passes too. */
function nearerOn(from: Point, found: Point, fits: (place: Point) => boolean): Point {
  const radius = Math.hypot(found.x - from.x, found.y - from.y);
  const wayX = (found.x - from.x) / radius;
  const wayY = (found.y - from.y) / radius;
  for (let less = ringMm - 0.1; less > 0; less -= 0.1) {
    const nearer = { x: tenth(from.x + wayX * (radius - less)), y: tenth(from.y + wayY * (radius - less)) };
    if (fits(nearer)) return nearer;
  }
  return found;
}
