import { segmentPoints } from "../geometry/flatten.ts";
import type { Cap, Join, Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import type { Subpath } from "../geometry/path-text.ts";
import { type StrokePoint, strokeParts, withoutPinholes } from "../geometry/stroke-parts.ts";
import { flatteningToleranceMm } from "../geometry/tolerance.ts";
import {
  type Matrix,
  matrixMultiply,
  matrixStretch,
  pointTransform,
  regionTransform,
  scaleMatrix,
  segmentTransform,
} from "../geometry/transform.ts";
import type { ArtworkBudget } from "./budget.ts";
import { dashLine } from "./dashes.ts";

/** Finer than for fills: the pen magnifies what the chords leave out, and curves are fitted to the outline again. */
const lineToleranceMm = flatteningToleranceMm / 4;

export type StrokeStyle = {
  readonly width: number;
  readonly join: Join | "bevel";
  readonly cap: Cap;
  readonly mitreLimit: number;
  readonly dashes: readonly number[];
  readonly dashOffset: number;
};

/**
 * What the pen covers when it follows the subpaths, on the drawing's working plane. Widths and dashes are in the path's own
 * units, before `matrix`. Empty when the matrix flattens everything.
 */
export function strokeRegion(
  kernel: Kernel,
  subpaths: readonly Subpath[],
  options: { matrix: Matrix; style: StrokeStyle; budget: ArtworkBudget },
): Region {
  const { matrix, style, budget } = options;
  const stretch = matrixStretch(matrix);
  if (!(stretch > 0) || !Number.isFinite(stretch) || matrix.a * matrix.d === matrix.b * matrix.c) return [];
  // A map that keeps angles can go first. Any other would make the pen's point an ellipse, so it comes after the outline.
  const plain = keepsAngles(matrix, stretch);
  const toPen = plain ? matrix : scaleMatrix(stretch);
  const pen = {
    widthMm: style.width * stretch,
    join: style.join,
    cap: style.cap,
    mitreLimit: style.mitreLimit,
  };
  const pattern = style.dashes.map((length) => length * stretch);

  const parts = subpaths.flatMap((subpath) => {
    const line = linePoints(subpath, toPen);
    if (!line) return [];
    budget.countVertices(line.length);
    const dashes = dashLine(line, { closed: subpath.closed, pattern, offset: style.dashOffset * stretch, budget });
    return dashes
      ? dashes.flatMap((dash) => strokeParts(dash, { ...pen, closed: false }))
      : strokeParts(line, { ...pen, closed: subpath.closed });
  });
  const outline = withoutPinholes(kernel.union(parts, "nonzero"));
  if (plain) return outline;
  return kernel.union(regionTransform(outline, matrixMultiply(matrix, scaleMatrix(1 / stretch))), "evenodd");
}

/** The subpath as points, those inside curves marked; null for a lone move, which draws nothing. */
function linePoints(subpath: Subpath, matrix: Matrix): StrokePoint[] | null {
  if (subpath.segments.length === 0 && !subpath.closed) return null;
  let from = pointTransform(subpath.start, matrix);
  const points: StrokePoint[] = [from];
  for (const original of subpath.segments) {
    const segment = segmentTransform(original, matrix);
    const next = segmentPoints(from, segment, lineToleranceMm);
    for (const [index, point] of next.entries())
      points.push(index < next.length - 1 ? { ...point, smooth: true } : point);
    from = segment.to;
  }
  return points;
}

function keepsAngles({ a, b, c, d }: Matrix, stretch: number): boolean {
  const slack = stretch * 1e-9;
  return (
    (Math.abs(a - d) <= slack && Math.abs(b + c) <= slack) || (Math.abs(a + d) <= slack && Math.abs(b - c) <= slack)
  );
}
