import type { Point } from "../geometry/path.ts";
import { type Camera, cross, lengthOf, planeToPhoto, plus, times, turned, type Vector } from "./camera.ts";
import { type Homography, homographyBetween, mapPoint } from "./homography.ts";
import type { Quad } from "./quad.ts";
import { solveLinear } from "./solve-linear.ts";

/** Focal lengths that photos have, in longer sides of the photo: from a phone's widest lens to its longest. */
const focalRange = { least: 0.3, most: 6 };
/** Where the corners say nothing: a usual phone's, whose picture is 65° wide or so. */
const usualFocal = 0.78;
/** A focal length is told when a corner marked one px off changes it by no more than this share. */
const toldWithin = 0.5;

export type CameraFit = {
  readonly camera: Camera;
  /** Root of the mean square distance of the four corners from where this camera would see them, px. */
  readonly residualPx: number;
  /** Share by which the focal length is off (one sigma) when each figure of the corners is one px off (one sigma); Infinity when nothing tells it. */
  readonly focalSpread: number;
  /** Whether the view is slanting enough for the focal length, and with it depth, to be told. */
  readonly isFocalTold: boolean;
};

type Pose = { readonly logFocal: number; readonly axes: Camera["axes"]; readonly origin: Vector };

/**
 * The camera that sees the corners of a sheet nearest to where they were marked: square pixels, looking through the
 * photo's middle, its focal length unknown. That is 7 unknowns to 8 figures, so that one figure is left over and
 * says whether the marks can be true. Least squares after Levenberg and Marquardt, begun from the two conditions that a rotation
 * sets on the homography (Zhang, A Flexible New Technique for Camera Calibration, 2000, section 2.3).
 * Null where the corners have no homography. `corners` in px, `sheet` in mm.
 */
export function fitCamera(
  { widthPx, heightPx }: { readonly widthPx: number; readonly heightPx: number },
  sheet: Quad,
  corners: Quad,
): CameraFit | null {
  const map = homographyBetween(sheet, corners);
  if (!map) return null;
  const longer = Math.max(widthPx, heightPx);
  const middle = { x: widthPx / 2, y: heightPx / 2 };
  const logs = [Math.log(focalRange.least * longer), Math.log(focalRange.most * longer)] as const;
  const within = (log: number) => Math.min(logs[1], Math.max(logs[0], log));
  const starts = [focalOf(map, middle), usualFocal * longer, 2 * longer].filter((focal) => focal !== null);
  const problem: Problem = { middle, sheet, corners, within };
  const fits = starts.flatMap((focal) => {
    const start = poseOf(map, middle, Math.exp(within(Math.log(focal))));
    return start ? [refine(problem, start)] : [];
  });
  const best = fits.reduce<Refined | null>((least, fit) => (least && least.cost <= fit.cost ? least : fit), null);
  if (!best) return null;
  const { pose, cost, focalSpread } = best;
  const isInside = pose.logFocal > logs[0] && pose.logFocal < logs[1];
  return {
    camera: cameraOf(pose, middle),
    residualPx: Math.sqrt(cost / 4),
    focalSpread,
    isFocalTold: isInside && focalSpread <= toldWithin,
  };
}

/**
 * The focal length that makes the wall's axes square and alike long, by least squares over the two conditions; null when
 * none does, as in a frontal view. The first condition is halved so that both count alike whichever way the axes lie.
 */
function focalOf(map: Homography, middle: Point): number | null {
  const [along, down] = columnsOf(map, middle);
  const [a1, a2, a3] = along;
  const [b1, b2, b3] = down;
  const rows = [
    [a1 * b1 + a2 * b2, a3 * b3],
    [(a1 * a1 + a2 * a2 - b1 * b1 - b2 * b2) / 2, (a3 * a3 - b3 * b3) / 2],
  ] as const;
  const square = rows.reduce((sum, [u]) => sum + u * u, 0);
  const inverseSquare = -rows.reduce((sum, [u, v]) => sum + u * v, 0) / square;
  return inverseSquare > 0 && Number.isFinite(inverseSquare) ? 1 / Math.sqrt(inverseSquare) : null;
}

/** The map's columns, seen from the photo's middle. */
function columnsOf([a, b, c, d, e, f, g, h, i]: Homography, { x, y }: Point): readonly [Vector, Vector, Vector] {
  const column = (u: number, v: number, w: number): Vector => [u - x * w, v - y * w, w];
  return [column(a, d, g), column(b, e, h), column(c, f, i)];
}

/** Where a camera of that focal length must stand to see the wall much as the map shows it; its axes are made square. Null when it can't. */
export function poseOf(map: Homography, middle: Point, focal: number): Pose | null {
  const [a, b, c] = columnsOf(map, middle).map(([x, y, z]): Vector => [x / focal, y / focal, z]);
  if (!a || !b || !c) return null;
  const sign = c[2] < 0 ? -1 : 1;
  const scale = sign / Math.sqrt(lengthOf(a) * lengthOf(b));
  if (!Number.isFinite(scale)) return null;
  const [along, down] = squared(times(a, scale), times(b, scale));
  return { logFocal: Math.log(focal), axes: [along, down, cross(along, down)], origin: times(c, scale) };
}

