import type { Box, Path, Point, Ring, Segment } from "./path.ts";

/**
 * Handle length of a quarter circle as one cubic, in radii: 4/3 (√2 − 1). The circle comes out at most 0.027 % too large
 * in radius and 0.028 % in area (T. Dokken et al., Computer Aided Geometric Design 7, 1990).
 */
export const circleKappa = (4 / 3) * (Math.SQRT2 - 1);

/** A closed ring of straight edges. Throws a RangeError for fewer than three points. */
export function polygonRing(points: readonly Point[]): Ring {
  const [start, ...rest] = points;
  if (!start || rest.length < 2) throw new RangeError("A ring needs three points.");
  return { start, segments: rest.map((to): Segment => ({ kind: "line", to })) };
}

/** A rectangle in mm, from its upper left corner clockwise on the sheet. */
export function rectanglePath({ x, y, width, height }: Box): Path {
  return [
    polygonRing([
      { x, y },
      { x: x + width, y },
      { x: x + width, y: y + height },
      { x, y: y + height },
    ]),
  ];
}

/** A rectangle with quarter circles of `radius` in its corners; the radius is held to half the shorter side. */
export function roundedRectanglePath({ x, y, width, height }: Box, radius: number): Path {
  const r = Math.min(radius, width / 2, height / 2);
  if (r <= 0) return rectanglePath({ x, y, width, height });
  const k = r * circleKappa;
  const right = x + width;
  const bottom = y + height;
  const line = (toX: number, toY: number): Segment => ({ kind: "line", to: { x: toX, y: toY } });
  const curve = (c1: Point, c2: Point, to: Point): Segment => ({ kind: "cubic", c1, c2, to });
  return [
    {
      start: { x: x + r, y },
      segments: [
        line(right - r, y),
        curve({ x: right - r + k, y }, { x: right, y: y + r - k }, { x: right, y: y + r }),
        line(right, bottom - r),
        curve({ x: right, y: bottom - r + k }, { x: right - r + k, y: bottom }, { x: right - r, y: bottom }),
        line(x + r, bottom),
        curve({ x: x + r - k, y: bottom }, { x, y: bottom - r + k }, { x, y: bottom - r }),
        line(x, y + r),
        curve({ x, y: y + r - k }, { x: x + r - k, y }, { x: x + r, y }),
      ],
    },
  ];
}

/** A circle of four cubics, from its right-hand point clockwise on the sheet. */
export function circlePath(centre: Point, radius: number): Path {
  return ellipsePath(centre, radius, radius);
}

/** An ellipse of four cubics with its axes along x and y. */
export function ellipsePath({ x, y }: Point, radiusX: number, radiusY: number): Path {
  const kx = radiusX * circleKappa;
  const ky = radiusY * circleKappa;
  const right = { x: x + radiusX, y };
  const bottom = { x, y: y + radiusY };
  const left = { x: x - radiusX, y };
  const top = { x, y: y - radiusY };
  return [
    {
      start: right,
      segments: [
        { kind: "cubic", c1: { x: right.x, y: y + ky }, c2: { x: x + kx, y: bottom.y }, to: bottom },
        { kind: "cubic", c1: { x: x - kx, y: bottom.y }, c2: { x: left.x, y: y + ky }, to: left },
        { kind: "cubic", c1: { x: left.x, y: y - ky }, c2: { x: x - kx, y: top.y }, to: top },
        { kind: "cubic", c1: { x: x + kx, y: top.y }, c2: { x: right.x, y: y - ky }, to: right },
      ],
    },
  ];
}
