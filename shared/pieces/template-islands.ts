import { boxGrow, boxOfRegion } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { type DropOut, dropOuts } from "./drop-outs.ts";

/** How much wider than the piece its sheet is taken: any width gives the same islands. */
const marginMm = 10;

/**
 * What falls out of a sheet that a piece's outline is cut out of: its islands lie where the piece has openings. A piece
 * without openings has none.
 */
export function templateIslands(piece: Region, kernel: Kernel): DropOut[] {
  const box = boxOfRegion(piece);
  if (!box || piece.length < 2) return [];
  return dropOuts(kernel.difference(flattenPath(rectanglePath(boxGrow(box, marginMm))), piece));
}
