import { regionContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";
import type { PieceFigures } from "../stack/figures.ts";
import { boardRegion } from "../stack/piece-region.ts";
import type { RuleInput } from "./rule.ts";

/** The wood under a place on the board, mm above the back of the board. */
export type WoodAt = {
  /** Its face as if nothing were let into it. */
  readonly face: number;
  /** Its face there: the bottom of a pocket where there is one. */
  readonly top: number;
  /** Slats over the substrate; 0 for a plain plank. */
  readonly slat: number;
  readonly substrate: number;
};

/** What is asked again and again for one sign: the board's outline, and what is let into its face. */
export type WoodGround = { readonly board: Region; readonly letIn: readonly PieceFigures[] };

export function woodGround({
  document,
  figures,
  kernel,
}: Pick<RuleInput, "document" | "figures" | "kernel">): WoodGround {
  const face = figures.backerTop.nominal;
  return {
    board: boardRegion(document.board, kernel),
    letIn: figures.pieces.filter((piece) => isShorter(piece.bottom.nominal, face)),
  };
}

/** The wood under a place; null beside the board. */
export function woodAt(
  { document, figures }: Pick<RuleInput, "document" | "figures">,
  { board, letIn }: WoodGround,
  place: Point,
): WoodAt | null {
  if (!regionContains(board, place)) return null;
  const face = figures.backerTop.nominal;
  const floors = letIn.filter(({ region }) => regionContains(region, place)).map(({ bottom }) => bottom.nominal);
  const { thickness, slats } = document.backer;
  return { face, top: Math.min(face, ...floors), slat: slats?.thickness ?? 0, substrate: thickness };
}
