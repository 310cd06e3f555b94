import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Point } from "#shared/geometry/path.ts";
import type { Board } from "#shared/mockup/document.ts";
import { boardPath } from "#shared/stack/board-outline.ts";
import { roundMm } from "./limits.ts";

/** The document takes no more. */
export const mostFixings = 50;

/**
 * Places for `count` fixings on a board, mm: an even strip of its width each, every one so far below the edge that is over
 * it. Where the board has no edge above a place, as can be with an outline of its own, that one is left out.
 */
export function spreadFixings(board: Board, { count, below }: { count: number; below: number }): readonly Point[] {
  const region = flattenPath(boardPath(board));
  return Array.from({ length: count }, (_, index) => (board.width * (index + 0.5)) / count).flatMap((x) => {
    const edge = upperEdge(region, x);
    return edge === null ? [] : [{ x: roundMm(x), y: roundMm(edge + below) }];
  });
}

/** The highest point of an outline at `x`; null where it has none. */
function upperEdge(region: readonly (readonly Point[])[], x: number): number | null {
  let highest: number | null = null;
  for (const ring of region) {
    let from = ring.at(-1);
    for (const to of ring) {
      if (from && from.x !== to.x && Math.min(from.x, to.x) <= x && x <= Math.max(from.x, to.x)) {
        const y = from.y + ((to.y - from.y) * (x - from.x)) / (to.x - from.x);
        if (highest === null || y < highest) highest = y;
      }
      from = to;
    }
  }
  return highest;
}
