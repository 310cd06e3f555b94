import type { MockupDocument } from "#shared/mockup/document.ts";
import { type Anchor, anchorPoint } from "../anchors.ts";
import { movableOf } from "./piece-motion.ts";
import { boxOfPieces, movePieces, scalePieces } from "./pieces.ts";

export type PlaceOfChosen = {
  readonly x?: number;
  readonly y?: number;
  readonly width?: number;
  readonly height?: number;
};

/**
 * Puts pieces as a whole at an exact place and size, mm: `x` and `y` are where the anchor of their box comes to lie, and
 * the other side of the box follows the one that is given. They grow about the anchor. A side of no length can't be sized.
 */
export function placeChosen(
  document: MockupDocument,
  { pieceIds, anchor, ...to }: PlaceOfChosen & { readonly pieceIds: readonly string[]; readonly anchor: Anchor },
): MockupDocument {
  const ids = movableOf(document, pieceIds);
  const box = boxOfPieces(document, ids);
  if (!box) return document;
  const at = anchorPoint(box, anchor);
  const by = shareOf(to.width, box.width) ?? shareOf(to.height, box.height) ?? 1;
  const sized = scalePieces(document, { pieceIds: ids, by, about: at });
  return movePieces(sized, { pieceIds: ids, dx: (to.x ?? at.x) - at.x, dy: (to.y ?? at.y) - at.y });
}

function shareOf(wanted: number | undefined, side: number): number | null {
  return wanted === undefined || side === 0 ? null : wanted / side;
}
