import { boxOfPoints } from "../geometry/box.ts";
import type { Region } from "../geometry/path.ts";
import { pointTransform, rotateMatrix } from "../geometry/transform.ts";

export type BedFit = {
  /** Size of the piece as it is turned to fit best, the way the bed lies. */
  readonly widthMm: number;
  readonly heightMm: number;
  /** How far it goes over the bed then; 0 when it fits. */
  readonly overMm: number;
};

/** Turning a piece further than this changes its size by less than a hundredth of it. */
const stepDegrees = 0.5;

/**
 * The turn at which a piece goes on a bed with the least left over, tried in steps of half a degree. Null for a piece
 * that covers nothing. A fit that is found is a fit; one that exists between two steps only may be missed by some
 * tenths of a mm.
 */
export function fitOnBed(region: Region, bed: { readonly widthMm: number; readonly heightMm: number }): BedFit | null {
  const points = region.flat();
  let best: BedFit | null = null;
  for (let turn = 0; turn < 180; turn += stepDegrees) {
    const matrix = rotateMatrix(turn);
    const box = boxOfPoints(points.map((point) => pointTransform(point, matrix)));
    if (!box) return null;
    const over = Math.max(0, box.width - bed.widthMm, box.height - bed.heightMm);
    const overMm = over < 0.0005 ? 0 : over;
    if (!best || overMm < best.overMm) best = { widthMm: box.width, heightMm: box.height, overMm };
    if (overMm === 0) return best;
  }
  return best;
}
