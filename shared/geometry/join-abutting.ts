import type { Kernel } from "./kernel.ts";
import type { Point, Polygon, Region } from "./path.ts";

/** A step and a half of the kernel's grid: as far as rounding can put a corner beside the edge it lies on. */
const touchMm = 0.0015;

/**
 * Joins regions that lie side by side, as pieces cut from each other do. Such neighbours share edges on which only one of them has
 * a corner, and rounding puts that corner a hair beside the other's edge; a plain union of crossings that small now and then drops a
 * hole. Here the corner is first put into both edges, after which they are the same edge.
 */
export function joinAbutting(kernel: Kernel, regions: readonly Region[]): Region {
  const [only] = regions;
  if (regions.length === 1 && only) return only;
  return kernel.union(withSharedCorners(regions.flat()), "nonzero");
}

/** The rings with every corner of any ring that lies on an edge, within rounding, inserted into that edge. */
export function withSharedCorners(region: Region): Region {
  const corners = region.flat();
  const byX = sortedBy(corners, (point) => point.x);
  const byY = sortedBy(corners, (point) => point.y);
  return region.map((ring) => {
    const noded: Point[] = [];
    for (const [index, from] of ring.entries()) {
      noded.push(from);
      const to = ring[(index + 1) % ring.length] ?? from;
      noded.push(...cornersOn(from, to, byX, byY));
    }
    return noded;
  });
}

type Sorted = { readonly keys: Float64Array; readonly points: readonly Point[] };

function cornersOn(from: Point, to: Point, byX: Sorted, byY: Sorted): Polygon {
  const acrossX = between(byX, from.x, to.x);
  const acrossY = between(byY, from.y, to.y);
  // Whichever direction leaves fewer corners to look at.
  const [sorted, [start, end]] = acrossX[1] - acrossX[0] <= acrossY[1] - acrossY[0] ? [byX, acrossX] : [byY, acrossY];
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const length = Math.hypot(dx, dy);
  if (length <= touchMm) return [];
  const found: { along: number; point: Point }[] = [];
  for (let index = start; index < end; index++) {
    const point = sorted.points[index];
    if (!point) continue;
    const along = ((point.x - from.x) * dx + (point.y - from.y) * dy) / length;
    const beside = ((point.x - from.x) * dy - (point.y - from.y) * dx) / length;
    if (along <= 0 || along >= length || Math.abs(beside) > touchMm) continue;
    if ((point.x === from.x && point.y === from.y) || (point.x === to.x && point.y === to.y)) continue;
    found.push({ along, point });
  }
  found.sort((a, b) => a.along - b.along || a.point.x - b.point.x || a.point.y - b.point.y);
  return found
    .map(({ point }) => point)
    .filter((point, index, list) => point.x !== list[index - 1]?.x || point.y !== list[index - 1]?.y);
}

function sortedBy(points: readonly Point[], key: (point: Point) => number): Sorted {
  const sorted = points.toSorted((a, b) => key(a) - key(b));
  return { keys: Float64Array.from(sorted, key), points: sorted };
}

/** The places of the keys that lie between two values, give or take the touch. */
function between({ keys }: Sorted, a: number, b: number): readonly [start: number, end: number] {
  return [firstOver(keys, Math.min(a, b) - touchMm), firstOver(keys, Math.max(a, b) + touchMm)];
}

function firstOver(keys: Float64Array, value: number): number {
  let low = 0;
  let high = keys.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((keys[middle] ?? 0) < value) low = middle + 1;
    else high = middle;
  }
  return low;
}
