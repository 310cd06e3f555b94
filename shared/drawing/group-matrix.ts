import { type Matrix, matrixMultiply } from "../geometry/transform.ts";

/** Where the items of a group land: scaled about the group's origin, then moved to it. */
export function groupMatrix(group: { readonly x: number; readonly y: number; readonly scale: number }): Matrix {
  return { a: group.scale, b: 0, c: 0, d: group.scale, e: group.x, f: group.y };
}

/** The map of a group inside another. Groups only move and scale evenly, so `a` of the result is the scale of its strokes and text. */
export function groupMatrixInside(outer: Matrix, group: Parameters<typeof groupMatrix>[0]): Matrix {
  return matrixMultiply(outer, groupMatrix(group));
}
