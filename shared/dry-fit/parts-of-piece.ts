import { connectedPieces } from "../geometry/connected.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import type { PieceFigures } from "../stack/figures.ts";

/** The bodies that a piece comes off the bed as: one, or more for a letter as i, whose dot lies beside it. */
export function partsOfPiece({ region }: Pick<PieceFigures, "region">, kernel: Kernel): readonly Region[] {
  return region.length < 2 ? [region] : remembered(kernel, region, "parts of a piece", () => connectedPieces(region));
}
