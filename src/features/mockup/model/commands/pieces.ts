import { boxCentre, boxOfPath, boxUnion } from "#shared/geometry/box.ts";
import type { Box, Placement, Point } from "#shared/geometry/path.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { Hole, MockupDocument } from "#shared/mockup/document.ts";
import { withoutUnusedLettering } from "#shared/mockup/without-unused-lettering.ts";
import { changeEveryLayer, changeLayers } from "./change-layer.ts";
import {
  holesWithin,
  layerAfter,
  mirrorMotion,
  movableOf,
  moveAll,
  rigidMotion,
  scaleMotion,
  shiftMotion,
} from "./piece-motion.ts";

type Chosen = { readonly pieceIds: readonly string[] };

/** Moves pieces, with the standoff holes that lie in them. */
export function movePieces(
  document: MockupDocument,
  { pieceIds, dx, dy }: Chosen & { dx: number; dy: number },
): MockupDocument {
  if (!Number.isFinite(dx) || !Number.isFinite(dy) || (dx === 0 && dy === 0)) return document;
  return moveAll(document, pieceIds, shiftMotion(dx, dy));
}

/** Moves everything on the board with its holes, what is locked with it: the board itself grows or shrinks about its middle. */
export function moveAllPieces(document: MockupDocument, { dx, dy }: { dx: number; dy: number }): MockupDocument {
  if (!Number.isFinite(dx) || !Number.isFinite(dy) || (dx === 0 && dy === 0)) return document;
  const motion = shiftMotion(dx, dy);
  return changeEveryLayer(document, (layer) => layerAfter(layer, new Map(layer.pieces.map(({ id }) => [id, motion]))));
}

/** Puts one piece at an exact place, turn and size. What is not given stays. */
export function placePiece(
  document: MockupDocument,
  { pieceId, ...to }: { pieceId: string } & Partial<Pick<Placement, "x" | "y" | "turn" | "scale">>,
): MockupDocument {
  const piece = document.layers.flatMap((layer) => layer.pieces).find(({ id }) => id === pieceId);
  if (!piece) return document;
  const { x, y, turn, scale } = piece.placement;
  const pieceIds = [pieceId];
  const moved = movePieces(document, { pieceIds, dx: (to.x ?? x) - x, dy: (to.y ?? y) - y });
  const about = { x: to.x ?? x, y: to.y ?? y };
  const turned = turnPieces(moved, { pieceIds, by: (to.turn ?? turn) - turn, about });
  return scalePieces(turned, { pieceIds, by: (to.scale ?? scale) / scale, about });
}

/** Turns pieces together, by degrees clockwise about a point: the middle of them all when none is given. */
export function turnPieces(
  document: MockupDocument,
  { pieceIds, by, about }: Chosen & { by: number; about?: Point },
): MockupDocument {
  const centre = about ?? middleOf(document, pieceIds);
  if (!centre || !Number.isFinite(by) || by % 360 === 0) return document;
  return moveAll(document, pieceIds, rigidMotion({ about: centre, turn: by, dx: 0, dy: 0 }));
}

/** Makes pieces larger or smaller together about a point, their middle when none is given. Holes move and keep their diameter. */
export function scalePieces(
  document: MockupDocument,
  { pieceIds, by, about }: Chosen & { by: number; about?: Point },
): MockupDocument {
  const centre = about ?? middleOf(document, pieceIds);
  if (!centre || !Number.isFinite(by) || by <= 0 || by === 1) return document;
  return moveAll(document, pieceIds, scaleMotion(centre, by));
}

/** Mirrors pieces together about their middle: what was at the left comes to the right (`across`), or above below (`down`). */
export function mirrorPieces(
  document: MockupDocument,
  { pieceIds, way }: Chosen & { way: "across" | "down" },
): MockupDocument {
  const middle = middleOf(document, pieceIds);
  return middle ? moveAll(document, pieceIds, mirrorMotion(middle, way)) : document;
}

/** Moves pieces together so that the middle of their box is the board's middle, across, down or both. */
export function centrePieces(
  document: MockupDocument,
  { pieceIds, way }: Chosen & { way: "across" | "down" | "both" },
): MockupDocument {
  const middle = middleOf(document, pieceIds);
  if (!middle) return document;
  const { width, height } = document.board;
  return movePieces(document, {
    pieceIds,
    dx: way === "down" ? 0 : width / 2 - middle.x,
    dy: way === "across" ? 0 : height / 2 - middle.y,
  });
}

/** Takes pieces off, with the holes in them. The layer stays, if empty, and keeps its stock and hold. Locked ones keep theirs. */
export function removePieces(document: MockupDocument, { pieceIds }: Chosen): MockupDocument {
  const chosen = new Set(pieceIds);
  const left = changeLayers(document, (layer) => {
    const pieces = layer.pieces.filter((piece) => !chosen.has(piece.id));
    if (pieces.length === layer.pieces.length) return layer;
    if (layer.hold.kind !== "standoff") return { ...layer, pieces };
    const within = holesWithin(layer, chosen);
    const holes = withFixed(layer.hold.holes.filter((hole) => !within.has(hole.id)));
    return { ...layer, pieces, hold: { ...layer.hold, holes } };
  });
  return left === document ? document : withoutUnusedLettering(left);
}

/** Of holes without the fixed one the first becomes it. */
export function withFixed(holes: readonly Hole[]): Hole[] {
  return holes.some(({ fixed }) => fixed) ? [...holes] : holes.map((hole, index) => ({ ...hole, fixed: index === 0 }));
}

/** The box around pieces on the board, in mm; null when there are none. */
export function boxOfPieces(document: MockupDocument, pieceIds: readonly string[]): Box | null {
  const chosen = new Set(pieceIds);
  const pieces = document.layers.flatMap((layer) => layer.pieces).filter((piece) => chosen.has(piece.id));
  return boxUnion(pieces.map((piece) => boxOfPath(placePath(piece.path, piece.placement))));
}

/** Of those that can be moved. */
function middleOf(document: MockupDocument, pieceIds: readonly string[]): Point | null {
  const box = boxOfPieces(document, movableOf(document, pieceIds));
  return box ? boxCentre(box) : null;
}
