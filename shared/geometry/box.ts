import { cubicPoint } from "./flatten.ts";
import type { Box, Path, Point, Polygon, Region } from "./path.ts";

/** The box around points; null for none. */
export function boxOfPoints(points: Iterable<Point>): Box | null {
  let left = Number.POSITIVE_INFINITY;
  let top = Number.POSITIVE_INFINITY;
  let right = Number.NEGATIVE_INFINITY;
  let bottom = Number.NEGATIVE_INFINITY;
  for (const { x, y } of points) {
    if (x < left) left = x;
    if (x > right) right = x;
    if (y < top) top = y;
    if (y > bottom) bottom = y;
  }
  return left > right ? null : { x: left, y: top, width: right - left, height: bottom - top };
}

/** The box around one polygon; an empty polygon has an empty box at the origin. */
export function boxOfPolygon(polygon: Polygon): Box {
  return boxOfPoints(polygon) ?? { x: 0, y: 0, width: 0, height: 0 };
}

/** The box around a region; null when it is empty. */
export function boxOfRegion(region: Region): Box | null {
  return boxUnion(region.map((polygon) => boxOfPoints(polygon)));
}

/** The exact box around a path: ends of segments and the extremes of its cubics, where the derivative vanishes. */
export function boxOfPath(path: Path): Box | null {
  const points: Point[] = [];
  for (const ring of path) {
    let from = ring.start;
    points.push(from);
    for (const segment of ring.segments) {
      if (segment.kind === "cubic") {
        const { c1, c2, to } = segment;
        for (const t of [...turningPoints(from.x, c1.x, c2.x, to.x), ...turningPoints(from.y, c1.y, c2.y, to.y)])
          points.push(cubicPoint(from, c1, c2, to, t));
      }
      points.push(segment.to);
      from = segment.to;
    }
  }
  return boxOfPoints(points);
}

/** The smallest box around all given ones; nulls are skipped; null when nothing is left. */
export function boxUnion(boxes: Iterable<Box | null>): Box | null {
  const corners: Point[] = [];
  for (const box of boxes) {
    if (box) corners.push({ x: box.x, y: box.y }, { x: box.x + box.width, y: box.y + box.height });
  }
  return boxOfPoints(corners);
}

/** What two boxes share; null when they are apart. Boxes that only touch share a box without width or height. */
export function boxIntersection(a: Box, b: Box): Box | null {
  const x = Math.max(a.x, b.x);
  const y = Math.max(a.y, b.y);
  const width = Math.min(a.x + a.width, b.x + b.width) - x;
  const height = Math.min(a.y + a.height, b.y + b.height) - y;
  return width < 0 || height < 0 ? null : { x, y, width, height };
}

/** Whether two boxes share a point, edges included. */
export function boxesOverlap(a: Box, b: Box): boolean {
  return a.x <= b.x + b.width && b.x <= a.x + a.width && a.y <= b.y + b.height && b.y <= a.y + a.height;
}

/** Whether `inner` lies in `outer`, edges included. */
export function boxContains(outer: Box, inner: Box): boolean {
  return (
    inner.x >= outer.x &&
    inner.y >= outer.y &&
    inner.x + inner.width <= outer.x + outer.width &&
    inner.y + inner.height <= outer.y + outer.height
  );
}

/** The box grown by `distance` on all sides (shrunk when negative, to its middle at most). */
export function boxGrow(box: Box, distance: number): Box {
  const dx = Math.max(distance, -box.width / 2);
  const dy = Math.max(distance, -box.height / 2);
  return { x: box.x - dx, y: box.y - dy, width: box.width + 2 * dx, height: box.height + 2 * dy };
}

/** The middle of a box. */
export function boxCentre(box: Box): Point {
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

/** Where 0 < t < 1 makes a cubic's coordinate turn: roots of its derivative a t² + b t + c (over 3). */
function turningPoints(p0: number, p1: number, p2: number, p3: number): number[] {
  const a = p3 - 3 * p2 + 3 * p1 - p0;
  const b = 2 * (p2 - 2 * p1 + p0);
  const c = p1 - p0;
  const inside = (t: number) => t > 0 && t < 1;
  if (Math.abs(a) < 1e-12) return Math.abs(b) < 1e-12 ? [] : [-c / b].filter(inside);
  const discriminant = b * b - 4 * a * c;
  if (discriminant < 0) return [];
  const root = Math.sqrt(discriminant);
  // Of the two forms of the formula the one that does not subtract near-equal numbers, for each root.
  const q = -0.5 * (b + (b < 0 ? -root : root));
  return (q === 0 ? [0] : [q / a, c / q]).filter(inside);
}
