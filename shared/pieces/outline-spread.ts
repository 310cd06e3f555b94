import type { Region } from "../geometry/path.ts";

const directions = 24;
const unit = Array.from({ length: directions }, (_, index) => {
  const angle = (2 * Math.PI * index) / directions;
  return { x: Math.cos(angle), y: Math.sin(angle) };
});

/** How far an outline reaches from the origin, mm, in each of 24 directions from the x axis on, clockwise. */
export type Spread = readonly number[];

/** The spread of a region that covers something. */
export function spreadOfRegion(region: Region): Spread {
  return unit.map(({ x, y }) => {
    let reach = -Infinity;
    for (const ring of region) for (const point of ring) reach = Math.max(reach, point.x * x + point.y * y);
    return reach;
  });
}

/**
 * Whether two outlines can lie within a distance of each other: an outline that reaches no more than it over another
 * reaches no farther in any direction than that. `turned` takes the other one turned by 180°.
 */
export function spreadsAreWithin(one: Spread, other: Spread, withinMm: number, turned = false): boolean {
  const shift = turned ? directions / 2 : 0;
  for (let index = 0; index < directions; index++) {
    const [a, b] = [one[index] ?? 0, other[(index + shift) % directions] ?? 0];
    if (Math.abs(a - b) > withinMm) return false;
  }
  return true;
}
