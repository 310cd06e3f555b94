import type { Slat, SlatCut } from "../slats/slat-layout.ts";
import type { BarEnd, BarPart } from "./cutting-job.ts";

/** The flattest blade that is reckoned with; what is flatter is ripped, not cut off. */
const leastAngle = 1;

/**
 * Slats as parts to be cut from bars, one a slat, in laying order: id and label are the order's number, the length is as
 * cut, the overhang with it. Each lies with its grain along the bar and its face towards the viewer, its near end first.
 */
export function partsOfSlats(slats: readonly Slat[]): BarPart[] {
  return slats.map((slat) => ({
    id: String(slat.order),
    label: String(slat.order),
    lengthMm: slat.longPoint,
    quantity: 1,
    start: endOf(slat, slat.near, -1),
    end: endOf(slat, slat.far, 1),
  }));
}

/** One end: `sign` is 1 where the slat's axis ends and −1 where it begins. */
function endOf({ untrimmed, axis }: Slat, cuts: readonly SlatCut[], sign: 1 | -1): BarEnd {
  const angle = Math.max(leastAngle, 90 - Math.max(0, ...cuts.map(({ setting }) => setting)));
  if (cuts.length > 1) return { angle, longPoint: "middle" };
  const along = { x: axis.to.x - axis.from.x, y: axis.to.y - axis.from.y };
  const reach = (isUpper: boolean) =>
    untrimmed.reduce((most, { x, y }) => {
      const [dx, dy] = [x - axis.from.x, y - axis.from.y];
      // Turned so that the axis runs to the right, y down: what lies above it is on the upper edge.
      const across = along.x * dy - along.y * dx;
      const isThere = isUpper ? across < 0 : across > 0;
      return isThere ? Math.max(most, sign * (along.x * dx + along.y * dy)) : most;
    }, Number.NEGATIVE_INFINITY);
  return { angle, longPoint: reach(true) >= reach(false) ? "upper" : "lower" };
}
