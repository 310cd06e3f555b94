import type { Region } from "../geometry/path.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import { isShorter } from "../geometry/tolerance.ts";

/** Under this many mm over its longer side a piece is lost in the bed or the sweepings (common practice). */
export const smallPieceMm = 8;

/** Ids of pieces whose smallest box is shorter than the limit, in their order. What covers nothing is no piece. */
export function smallPieces(
  pieces: readonly { readonly id: string; readonly region: Region }[],
  limitMm: number = smallPieceMm,
): string[] {
  return pieces
    .filter(({ region }) => {
      const box = smallestBox(region);
      return box !== null && box.length > 0 && isShorter(box.length, limitMm);
    })
    .map(({ id }) => id);
}
