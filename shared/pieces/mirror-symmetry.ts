import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { matrixMultiply, regionTransform, rotateMatrix, scaleMatrix, translateMatrix } from "../geometry/transform.ts";
import { areaMoment } from "./area-moments.ts";
import { isWithin } from "./same-outline.ts";

/** An outline and its mirror image that differ by no more than this, in mm, are the same to the hand (our choice). */
export const mirrorToleranceMm = 0.15;

/** A moment smaller than this share of its largest possible value says nothing about a direction. */
const leastShare = 1e-4;
const highestPower = 8;

/**
 * Direction of a line in which a piece is its own mirror image, in degrees clockwise from the x axis, from 0 to 180; null
 * when there is none or the piece covers nothing. Such a piece can lie on either face.
 *
 * With a mirror line at φ every moment ∫ zᵖ dA about the centroid points along p·φ, so the first one that is not nothing
 * leaves p directions to try. A shape without any (a disc) is tried along x.
 */
export function mirrorLine(piece: Region, kernel: Kernel, toleranceMm: number = mirrorToleranceMm): number | null {
  const centroid = regionCentroid(piece);
  const box = boxOfRegion(piece);
  const area = regionAreaMm2(piece);
  if (!centroid || !box || area === 0) return null;
  const home = regionTransform(piece, translateMatrix(-centroid.x, -centroid.y));
  const radius = Math.hypot(box.width, box.height) / 2;
  for (const direction of directions(home, area, radius)) {
    const flip = matrixMultiply(rotateMatrix(direction), matrixMultiply(scaleMatrix(1, -1), rotateMatrix(-direction)));
    if (isWithin(home, regionTransform(home, flip), toleranceMm, kernel)) return direction;
  }
  return null;
}

function directions(home: Region, area: number, radius: number): number[] {
  for (let power = 2; power <= highestPower; power++) {
    const { re, im } = areaMoment(home, { x: 0, y: 0 }, power);
    if (Math.hypot(re, im) < leastShare * area * radius ** power) continue;
    const first = ((Math.atan2(im, re) * 180) / Math.PI / power + 360) % (180 / power);
    return Array.from({ length: power }, (_, k) => first + (180 * k) / power);
  }
  return [0];
}
