import { boxCentre, boxOfPath, boxUnion } from "#shared/geometry/box.ts";
import { regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Box, Placement, Point } from "#shared/geometry/path.ts";
import { placePath, placeRegion } from "#shared/geometry/placement.ts";
import type { Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { coordinateOf, turnOf } from "../limits.ts";
import { withFields } from "../same.ts";
import { changeLayers } from "./change-layer.ts";

type Chosen = { readonly pieceIds: readonly string[] };

/** Moves pieces, with the standoff holes that lie in them. */
export function movePieces(
  document: MockupDocument,
  { pieceIds, dx, dy }: Chosen & { dx: number; dy: number },
): MockupDocument {
  if (!Number.isFinite(dx) || !Number.isFinite(dy) || (dx === 0 && dy === 0)) return document;
  return changePieces(document, pieceIds, {
    point: ({ x, y }) => ({ x: x + dx, y: y + dy }),
    placement: (placement) => ({ ...placement, x: placement.x + dx, y: placement.y + dy }),
  });
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
  const cos = Math.cos((by * Math.PI) / 180);
  const sin = Math.sin((by * Math.PI) / 180);
  const point = ({ x, y }: Point) => ({
    x: centre.x + (x - centre.x) * cos - (y - centre.y) * sin,
    y: centre.y + (x - centre.x) * sin + (y - centre.y) * cos,
  });
  return changePieces(document, pieceIds, {
    point,
    placement: (placement) => ({ ...placement, ...point(placement), turn: placement.turn + by }),
  });
}

/** Makes pieces larger or smaller together about a point, their middle when none is given. Holes move and keep their diameter. */
export function scalePieces(
  document: MockupDocument,
  { pieceIds, by, about }: Chosen & { by: number; about?: Point },
): MockupDocument {
  const centre = about ?? middleOf(document, pieceIds);
  if (!centre || !Number.isFinite(by) || by <= 0 || by === 1) return document;
  const point = ({ x, y }: Point) => ({ x: centre.x + (x - centre.x) * by, y: centre.y + (y - centre.y) * by });
  return changePieces(document, pieceIds, {
    point,
    placement: (placement) => ({ ...placement, ...point(placement), scale: placement.scale * by }),
  });
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

/** Takes pieces off, with the holes in them. The layer stays, if empty, and keeps its stock and hold. */
export function removePieces(document: MockupDocument, { pieceIds }: Chosen): MockupDocument {
  const chosen = new Set(pieceIds);
  return changeLayers(document, (layer) => {
    const pieces = layer.pieces.filter((piece) => !chosen.has(piece.id));
    if (pieces.length === layer.pieces.length) return layer;
    if (layer.hold.kind !== "standoff") return { ...layer, pieces };
    const within = holesWithin(layer, chosen);
    const left = layer.hold.holes.filter((hole) => !within.has(hole.id));
    const holes = left.map((hole, index) => (left.some(({ fixed }) => fixed) ? hole : { ...hole, fixed: index === 0 }));
    return { ...layer, pieces, hold: { ...layer.hold, holes } };
  });
}

/** The box around pieces on the board, in mm; null when there are none. */
export function boxOfPieces(document: MockupDocument, pieceIds: readonly string[]): Box | null {
  const chosen = new Set(pieceIds);
  const pieces = document.layers.flatMap((layer) => layer.pieces).filter((piece) => chosen.has(piece.id));
  return boxUnion(pieces.map((piece) => boxOfPath(placePath(piece.path, piece.placement))));
}

function middleOf(document: MockupDocument, pieceIds: readonly string[]): Point | null {
  const box = boxOfPieces(document, pieceIds);
  return box ? boxCentre(box) : null;
}

/** What is to happen to a point of the board, and to a placement. */
type Motion = { readonly point: (point: Point) => Point; readonly placement: (placement: Placement) => Placement };

function changePieces(document: MockupDocument, pieceIds: readonly string[], motion: Motion): MockupDocument {
  const chosen = new Set(pieceIds);
  return changeLayers(document, (layer) => {
    const pieces = layer.pieces.map((piece) => (chosen.has(piece.id) ? movedPiece(piece, motion) : piece));
    if (pieces.every((piece, index) => piece === layer.pieces[index])) return layer;
    if (layer.hold.kind !== "standoff") return { ...layer, pieces };
    const within = holesWithin(layer, chosen);
    const holes = layer.hold.holes.map((hole) => {
      const { x, y } = motion.point(hole);
      return within.has(hole.id)
        ? withFields(hole, { x: coordinateOf(x) ?? hole.x, y: coordinateOf(y) ?? hole.y })
        : hole;
    });
    return { ...layer, pieces, hold: { ...layer.hold, holes } };
  });
}

/** A motion that would leave what a document can hold leaves the piece where it is. */
function movedPiece(piece: Piece, motion: Motion): Piece {
  const to = motion.placement(piece.placement);
  const x = coordinateOf(to.x);
  const y = coordinateOf(to.y);
  const turn = turnOf(to.turn);
  const scale = Math.round(to.scale * 1e6) / 1e6;
  if (x === null || y === null || turn === null || !(scale > 0 && scale <= 1000)) return piece;
  return withFields(piece, { placement: withFields(piece.placement, { x, y, turn, scale }) });
}

/** Holes that go along with the chosen pieces: all when the whole layer is chosen, else those that lie in one of them. */
function holesWithin(layer: Layer, chosen: ReadonlySet<string>): Set<string> {
  if (layer.hold.kind !== "standoff") return new Set();
  const { holes } = layer.hold;
  const pieces = layer.pieces.filter((piece) => chosen.has(piece.id));
  if (pieces.length === layer.pieces.length) return new Set(holes.map(({ id }) => id));
  const regions = pieces.map((piece) => placeRegion(flattenPath(piece.path, 0.2), piece.placement));
  return new Set(holes.filter((hole) => regions.some((region) => regionContains(region, hole))).map(({ id }) => id));
}
