import { regionContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";
import { faceRegion } from "../stack/backer.ts";
import type { PieceFigures } from "../stack/figures.ts";
import { boardRegion } from "../stack/piece-region.ts";
import type { RuleInput } from "./rule.ts";

/** The wood under a place on the board, mm above the back of the board. */
export type WoodAt = {
  /** Its face as if nothing were let into it. */
  readonly face: number;
  /** Its face there: the bottom of a pocket, or the substrate in a gap between slats. */
  readonly top: number;
  /** Slats over the substrate; 0 for a plain plank. */
  readonly slat: number;
  readonly substrate: number;
};

/** What is asked again and again for one sign: the board, what of its face is wood, and what is let into that. */
export type WoodGround = {
  readonly board: Region;
  readonly wood: Region;
  readonly letIn: readonly PieceFigures[];
};

export function woodGround({
  document,
  figures,
  kernel,
}: Pick<RuleInput, "document" | "figures" | "kernel">): WoodGround {
  const face = figures.backerTop.nominal;
  return {
    board: boardRegion(document.board, kernel),
    wood: faceRegion(document, kernel),
    letIn: figures.pieces.filter((piece) => isShorter(piece.bottom.nominal, face)),
  };
}

/** The wood under a place; null beside the board. */
export function woodAt(
  { document, figures }: Pick<RuleInput, "document" | "figures">,
  { board, wood, letIn }: WoodGround,
  place: Point,
): WoodAt | null {
  if (!regionContains(board, place)) return null;
  const face = figures.backerTop.nominal;
  const floors = letIn.filter(({ region }) => regionContains(region, place)).map(({ bottom }) => bottom.nominal);
  const { thickness, slats } = document.backer;
  const open = wood === board || regionContains(wood, place) ? face : thickness;
  return { face, top: Math.min(open, ...floors), slat: slats?.thickness ?? 0, substrate: thickness };
}
