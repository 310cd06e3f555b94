import { flattenPath } from "../geometry/flatten.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Path, Placement, Point, Region } from "../geometry/path.ts";
import { placePath } from "../geometry/placement.ts";
import { circlePath } from "../geometry/shapes.ts";
import type { Board } from "../mockup/document.ts";
import { boardPath } from "./board-outline.ts";

/** A piece's outline on the board, flattened to 0.02 mm, as non-crossing rings; empty when it covers nothing. */
export function pieceRegion(piece: { readonly path: Path; readonly placement: Placement }, kernel: Kernel): Region {
  const { path, placement } = piece;
  return remembered(kernel, [path, placement], "piece region", () =>
    kernel.union(flattenPath(placePath(path, placement)), "evenodd"),
  );
}

/**
 * A piece's outline in its own plane, as it faces the viewer at its own size and turn: the very same for a piece that was
 * only moved, so that what does not depend on its place is worked out once.
 */
export function shapeRegion(piece: { readonly path: Path; readonly placement: Placement }, kernel: Kernel): Region {
  const { path, placement } = piece;
  const { turn, scale, mirrored } = placement;
  return remembered(kernel, [path], `shape ${turn} ${scale} ${mirrored}`, () =>
    kernel.union(flattenPath(placePath(path, { ...placement, x: 0, y: 0 })), "evenodd"),
  );
}

/** The board's face, flattened to 0.02 mm, as non-crossing rings. */
export function boardRegion(board: Board, kernel: Kernel): Region {
  return remembered(kernel, [board], "board region", () => kernel.union(flattenPath(boardPath(board)), "evenodd"));
}

/** Discs of one diameter each, joined. */
export function discsRegion(discs: readonly (Point & { readonly diameter: number })[], kernel: Kernel): Region {
  const which = discs.map(({ x, y, diameter }) => `${x} ${y} ${diameter}`).join(", ");
  return remembered(kernel, [], `discs ${which}`, () =>
    kernel.union(
      discs.flatMap((disc) => flattenPath(circlePath(disc, disc.diameter / 2))),
      "nonzero",
    ),
  );
}
