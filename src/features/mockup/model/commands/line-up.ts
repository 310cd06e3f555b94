import type { Box } from "#shared/geometry/path.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { type LinedUpBy, lineUpShift } from "#shared/setting-out/line-up.ts";
import { layerOfPiece } from "../selection.ts";
import { boxesOfHeaps, heapsOf, type Together } from "../together.ts";
import { changePieces, shiftMotion } from "./piece-motion.ts";
import { boxOfPieces } from "./pieces.ts";

/** What things are lined up with: the board, the box round all that is chosen, or what was chosen first, which stays. */
export type LinedUpWith = "the board" | "each other" | "the first chosen";

export type LineUp = {
  readonly pieceIds: readonly string[];
  readonly together: Together;
  readonly by: LinedUpBy;
  readonly to: LinedUpWith;
};

/** Lines up what is chosen by an edge or a middle, exactly, with the holes in it. What is locked stays and can be lined up with. */
export function lineUp(document: MockupDocument, { pieceIds, together, by, to }: LineUp): MockupDocument {
  const first = firstOf(document, pieceIds, together);
  const other = otherBox(document, { pieceIds, to, first });
  if (!other) return document;
  const heaps = boxesOfHeaps(document, heapsOf(document, pieceIds, together));
  const motions = heaps
    .filter(({ ids }) => to !== "the first chosen" || !ids.some((id) => first.includes(id)))
    .flatMap(({ ids, box }) => {
      const { dx, dy } = lineUpShift(box, other, by);
      const motion = shiftMotion(dx, dy);
      return ids.map((id) => [id, motion] as const);
    });
  return changePieces(document, new Map(motions));
}

function otherBox(
  document: MockupDocument,
  { pieceIds, to, first }: Pick<LineUp, "pieceIds" | "to"> & { first: readonly string[] },
): Box | null {
  if (to === "the board") return { x: 0, y: 0, width: document.board.width, height: document.board.height };
  return boxOfPieces(document, to === "each other" ? pieceIds : first);
}

/** The pieces that count as the first chosen: with its chosen neighbours where layers move as one. */
function firstOf(document: MockupDocument, pieceIds: readonly string[], together: Together): readonly string[] {
  const [first] = pieceIds;
  if (first === undefined) return [];
  if (together === "each piece") return [first];
  if (together === "all as one") return pieceIds;
  const key = layerOfPiece(document, first)?.key;
  return pieceIds.filter((id) => layerOfPiece(document, id)?.key === key);
}
