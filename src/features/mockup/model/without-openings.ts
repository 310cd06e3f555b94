import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { boxContains } from "#shared/geometry/box.ts";
import { regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import { ringDepths } from "#shared/geometry/ring-depths.ts";

/**
 * Pieces with their openings closed: outer outlines only, and without the pieces that lay in an opening of another one,
 * since the closed plate covers them.
 */
export function withoutOpenings(pieces: readonly ArtworkPiece[]): ArtworkPiece[] {
  const closed = pieces.map((piece) => {
    const depths = ringDepths(piece.path.map((ring) => flattenPath([ring]).at(0) ?? []));
    return { ...piece, path: piece.path.filter((_, index) => depths[index] === 0) };
  });
  return closed.filter((piece) => {
    const start = piece.path[0]?.start;
    if (!start) return false;
    return !closed.some(
      (other) => other !== piece && boxContains(other.box, piece.box) && regionContains(flattenPath(other.path), start),
    );
  });
}
