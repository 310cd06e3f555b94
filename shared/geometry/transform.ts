import type { Path, Point, Region, Segment } from "./path.ts";

/** An affine map as SVG and PDF write it: x' = a x + c y + e, y' = b x + d y + f. */
export type Matrix = {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
  readonly e: number;
  readonly f: number;
};

export const identityMatrix: Matrix = { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 };

export const translateMatrix = (x: number, y: number): Matrix => ({ a: 1, b: 0, c: 0, d: 1, e: x, f: y });
export const scaleMatrix = (x: number, y: number = x): Matrix => ({ a: x, b: 0, c: 0, d: y, e: 0, f: 0 });

/** Turns about the origin by degrees, clockwise on the sheet (x right, y down). Right angles are exact. */
export function rotateMatrix(degrees: number): Matrix {
  const [cos, sin] = cosSin(degrees);
  return { a: cos, b: sin, c: -sin, d: cos, e: 0, f: 0 };
}

/** The map that does `inner` first and `outer` after it. */
export function matrixMultiply(outer: Matrix, inner: Matrix): Matrix {
  return {
    a: outer.a * inner.a + outer.c * inner.b,
    b: outer.b * inner.a + outer.d * inner.b,
    c: outer.a * inner.c + outer.c * inner.d,
    d: outer.b * inner.c + outer.d * inner.d,
    e: outer.a * inner.e + outer.c * inner.f + outer.e,
    f: outer.b * inner.e + outer.d * inner.f + outer.f,
  };
}

/** The map that undoes `matrix`; null when it flattens everything to a line or a point. */
export function matrixInverse(matrix: Matrix): Matrix | null {
  const determinant = matrix.a * matrix.d - matrix.b * matrix.c;
  if (determinant === 0 || !Number.isFinite(1 / determinant)) return null;
  const a = matrix.d / determinant;
  const b = -matrix.b / determinant;
  const c = -matrix.c / determinant;
  const d = matrix.a / determinant;
  return { a, b, c, d, e: -(a * matrix.e + c * matrix.f), f: -(b * matrix.e + d * matrix.f) };
}

/** The largest factor by which the map stretches a length: the greater singular value of its linear part. */
export function matrixStretch({ a, b, c, d }: Matrix): number {
  const sum = a * a + b * b + c * c + d * d;
  const determinant = a * d - b * c;
  return Math.sqrt((sum + Math.sqrt(Math.max(0, sum * sum - 4 * determinant * determinant))) / 2);
}

export function pointTransform({ x, y }: Point, matrix: Matrix): Point {
  return { x: matrix.a * x + matrix.c * y + matrix.e, y: matrix.b * x + matrix.d * y + matrix.f };
}

export function pathTransform(path: Path, matrix: Matrix): Path {
  return path.map((ring) => ({
    start: pointTransform(ring.start, matrix),
    segments: ring.segments.map((segment) => segmentTransform(segment, matrix)),
  }));
}

export function segmentTransform(segment: Segment, matrix: Matrix): Segment {
  return segmentMap(segment, (point) => pointTransform(point, matrix));
}

/** The segment with every point, handles too, replaced by what `change` makes of it. */
export function segmentMap(segment: Segment, change: (point: Point) => Point): Segment {
  if (segment.kind === "line") return { kind: "line", to: change(segment.to) };
  return { kind: "cubic", c1: change(segment.c1), c2: change(segment.c2), to: change(segment.to) };
}

export function regionTransform(region: Region, matrix: Matrix): Region {
  return region.map((polygon) => polygon.map((point) => pointTransform(point, matrix)));
}

function cosSin(degrees: number): readonly [number, number] {
  const quarter = degrees / 90;
  if (Number.isInteger(quarter)) {
    const exact = [
      [1, 0],
      [0, 1],
      [-1, 0],
      [0, -1],
    ] as const;
    return exact[(((quarter % 4) + 4) % 4) as 0 | 1 | 2 | 3];
  }
  const radians = (degrees * Math.PI) / 180;
  return [Math.cos(radians), Math.sin(radians)];
}
