import { regionAreaMm2 } from "../geometry/area.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { tracerOf } from "./drawn-rings.ts";
import { leastOverlapMm2, type Named, overlaps } from "./join-outlines.ts";
import { coveredBy, type Outline, type Shaped, shapedFromRegion } from "./shaped.ts";

/** What is left of one piece: nothing, one outline, or several where the cut leaves them apart. */
export type CutPiece = { readonly id: string; readonly left: readonly Shaped[]; readonly takenMm2: number };

/** A crumb of less than this is what the grid leaves of edges that lie on each other, mm². */
const crumbMm2 = 0.01;

/**
 * Cuts shapes out of outlines, `roomMm` larger all round than they are, with round corners where the room turns one. Only
 * outlines that lose something are given. A piece that hung together and does no more comes apart; one that was of several parts
 * stays one piece.
 */
export function cutAway(
  outlines: readonly Named<Outline>[],
  { by, roomMm }: { readonly by: readonly Outline[]; readonly roomMm: number },
  kernel: Kernel,
): CutPiece[] {
  const shapes = kernel.union(
    by.flatMap((outline) => coveredBy(outline, kernel)),
    "nonzero",
  );
  const tool = kernel.offset(shapes, roomMm, "round");
  return outlines.flatMap((outline) => {
    const region = coveredBy(outline, kernel);
    if (!overlaps(region, tool, kernel)) return [];
    const rest = connectedPieces(kernel.difference(region, tool)).filter((part) => regionAreaMm2(part) >= crumbMm2);
    const takenMm2 = regionAreaMm2(region) - rest.reduce((sum, part) => sum + regionAreaMm2(part), 0);
    if (takenMm2 <= leastOverlapMm2) return [];
    const trace = tracerOf([outline]);
    const pieces = connectedPieces(region).length === 1 ? rest : rest.length === 0 ? [] : [rest.flat()];
    return [{ id: outline.id, left: pieces.flatMap((part) => shapedFromRegion(part, trace) ?? []), takenMm2 }];
  });
}
