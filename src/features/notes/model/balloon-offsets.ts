type Spot = { readonly x: number; readonly y: number };

/** How far a balloon stands from its spot, in px. */
export type Offset = { readonly dx: number; readonly dy: number };

export const balloonRadiusPx = 15;

const reaches = [46, 68, 96, 132];
const directions = 16;
const gapPx = 6;

const cross = (a: Spot, b: Spot, c: Spot) => (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x);
const doCross = (a: Spot, b: Spot, c: Spot, d: Spot) =>
  cross(a, b, c) * cross(a, b, d) < 0 && cross(c, d, a) * cross(c, d, b) < 0;

/**
 * Stands a balloon beside each spot (window px): outward from the middle where there is room, clear of other balloons, spots
 * and leaders as far as that can be had. Same spots in the same order, same balloons; one offset for each spot.
 */
export function balloonOffsets(spots: readonly Spot[], room: { width: number; height: number }): Offset[] {
  const middle = { x: room.width / 2, y: room.height / 2 };
  const placed: { spot: Spot; balloon: Spot }[] = [];
  for (const spot of spots) {
    const outward = Math.atan2(spot.y - middle.y, spot.x - middle.x);
    let best: { balloon: Spot; cost: number } | null = null;
    for (const reach of reaches) {
      for (let step = 0; step < directions; step += 1) {
        // From outward to either side in turn, so that ties go to the most outward one.
        const turn = ((step % 2 === 0 ? 1 : -1) * Math.ceil(step / 2) * 2 * Math.PI) / directions;
        const balloon = {
          x: spot.x + reach * Math.cos(outward + turn),
          y: spot.y + reach * Math.sin(outward + turn),
        };
        const cost = reach * 0.4 + Math.abs(turn) * 12 + hindrance(spot, balloon, spots, placed, room);
        if (best === null || cost < best.cost) best = { balloon, cost };
      }
    }
    if (best) placed.push({ spot, balloon: best.balloon });
  }
  return placed.map(({ spot, balloon }) => ({ dx: balloon.x - spot.x, dy: balloon.y - spot.y }));
}

function hindrance(
  spot: Spot,
  balloon: Spot,
  spots: readonly Spot[],
  placed: readonly { spot: Spot; balloon: Spot }[],
  room: { width: number; height: number },
): number {
  const least = balloonRadiusPx + gapPx;
  let cost = 0;
  if (balloon.x < least || balloon.y < least || balloon.x > room.width - least || balloon.y > room.height - least) {
    cost += 2000;
  }
  for (const other of spots) {
    if (other !== spot && Math.hypot(other.x - balloon.x, other.y - balloon.y) < least) cost += 300;
  }
  for (const other of placed) {
    const apart = Math.hypot(other.balloon.x - balloon.x, other.balloon.y - balloon.y);
    if (apart < 2 * balloonRadiusPx + gapPx) cost += 900;
    if (doCross(spot, balloon, other.spot, other.balloon)) cost += 200;
  }
  return cost;
}
