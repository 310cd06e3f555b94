import { boxCentre } from "#shared/geometry/box.ts";
import type { Point } from "#shared/geometry/path.ts";
import {
  type Board,
  type Coat,
  type FrameOfSign,
  frameSchema,
  type MockupDocument,
  type Slats,
  slatsSchema,
  type Wood,
} from "#shared/mockup/document.ts";
import { leastBoardMm, longestMm } from "#shared/mockup/schema-parts.ts";
import { mostCoats } from "../coat-draft.ts";
import { coordinateOf, lengthOf, roundMm } from "../limits.ts";
import { boardOutline, outlineOfPiece } from "../outline-of-piece.ts";
import { withFields } from "../same.ts";
import { moveAllPieces, removePieces } from "./pieces.ts";

type Hanging = MockupDocument["hanging"];

export type BoardFields = {
  readonly outline?: Board["outline"];
  /** Takes a piece's outer ring for the board's outline, where it lies; the piece can go with it. */
  readonly outlineOf?: { readonly pieceId: string; readonly remove: boolean };
  readonly width?: number;
  readonly height?: number;
  readonly measures?: Board["measures"];
  readonly stock?: Wood;
  readonly thickness?: number;
  readonly grainTurn?: number;
  /** null takes them off. */
  readonly slats?: Slats | null;
  readonly frame?: FrameOfSign | null;
  readonly finish?: readonly Coat[];
  readonly hanging?: Partial<Hanging>;
  readonly quantity?: number;
  readonly wall?: string;
  readonly light?: MockupDocument["presentation"]["light"];
  readonly viewingDistance?: number;
};

/**
 * Sets what is given of the board, its backer, frame, hanging and showing. A value that a document can't hold is left as it was.
 * A board of another size grows or shrinks about its middle, with everything on it, locked or not, and the wall's fixings
 * keeping their place from there; one that takes the outline of a piece comes to lie about that piece.
 */
export function setBoard(document: MockupDocument, fields: BoardFields): MockupDocument {
  const source = fields.outlineOf ? outlineOfPiece(document, fields.outlineOf.pieceId) : null;
  const sized = withBoardFields(document, fields);
  const about = source ? boxCentre(source.box) : middleOf(document.board);
  const to = middleOf(sized.board);
  const by = { x: to.x - about.x, y: to.y - about.y };
  const shaped = source
    ? { ...sized, board: withFields(sized.board, { outline: boardOutline(source, sized.board) }) }
    : sized;
  const points = fields.hanging?.points ?? movedPoints(document.hanging.points, by);
  const moved = moveAllPieces(withFields(shaped, { hanging: withFields(shaped.hanging, { points: [...points] }) }), {
    dx: by.x,
    dy: by.y,
  });
  return source && fields.outlineOf?.remove ? removePieces(moved, { pieceIds: [fields.outlineOf.pieceId] }) : moved;
}

const middleOf = ({ width, height }: Board): Point => ({ x: width / 2, y: height / 2 });

function withBoardFields(document: MockupDocument, fields: BoardFields): MockupDocument {
  const { board, backer, frame, hanging, presentation, quantity } = document;
  return withFields(document, {
    board: withFields(board, {
      outline: fields.outline && isOutline(fields.outline) ? fields.outline : board.outline,
      width: lengthOf(fields.width ?? board.width, longestMm, leastBoardMm) ?? board.width,
      height: lengthOf(fields.height ?? board.height, longestMm, leastBoardMm) ?? board.height,
      measures: fields.measures ?? board.measures,
    }),
    backer: withFields(backer, {
      stock: fields.stock ?? backer.stock,
      thickness: lengthOf(fields.thickness ?? backer.thickness, 200) ?? backer.thickness,
      grainTurn: isWithin(fields.grainTurn ?? -1, 0, 180) ? (fields.grainTurn ?? backer.grainTurn) : backer.grainTurn,
      slats: fields.slats === undefined ? backer.slats : slatsToKeep(fields.slats, backer.slats),
      finish: fields.finish ? fields.finish.slice(0, mostCoats) : backer.finish,
    }),
    frame: fields.frame === undefined ? frame : frameToKeep(fields.frame, frame),
    hanging: withHangingFields(hanging, fields.hanging ?? {}),
    quantity:
      fields.quantity !== undefined && Number.isInteger(fields.quantity) && isWithin(fields.quantity, 1, 1000)
        ? fields.quantity
        : quantity,
    presentation: withFields(presentation, {
      wall: fields.wall && /^#[0-9A-F]{6}$/.test(fields.wall) ? fields.wall : presentation.wall,
      light: fields.light && isLight(fields.light) ? fields.light : presentation.light,
      viewingDistance:
        lengthOf(fields.viewingDistance ?? presentation.viewingDistance, 200_000) ?? presentation.viewingDistance,
    }),
  });
}

function slatsToKeep(slats: Slats | null, before: Slats | null): Slats | null {
  if (slats === null) return null;
  const { start } = slats;
  const rounded: Slats = {
    ...slats,
    thickness: roundMm(slats.thickness),
    slatWidth: roundMm(slats.slatWidth),
    gap: roundMm(slats.gap),
    spineWidth: roundMm(slats.spineWidth),
    spineOffset: roundMm(slats.spineOffset),
    start: start.kind === "height" ? { kind: "height", height: roundMm(start.height) } : start,
    overhang: roundMm(slats.overhang),
  };
  return slatsSchema.safeParse(rounded).success ? rounded : before;
}

function frameToKeep(frame: FrameOfSign | null, before: FrameOfSign | null): FrameOfSign | null {
  if (frame === null) return null;
  const rounded: FrameOfSign = { ...frame, width: roundMm(frame.width), depth: roundMm(frame.depth) };
  return frameSchema.safeParse(rounded).success ? rounded : before;
}

function withHangingFields(hanging: Hanging, { kind, gap, pose, carriesKg, points }: Partial<Hanging>): Hanging {
  const carries = carriesKg === undefined || carriesKg === null ? carriesKg : lengthOf(carriesKg, 10_000);
  const held = points?.every(({ x, y }) => coordinateOf(x) !== null && coordinateOf(y) !== null) ? points : undefined;
  return withFields(hanging, {
    kind: kind ?? hanging.kind,
    gap: gap !== undefined && isWithin(gap, 0, 500) ? gap : hanging.gap,
    pose: pose ?? hanging.pose,
    carriesKg: carries === undefined || (carries === null && carriesKg !== null) ? hanging.carriesKg : carries,
    points: held ?? hanging.points,
  });
}

/** A point that would leave what a document can hold stays where it is. */
function movedPoints(points: readonly Point[], by: Point): readonly Point[] {
  if (by.x === 0 && by.y === 0) return points;
  return points.map(({ x, y }) => ({ x: coordinateOf(x + by.x) ?? x, y: coordinateOf(y + by.y) ?? y }));
}

const isOutline = (outline: Board["outline"]): boolean =>
  outline.kind === "rounded" ? lengthOf(outline.radius) !== null : outline.kind !== "path" || outline.path.length > 0;

function isLight({ azimuth, elevation, angularSize }: MockupDocument["presentation"]["light"]): boolean {
  return isWithin(azimuth, 0, 360) && isWithin(elevation, 10, 90) && isWithin(angularSize, 0, 1);
}

/** False for what is no number, too. */
function isWithin(value: number, least: number, most: number): boolean {
  return value >= least && value <= most;
}
