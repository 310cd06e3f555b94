import { boxesOverlap, boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { type BarrelFoot, barrelFoot, type Joint } from "../hardware/barrel-foot.ts";
import type { Slat, SlatLayout } from "./slat-layout.ts";

/** How a barrel stands on slats: on how much wood, over an open joint or not, how near to a brad. */
export function footOnSlats(
  foot: Point & { readonly diameter: number },
  layout: SlatLayout,
  brads: readonly Point[],
  kernel: Kernel,
): BarrelFoot {
  const { x, y, diameter } = foot;
  const under = { x: x - diameter / 2, y: y - diameter / 2, width: diameter, height: diameter };
  const pieces = [...layout.slats, ...(layout.spine ? [layout.spine] : [])];
  const wood = pieces.flatMap(({ trimmed }) => {
    const box = boxOfRegion(trimmed);
    return box && boxesOverlap(box, under) ? trimmed : [];
  });
  return barrelFoot(foot, { wood, openJoints: openJointsOf(layout), brads }, kernel);
}

/** The open joints between neighbouring slats, as middle lines; none where slats are laid without a gap. */
export function openJointsOf({ slats, design }: Pick<SlatLayout, "slats" | "design">): Joint[] {
  if (design.gap <= lengthToleranceMm) return [];
  const byStrip = new Map<string, Slat[]>();
  const nameOf = (side: Slat["side"], strip: number) => `${side} ${strip}`;
  for (const slat of slats) {
    const name = nameOf(slat.side, slat.strip);
    byStrip.set(name, [...(byStrip.get(name) ?? []), slat]);
  }
  return slats.flatMap((slat) =>
    (byStrip.get(nameOf(slat.side, slat.strip + 1)) ?? []).flatMap(
      (next) => jointBetween(slat, next, design.slatWidth, design.gap) ?? [],
    ),
  );
}

/** The middle of the gap between two slats, as long as their edges face each other. */
function jointBetween(slat: Slat, next: Slat, slatWidth: number, gap: number): Joint | null {
  const { from, to } = slat.axis;
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  if (length === 0) return null;
  const along = { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
  const turned = { x: -along.y, y: along.x };
  const towards = (next.axis.from.x - from.x) * turned.x + (next.axis.from.y - from.y) * turned.y;
  const across = towards < 0 ? { x: -turned.x, y: -turned.y } : turned;
  const spread = (points: readonly Point[]) =>
    points.map(({ x, y }) => (x - from.x) * along.x + (y - from.y) * along.y);
  const beside = ({ x, y }: Point) => (x - from.x) * across.x + (y - from.y) * across.y;
  const edge = (points: readonly Point[], at: number) =>
    spread(points.filter((point) => Math.abs(beside(point) - at) < 0.01));
  const one = edge(slat.untrimmed, slatWidth / 2);
  const other = edge(next.untrimmed, slatWidth / 2 + gap);
  const middle = (pick: (...values: number[]) => number) => {
    const ends = [one, other].filter((values) => values.length > 1).map((values) => pick(...values));
    return ends.length === 0 ? null : ends.reduce((sum, end) => sum + end, 0) / ends.length;
  };
  const [start, end] = [middle(Math.min), middle(Math.max)];
  if (start === null || end === null || end <= start) return null;
  const off = slatWidth / 2 + gap / 2;
  const at = (u: number): Point => ({
    x: from.x + u * along.x + off * across.x,
    y: from.y + u * along.y + off * across.y,
  });
  return { from: at(start), to: at(end), width: gap };
}
