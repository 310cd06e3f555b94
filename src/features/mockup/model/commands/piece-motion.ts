import { regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Placement, Point } from "#shared/geometry/path.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import type { Hole, Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import type { RigidStep } from "#shared/setting-out/step-round.ts";
import { exactCoordinateOf, exactScaleOf, turnOf } from "../limits.ts";
import { withFields } from "../same.ts";
import { changeLayers } from "./change-layer.ts";

/** What is to happen to a point of the board, and to a placement. */
export type Motion = {
  readonly point: (point: Point) => Point;
  readonly placement: (placement: Placement) => Placement;
};

/** How fine the outline of a piece is taken to tell which holes lie in it, mm. */
const outlineTolerance = 0.2;

export function shiftMotion(dx: number, dy: number): Motion {
  const point = ({ x, y }: Point) => ({ x: x + dx, y: y + dy });
  return { point, placement: (placement) => ({ ...placement, ...point(placement) }) };
}

/** Turns about a point by degrees clockwise and shifts after that. */
export function rigidMotion({ about, turn, dx, dy }: RigidStep): Motion {
  if (turn === 0) return shiftMotion(dx, dy);
  const cos = Math.cos((turn * Math.PI) / 180);
  const sin = Math.sin((turn * Math.PI) / 180);
  const point = ({ x, y }: Point) => ({
    x: about.x + (x - about.x) * cos - (y - about.y) * sin + dx,
    y: about.y + (x - about.x) * sin + (y - about.y) * cos + dy,
  });
  return { point, placement: (placement) => ({ ...placement, ...point(placement), turn: placement.turn + turn }) };
}

/** Grows or shrinks about a point. */
export function scaleMotion(about: Point, by: number): Motion {
  const point = ({ x, y }: Point) => ({ x: about.x + (x - about.x) * by, y: about.y + (y - about.y) * by });
  return { point, placement: (placement) => ({ ...placement, ...point(placement), scale: placement.scale * by }) };
}

/** As in a mirror that stands upright (`across`) or lies (`down`) in a point. */
export function mirrorMotion(about: Point, way: "across" | "down"): Motion {
  const point = ({ x, y }: Point) => (way === "across" ? { x: 2 * about.x - x, y } : { x, y: 2 * about.y - y });
  return {
    point,
    placement: (placement) => ({
      ...placement,
      ...point(placement),
      mirrored: !placement.mirrored,
      turn: (way === "across" ? 0 : 180) - placement.turn,
    }),
  };
}

/** The chosen pieces of layers that are not locked, in the order chosen. */
export function movableOf(document: MockupDocument, pieceIds: readonly string[]): string[] {
  const free = new Set(
    document.layers.filter(({ locked }) => !locked).flatMap(({ pieces }) => pieces.map(({ id }) => id)),
  );
  return pieceIds.filter((id) => free.has(id));
}

/**
 * Moves pieces, with the standoff holes that lie in them, or all holes of a layer that is moved whole. Pieces of locked
 * layers stay, and so does what a motion would bring out of what a document can hold.
 */
export function changePieces(document: MockupDocument, motions: ReadonlyMap<string, Motion>): MockupDocument {
  return changeLayers(document, (layer) => layerAfter(layer, motions));
}

/** A layer after the motions of its pieces, locked or not. */
export function layerAfter(layer: Layer, motions: ReadonlyMap<string, Motion>): Layer {
  const pieces = layer.pieces.map((piece) => movedPiece(piece, motions.get(piece.id)));
  if (pieces.every((piece, index) => piece === layer.pieces[index])) return layer;
  if (layer.hold.kind !== "standoff") return { ...layer, pieces };
  const motionOf = motionsOfHoles(layer, motions);
  const holes = layer.hold.holes.map((hole) => movedHole(hole, motionOf(hole)));
  return { ...layer, pieces, hold: { ...layer.hold, holes } };
}

/** The same motion for all. */
export function moveAll(document: MockupDocument, pieceIds: readonly string[], motion: Motion): MockupDocument {
  return changePieces(document, new Map(pieceIds.map((id) => [id, motion])));
}

/** A placement after a motion; null when it would leave what a document can hold. */
export function placementAfter(placement: Placement, motion: Motion): Placement | null {
  const to = motion.placement(placement);
  const x = exactCoordinateOf(to.x);
  const y = exactCoordinateOf(to.y);
  const turn = turnOf(to.turn);
  const scale = exactScaleOf(to.scale);
  return x === null || y === null || turn === null || scale === null ? null : { ...to, x, y, turn, scale };
}

function movedPiece(piece: Piece, motion: Motion | undefined): Piece {
  const placement = motion && placementAfter(piece.placement, motion);
  return placement ? withFields(piece, { placement: withFields(piece.placement, placement) }) : piece;
}

/** A hole after a motion; it keeps its diameter. */
export function movedHole(hole: Hole, motion: Motion | undefined): Hole {
  if (!motion) return hole;
  const { x, y } = motion.point(hole);
  return withFields(hole, { x: exactCoordinateOf(x) ?? hole.x, y: exactCoordinateOf(y) ?? hole.y });
}

/** The holes of a layer that go along with chosen pieces: all when the whole layer is chosen, else those that lie in one of them. */
export function holesWithin(layer: Layer, chosen: ReadonlySet<string>): Set<string> {
  if (layer.hold.kind !== "standoff") return new Set();
  const { holes } = layer.hold;
  if (layer.pieces.every(({ id }) => chosen.has(id))) return new Set(holes.map(({ id }) => id));
  const pieceOf = pieceOfHole(layer.pieces.filter((piece) => chosen.has(piece.id)));
  return new Set(holes.filter((hole) => pieceOf(hole) !== null).map(({ id }) => id));
}

/** Tells which of some pieces a point lies in; null for none. */
export function pieceOfHole(pieces: readonly Piece[]): (point: Point) => string | null {
  const regions = pieces.map(({ id, path, placement }) => ({
    id,
    region: placeRegion(flattenPath(path, outlineTolerance), placement),
  }));
  return (point) => regions.find(({ region }) => regionContains(region, point))?.id ?? null;
}

function motionsOfHoles(layer: Layer, motions: ReadonlyMap<string, Motion>): (hole: Hole) => Motion | undefined {
  const moved = layer.pieces.filter(({ id }) => motions.has(id));
  const [first] = moved;
  const own = first && motions.get(first.id);
  const isWhole = moved.length === layer.pieces.length;
  if (isWhole && moved.every(({ id }) => motions.get(id) === own)) return () => own;
  const pieceOf = pieceOfHole(moved);
  return (hole) => motions.get(pieceOf(hole) ?? "") ?? (isWhole ? own : undefined);
}
