import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";

type RoundHole = Point & { readonly diameter: number };

/**
 * How near a hole comes to what bounds the piece it is drilled in, in mm: from its centre to the nearest edge (outline
 * or cut-out), and the web left between its rim and that edge or the rim of another hole, whichever is less. Null when
 * the centre is not in the piece.
 */
export function holeEdge(
  hole: RoundHole,
  piece: Region,
  others: readonly RoundHole[],
): { readonly centreMm: number; readonly webMm: number } | null {
  if (!regionContains(piece, hole)) return null;
  const centreMm = distanceToRegionEdgeMm(piece, hole);
  const webs = others.map(
    (other) => Math.hypot(other.x - hole.x, other.y - hole.y) - (other.diameter + hole.diameter) / 2,
  );
  return { centreMm, webMm: Math.min(centreMm - hole.diameter / 2, ...webs) };
}
