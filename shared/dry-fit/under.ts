import { boxesOverlap } from "../geometry/box.ts";
import type { Region } from "../geometry/path.ts";
import { lengthsEqual } from "../geometry/tolerance.ts";
import { faceRegion } from "../stack/backer.ts";
import type { PieceFigures } from "../stack/figures.ts";
import { discsRegion } from "../stack/piece-region.ts";
import { areasTouch, spreadOf } from "../stack/touching.ts";
import type { RuleInput } from "./rule.ts";

type Input = Pick<RuleInput, "document" | "figures" | "kernel">;

/** Pieces of the layers nearer the wall than `level`. */
export function piecesBelow({ document, figures }: Input, level: number): PieceFigures[] {
  const keys = new Set(document.layers.slice(0, level).map((layer) => layer.key));
  return figures.pieces.filter((piece) => keys.has(piece.layerKey));
}

/**
 * What carries a piece of the layer at `level`: everything below it whose top lies where its back does, as far as it
 * can lie under the piece.
 */
export function supportOf(input: Input, level: number, { box, bottom }: PieceFigures): Region {
  const { document, figures, kernel } = input;
  const pieces = piecesBelow(input, level).filter(
    (piece) => lengthsEqual(piece.top.nominal, bottom.nominal) && boxesOverlap(piece.box, box),
  );
  // The kernel's own rings run outlines one way and holes the other, so joining them by turns keeps a hole open only
  // where nothing else lies.
  const board = lengthsEqual(figures.backerTop.nominal, bottom.nominal) ? faceRegion(document, kernel) : [];
  return kernel.union([...board, ...pieces.flatMap((piece) => piece.region)], "nonzero");
}

/** Top of the highest thing under a disc on the board; null when it lies over nothing. */
export function topUnderDisc(
  input: Input,
  level: number,
  disc: { readonly x: number; readonly y: number; readonly diameter: number },
): number | null {
  const foot = spreadOf(discsRegion([disc], input.kernel));
  const tops = piecesBelow(input, level)
    .filter((piece) => areasTouch(foot, piece, input.kernel))
    .map((piece) => piece.top.nominal);
  if (areasTouch(foot, spreadOf(faceRegion(input.document, input.kernel)), input.kernel)) {
    tops.push(input.figures.backerTop.nominal);
  }
  return tops.length > 0 ? Math.max(...tops) : null;
}
