import { regionAreaMm2 } from "../geometry/area.ts";
import { distanceToSegmentMm } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { circlePath } from "../geometry/shapes.ts";
import { isShorter } from "../geometry/tolerance.ts";

/** An open joint between slats, as its middle line. */
export type Joint = { readonly from: Point; readonly to: Point; readonly width: number };

export type BarrelFoot = {
  /** Share of the foot that stands on wood, 0 to 1. */
  readonly onWood: number;
  /** Whether it stands over an open joint. */
  readonly overJoint: boolean;
  /** From its middle to the nearest brad, mm; null when there is none. */
  readonly nearestBradMm: number | null;
};

/** At least that share of a foot on wood, and its middle that far in mm from brads (common practice). */
export const footLimits = { onWood: 0.8, bradMm: 10 } as const;

/** How near a foot's middle is to that of an open joint, and how near it may be, mm. */
export type JointUnder = { readonly distanceMm: number; readonly neededMm: number };

/** Of the open joints that a foot stands over the one nearest to its middle; null when it stands over none. Arithmetic. */
export function jointUnder(
  foot: Point & { readonly diameter: number },
  openJoints: readonly Joint[],
): JointUnder | null {
  return openJoints.reduce<JointUnder | null>((nearest, { from, to, width }) => {
    const distanceMm = distanceToSegmentMm(foot, from, to);
    const neededMm = (foot.diameter + width) / 2;
    if (!isShorter(distanceMm, neededMm)) return nearest;
    return nearest && nearest.distanceMm <= distanceMm ? nearest : { distanceMm, neededMm };
  }, null);
}

/**
 * How a barrel stands on a backer: the share of its foot on wood, whether an open joint runs under it, and how near the
 * next brad is, which its screw would meet. Arithmetic. A foot without width stands on nothing.
 */
export function barrelFoot(
  foot: Point & { readonly diameter: number },
  backer: { readonly wood: Region; readonly openJoints: readonly Joint[]; readonly brads: readonly Point[] },
  kernel: Kernel,
): BarrelFoot {
  const disc = kernel.union(flattenPath(circlePath(foot, foot.diameter / 2)), "evenodd");
  const area = regionAreaMm2(disc);
  const onWood = area > 0 ? Math.min(1, regionAreaMm2(kernel.intersect(disc, backer.wood)) / area) : 0;
  const overJoint = jointUnder(foot, backer.openJoints) !== null;
  const nearest = backer.brads.reduce(
    (least, brad) => Math.min(least, Math.hypot(brad.x - foot.x, brad.y - foot.y)),
    Number.POSITIVE_INFINITY,
  );
  return { onWood, overJoint, nearestBradMm: Number.isFinite(nearest) ? nearest : null };
}
