import type { Path, Placement, Point, Region } from "./path.ts";
import {
  type Matrix,
  matrixInverse,
  matrixMultiply,
  pathTransform,
  pointTransform,
  regionTransform,
  rotateMatrix,
  scaleMatrix,
  translateMatrix,
} from "./transform.ts";

/** The map from a piece's own plane to the board: mirrored left to right, scaled, turned clockwise, then moved. */
export function placementMatrix({ x, y, turn, scale, mirrored }: Placement): Matrix {
  const sized = scaleMatrix(mirrored ? -scale : scale, scale);
  return matrixMultiply(translateMatrix(x, y), matrixMultiply(rotateMatrix(turn), sized));
}

/** A piece's path on the board, in mm. */
export function placePath(path: Path, placement: Placement): Path {
  return pathTransform(path, placementMatrix(placement));
}

/** A piece's flattened region on the board, in mm. */
export function placeRegion(region: Region, placement: Placement): Region {
  return regionTransform(region, placementMatrix(placement));
}

/** A point of a piece's own plane on the board, in mm. */
export function placePoint(point: Point, placement: Placement): Point {
  return pointTransform(point, placementMatrix(placement));
}

/** A point of the board in a piece's own plane. Throws a RangeError when the placement's scale is 0. */
export function unplacePoint(point: Point, placement: Placement): Point {
  const inverse = matrixInverse(placementMatrix(placement));
  if (!inverse) throw new RangeError("A piece with scale 0 has no plane of its own.");
  return pointTransform(point, inverse);
}
