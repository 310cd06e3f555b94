import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { mirrorLine } from "./mirror-symmetry.ts";

/** Why it matters which face of a piece lies up. */
export type FaceMatters =
  /** Face down it is its mirror image and does not go into its place. */
  | "handed"
  /** It fits both ways, but the two faces of its sheet look different. */
  | "faces differ"
  | "no";

/** Whether a piece must be marked with its face: arithmetic on its outline, and what its sheet's faces look like. */
export function faceMatters(
  piece: { readonly region: Region; readonly facesDiffer: boolean },
  kernel: Kernel,
): FaceMatters {
  if (mirrorLine(piece.region, kernel) === null) return piece.region.length === 0 ? "no" : "handed";
  return piece.facesDiffer ? "faces differ" : "no";
}
