import { regionAreaMm2, signedRingArea } from "../geometry/area.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path, Point, Polygon } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { checked, lengthRange, type Outcome } from "../units/outcome.ts";
import { frameCorners } from "./frame-corners.ts";

export type FrameDesign = {
  /** Seen from the front, mm. */
  readonly width: number;
  /** Mitred in the corners, or butted with the uprights running through; butted on rectangles only. */
  readonly mitred: boolean;
};

/** One piece of the frame, along one edge of the board. */
export type FrameMember = {
  readonly outline: Polygon;
  /** The board's edge that it lies on. */
  readonly from: Point;
  readonly to: Point;
  /** Tip to tip, and its shorter long edge: for a mitred rectangle the outer and the inner edge. */
  readonly longPoint: number;
  readonly shortPoint: number;
  /** Saw settings at its two ends, degrees off a square cut. */
  readonly settings: readonly [start: number, end: number];
};

export type Diagonal = { readonly from: Point; readonly to: Point; readonly lengthMm: number };

export type Frame = {
  readonly members: readonly FrameMember[];
  readonly outer: Polygon;
  /** What to measure over the outer corners for the frame to be true: both diagonals of four corners, else all from the first. */
  readonly diagonals: readonly Diagonal[];
};

/**
 * A frame round a board with straight edges, from its outline: outer corners lie on the bisectors, so that a rectangle's
 * outside is the body plus twice the width. Refused: curved edges, several outlines, more than 40 corners, corners sharper than
 * 30 degrees, pieces that would run into each other, butted corners on anything but a rectangle. Plane geometry.
 */
export function layOutFrame(outline: Path, design: FrameDesign, kernel: Kernel): Outcome<Frame> {
  const width = checked({ frameWidth: [design.width, lengthRange] }, () => null);
  if (!width.ok) return width;
  const corners = frameCorners(outline);
  if (!corners.ok) return corners;
  const inner = corners.value;
  if (!design.mitred) {
    const rectangle = checked({ buttedCorners: [squareCorners(inner), { least: 4, most: 4 }] }, () => null);
    if (!rectangle.ok) return rectangle;
  }
  const outer = outerCorners(inner, design.width);
  const members = inner.map((from, index) =>
    memberOf(from, at(inner, index + 1), at(outer, index), at(outer, index + 1)),
  );
  // Where edges cross, what the outline encloses is not what its rings add up to.
  const enclosed = regionAreaMm2(kernel.union([outer], "nonzero"));
  const overlap = Math.abs(Math.abs(signedRingArea(outer)) - enclosed);
  const slack = lengthToleranceMm * 4 * members.reduce((sum, { longPoint }) => sum + longPoint, 0);
  return checked(
    {
      framePiece: [Math.min(...members.map(({ shortPoint }) => shortPoint)), { least: 1, most: 2 * lengthRange.most }],
      frameOverlap: [overlap, { least: 0, most: slack }],
    },
    () => ({
      members: design.mitred ? members : members.map((member, index) => butted(member, index, inner, outer)),
      outer,
      diagonals: diagonalsOf(outer),
    }),
  );
}

/** The body inside a frame when the measures mean the whole sign: less by twice the width, each way. */
export function bodyInFrame(
  overall: { readonly width: number; readonly height: number },
  frameWidth: number,
): Outcome<{ readonly width: number; readonly height: number }> {
  const { width, height } = overall;
  return checked(
    {
      frameWidth: [frameWidth, lengthRange],
      overallWidth: [width, { least: 2 * frameWidth + 1, most: lengthRange.most }],
      overallHeight: [height, { least: 2 * frameWidth + 1, most: lengthRange.most }],
    },
    () => ({ width: width - 2 * frameWidth, height: height - 2 * frameWidth }),
  );
}

const at = (polygon: Polygon, index: number): Point => polygon.at(index % polygon.length) ?? { x: 0, y: 0 };

/** Outwards of an edge of a ring that runs clockwise on the sheet. */
function outwards(from: Point, to: Point): Point {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  return { x: (to.y - from.y) / length, y: -(to.x - from.x) / length };
}

/** The outer corners of a frame round these, one for one: where the outer edges of neighbouring pieces meet. */
export function outerCorners(inner: Polygon, width: number): Polygon {
  return inner.map((corner, index) => outerCorner(corner, at(inner, index - 1), at(inner, index + 1), width));
}

function outerCorner(corner: Point, before: Point, after: Point, width: number): Point {
  const [one, other] = [outwards(before, corner), outwards(corner, after)];
  const share = width / (1 + one.x * other.x + one.y * other.y);
  return { x: corner.x + share * (one.x + other.x), y: corner.y + share * (one.y + other.y) };
}

function memberOf(from: Point, to: Point, outerFrom: Point, outerTo: Point): FrameMember {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const along = ({ x, y }: Point) => ((x - from.x) * (to.x - from.x) + (y - from.y) * (to.y - from.y)) / length;
  const across = Math.abs((outerFrom.x - from.x) * (to.y - from.y) - (outerFrom.y - from.y) * (to.x - from.x)) / length;
  const [start, end] = [along(outerFrom), along(outerTo)];
  const setting = (off: number) => (Math.atan2(Math.abs(off), across) * 180) / Math.PI;
  return {
    outline: [outerFrom, outerTo, to, from],
    from,
    to,
    longPoint: Math.max(end, length) - Math.min(start, 0),
    shortPoint: Math.min(end - start, length),
    settings: [setting(start), setting(end - length)],
  };
}

/** An upright runs through to both outer edges, a level piece lies between. */
function butted(member: FrameMember, index: number, inner: Polygon, outer: Polygon): FrameMember {
  const { from, to } = member;
  const isUpright = Math.abs(to.y - from.y) > Math.abs(to.x - from.x);
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const out = outwards(from, to);
  const width = Math.abs((at(outer, index).x - from.x) * out.x + (at(outer, index).y - from.y) * out.y);
  const past = isUpright ? width : 0;
  const step = { x: ((to.x - from.x) / length) * past, y: ((to.y - from.y) / length) * past };
  const ends = [
    { x: at(inner, index).x - step.x, y: at(inner, index).y - step.y },
    { x: at(inner, index + 1).x + step.x, y: at(inner, index + 1).y + step.y },
  ] as const;
  const moved = ends.map(({ x, y }) => ({ x: x + out.x * width, y: y + out.y * width }));
  return {
    ...member,
    outline: [...moved, ends[1], ends[0]],
    longPoint: length + 2 * past,
    shortPoint: length + 2 * past,
    settings: [0, 0],
  };
}

/** Four when all corners are square, else how many are. */
function squareCorners(corners: Polygon): number {
  const square = corners.filter((corner, index) => {
    const [before, after] = [at(corners, index - 1), at(corners, index + 1)];
    const cross = outwards(before, corner);
    const other = outwards(corner, after);
    return Math.abs(cross.x * other.x + cross.y * other.y) < 1e-6;
  });
  return corners.length === 4 ? square.length : Math.min(3, square.length);
}

function diagonalsOf(outer: Polygon): Diagonal[] {
  const pairs =
    outer.length === 4
      ? [
          [0, 2],
          [1, 3],
        ]
      : outer.slice(2, -1).map((_, index) => [0, index + 2]);
  return pairs.map(([one = 0, other = 0]) => {
    const [from, to] = [at(outer, one), at(outer, other)];
    return { from, to, lengthMm: Math.hypot(to.x - from.x, to.y - from.y) };
  });
}
