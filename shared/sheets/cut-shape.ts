import { regionAreaMm2 } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Region } from "../geometry/path.ts";
import { matrixMultiply, regionTransform, rotateMatrix, scaleMatrix } from "../geometry/transform.ts";
import { grownOutline } from "./grown-outline.ts";
import type { SheetPiece } from "./nesting.ts";
import { turnsToTry } from "./outline-turns.ts";

/** A piece ready to be laid: flattened, and grown by half the gap to its neighbours. */
export type CutShape = {
  readonly piece: SheetPiece;
  readonly region: Region;
  readonly grown: Region;
  readonly areaMm2: number;
};

/** A shape as it may lie on a sheet, turned and mirrored about its own origin. */
export type LaidShape = {
  readonly turn: number;
  readonly mirrored: boolean;
  readonly region: Region;
  readonly grown: Region;
  /** Around `region`. */
  readonly box: Box;
};

/** A piece's shape with half a gap around it. The region must have gone through the kernel's union. */
export function cutShape(piece: SheetPiece, region: Region, halfGapMm: number, kernel: Kernel): CutShape {
  const curved = piece.path.some((ring) => ring.segments.some((segment) => segment.kind === "cubic"));
  return { piece, region, grown: grownOutline(region, halfGapMm, { curved }, kernel), areaMm2: regionAreaMm2(region) };
}

/** The shape in every way that is tried on a sheet with that grain, the wanted side first. */
export function laidShapes(
  shape: CutShape,
  options: { readonly grainTurn: number; readonly freeTurns: number },
): readonly LaidShape[] {
  const turns = turnsToTry(shape.region, shape.piece.turns, options);
  const sides = shape.piece.mayMirror ? [false, true] : [false];
  return sides.flatMap((mirrored) => turns.map((turn) => layShape(shape, turn, mirrored)));
}

/** The shape mirrored left to right if asked, then turned clockwise. */
export function layShape(shape: CutShape, turn: number, mirrored: boolean): LaidShape {
  const matrix = matrixMultiply(rotateMatrix(turn), scaleMatrix(mirrored ? -1 : 1, 1));
  const region = regionTransform(shape.region, matrix);
  const box = boxOfRegion(region) ?? { x: 0, y: 0, width: 0, height: 0 };
  return { turn, mirrored, region, grown: regionTransform(shape.grown, matrix), box };
}
