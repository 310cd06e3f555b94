import { signedRingArea } from "../geometry/area.ts";
import type { Path, Point, Polygon } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { checked, lengthRange, type Outcome } from "../units/outcome.ts";

const mostCorners = 40;
/** Sharper corners leave no wood in the mitre, degrees. Our choice. */
const sharpest = 30;

/**
 * The corners of a board that a frame goes round, clockwise on the sheet; corners in the middle of a straight edge are left
 * out. Refused: curved edges, several outlines, fewer than 3 or more than 40 corners, sharp ones.
 */
export function frameCorners(outline: Path): Outcome<Polygon> {
  const curves = outline.flatMap(({ segments }) => segments).filter(({ kind }) => kind === "cubic").length;
  const [ring] = outline;
  const points = ring ? [ring.start, ...ring.segments.map(({ to }) => to)] : [];
  const farthest = points.reduce((far, { x, y }) => Math.max(far, Math.abs(x), Math.abs(y)), 0);
  const straight = checked(
    {
      curvedEdges: [curves, { least: 0, most: 0 }],
      outlines: [outline.length, { least: 1, most: 1 }],
      outlineReach: [farthest, { least: 0, most: 2 * lengthRange.most }],
      outlinePoints: [points.length, { least: 3, most: 10_000 }],
    },
    () => withoutStraightCorners(points),
  );
  if (!straight.ok) return straight;
  const corners = signedRingArea(straight.value) < 0 ? straight.value.toReversed() : straight.value;
  const angles = corners.map((corner, index) => insideAngle(before(corners, index), corner, after(corners, index)));
  return checked(
    {
      frameCorners: [corners.length, { least: 3, most: mostCorners }],
      sharpestCorner: [Math.min(...angles), { least: sharpest, most: 360 }],
      widestCorner: [Math.max(...angles), { least: 0, most: 360 - sharpest }],
    },
    () => corners,
  );
}

const before = (points: Polygon, index: number): Point => points.at(index - 1) ?? { x: 0, y: 0 };
const after = (points: Polygon, index: number): Point => points[(index + 1) % points.length] ?? { x: 0, y: 0 };

/** Repeated corners first, then those on the straight line between their neighbours. */
function withoutStraightCorners(points: Polygon): Polygon {
  const distance = (a: Point, b: Point) => Math.hypot(a.x - b.x, a.y - b.y);
  const single = points.filter(
    (point, index) => points.length < 2 || distance(point, before(points, index)) > lengthToleranceMm,
  );
  return single.filter((point, index) => {
    const [a, b] = [before(single, index), after(single, index)];
    const doubled = (point.x - a.x) * (b.y - a.y) - (point.y - a.y) * (b.x - a.x);
    const turnsBack = (point.x - a.x) * (b.x - point.x) + (point.y - a.y) * (b.y - point.y) < 0;
    return turnsBack || Math.abs(doubled) > lengthToleranceMm * distance(a, b);
  });
}

/** Degrees between two edges on the inside of a ring that runs clockwise on the sheet, 0 to 360. */
function insideAngle(a: Point, corner: Point, b: Point): number {
  const [inX, inY, outX, outY] = [corner.x - a.x, corner.y - a.y, b.x - corner.x, b.y - corner.y];
  const turn = (Math.atan2(inX * outY - inY * outX, inX * outX + inY * outY) * 180) / Math.PI;
  return 180 - turn;
}
