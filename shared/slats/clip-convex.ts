import type { Box, Point, Polygon } from "../geometry/path.ts";

/** Corners nearer to each other than this are one, mm. */
const sameCornerMm = 1e-9;

/** What of a convex polygon lies on the side of a line where a·x + b·y ≤ limit. Empty when nothing does. Exact but for rounding. */
export function clipConvex(
  polygon: Polygon,
  line: { readonly a: number; readonly b: number; readonly limit: number },
): Polygon {
  const beyond = ({ x, y }: Point) => line.a * x + line.b * y - line.limit;
  const kept: Point[] = [];
  let previous = polygon.at(-1);
  for (const point of polygon) {
    if (previous) {
      const [before, here] = [beyond(previous), beyond(point)];
      if (before > 0 !== here > 0) {
        const share = before / (before - here);
        kept.push({ x: previous.x + share * (point.x - previous.x), y: previous.y + share * (point.y - previous.y) });
      }
      if (here <= 0) kept.push(point);
    }
    previous = point;
  }
  const corners = kept.filter((point, index) => {
    const last = kept[(index + kept.length - 1) % kept.length];
    return last && Math.hypot(point.x - last.x, point.y - last.y) > sameCornerMm;
  });
  return corners.length >= 3 ? corners : [];
}

/** What of a convex polygon lies in a box. */
export function clipConvexToBox(polygon: Polygon, { x, y, width, height }: Box): Polygon {
  return [
    { a: -1, b: 0, limit: -x },
    { a: 1, b: 0, limit: x + width },
    { a: 0, b: -1, limit: -y },
    { a: 0, b: 1, limit: y + height },
  ].reduce(clipConvex, polygon);
}