/** Two directions turned towards or from each other alike until they are square, each of length 1. */
function squared(a: Vector, b: Vector): readonly [Vector, Vector] {
  const [u, v] = [times(a, 1 / lengthOf(a)), times(b, 1 / lengthOf(b))];
  const sum = plus(u, v);
  const difference = plus(u, times(v, -1));
  const [s, d] = [times(sum, Math.SQRT1_2 / lengthOf(sum)), times(difference, Math.SQRT1_2 / lengthOf(difference))];
  return [plus(s, d), plus(s, times(d, -1))];
}

const cameraOf = ({ logFocal, axes, origin }: Pose, middle: Point): Camera => ({
  focal: Math.exp(logFocal),
  middle,
  axes,
  origin,
});

type Problem = {
  readonly middle: Point;
  readonly sheet: Quad;
  readonly corners: Quad;
  readonly within: (logFocal: number) => number;
};
type Refined = { readonly pose: Pose; readonly cost: number; readonly focalSpread: number };

/** A round that takes less than this share off the squares is the last. */
const leastGain = 1e-9;
/** Px²: what is left of marks without any error. */
const exactCost = 1e-16;

function refine(problem: Problem, start: Pose): Refined {
  let pose = start;
  let misses = missesOf(problem, pose);
  let damping = 1e-3;
  for (let round = 0; round < 60 && damping < 1e12; round++) {
    const slopes = slopesOf(problem, pose);
    const step = solveLinear(normal(slopes, damping), pull(slopes, misses));
    if (!step) break;
    const next = stepped(problem, pose, step);
    const missed = missesOf(problem, next);
    const gain = costOf(misses) - costOf(missed);
    if (gain > 0) {
      const isSettled = gain < leastGain * costOf(misses) || costOf(missed) < exactCost;
      pose = next;
      misses = missed;
      damping = Math.max(damping / 10, 1e-12);
      if (isSettled) break;
    } else damping *= 10;
  }
  return { pose, cost: costOf(misses), focalSpread: spreadOf(slopesOf(problem, pose)) };
}

const costOf = (misses: readonly number[]): number => misses.reduce((sum, miss) => sum + miss * miss, 0);

/** How far each corner is seen from where it was marked, px, x and y in turn. */
function missesOf({ middle, sheet, corners }: Problem, pose: Pose): number[] {
  const map = planeToPhoto(cameraOf(pose, middle), 0);
  return sheet.flatMap((corner, index) => {
    const marked = corners[index];
    const seen = mapPoint(map, corner);
    return marked && seen ? [seen.x - marked.x, seen.y - marked.y] : [1e6, 1e6];
  });
}

/** Unknowns: the focal length's logarithm, a small turn about each axis, a share of the distance along each. */
const unknowns = [0, 1, 2, 3, 4, 5, 6] as const;

function stepped({ within }: Problem, { logFocal, axes, origin }: Pose, step: readonly number[]): Pose {
  const [focal = 0, turnX = 0, turnY = 0, turnZ = 0, x = 0, y = 0, z = 0] = step;
  const turn: Vector = [turnX, turnY, turnZ];
  const [along, down] = squared(turned(axes[0], turn), turned(axes[1], turn));
  return {
    logFocal: within(logFocal + focal),
    axes: [along, down, cross(along, down)],
    origin: plus(origin, times([x, y, z], lengthOf(origin))),
  };
}

const nudge = 1e-6;

/** How each miss changes with each unknown: a row an unknown, by central differences. */
function slopesOf(problem: Problem, pose: Pose): number[][] {
  const free = { ...problem, within: (log: number) => log };
  return unknowns.map((unknown) => {
    const by = (size: number) =>
      missesOf(
        problem,
        stepped(
          free,
          pose,
          unknowns.map((one) => (one === unknown ? size : 0)),
        ),
      );
    const [more, less] = [by(nudge), by(-nudge)];
    return more.map((value, index) => (value - (less[index] ?? 0)) / (2 * nudge));
  });
}

const inner = (a: readonly number[], b: readonly number[]): number =>
  a.reduce((sum, value, index) => sum + value * (b[index] ?? 0), 0);

const normal = (slopes: readonly number[][], damping: number): number[][] =>
  slopes.map((row, index) => slopes.map((other, place) => inner(row, other) * (index === place ? 1 + damping : 1)));

const pull = (slopes: readonly number[][], misses: readonly number[]): number[] =>
  slopes.map((row) => -inner(row, misses));

/** Standard deviation of the focal length's logarithm for marks of one px: the root of its place in the inverse of the normal matrix. */
function spreadOf(slopes: readonly number[][]): number {
  const [first] =
    solveLinear(
      normal(slopes, 0),
      unknowns.map((unknown) => (unknown === 0 ? 1 : 0)),
    ) ?? [];
  return first !== undefined && first > 0 ? Math.sqrt(first) : Number.POSITIVE_INFINITY;
}
