import { boxesOverlap, boxOfPolygon } from "./box.ts";
import { distanceToSegmentMm, ringContains } from "./contains.ts";
import type { Point, Polygon, Region } from "./path.ts";

/**
 * For each ring of a region without crossings, the rings it lies in, by index. Rings may touch in points or edges.
 * A ring never lies in itself; of two equal rings the later lies in the earlier.
 */
export function ringsAround(region: Region): number[][] {
  const boxes = region.map(boxOfPolygon);
  const byLeft = boxes.map((box, index) => ({ box, index })).sort((a, b) => a.box.x - b.box.x || a.index - b.index);
  const around: number[][] = region.map(() => []);
  for (const [place, outer] of byLeft.entries()) {
    const ring = region[outer.index] ?? [];
    // Rings that begin left of this one can't lie in it; those that begin right of its end neither.
    for (let next = firstFrom(byLeft, place); next < byLeft.length; next++) {
      const inner = byLeft[next];
      if (!inner || inner.box.x > outer.box.x + outer.box.width) break;
      if (inner.index === outer.index || !boxesOverlap(outer.box, inner.box)) continue;
      if (!boxFits(inner.box, outer.box)) continue;
      if (ringLiesIn(region[inner.index] ?? [], ring, inner.index > outer.index))
        around[inner.index]?.push(outer.index);
    }
  }
  for (const list of around) list.sort((a, b) => a - b);
  return around;
}

/** How many rings each ring of a region without crossings lies in: even numbers bound material, odd ones are holes. */
export function ringDepths(region: Region): number[] {
  return ringsAround(region).map((list) => list.length);
}

type Sized = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

function firstFrom(sorted: readonly { readonly box: Sized }[], place: number): number {
  let first = place;
  while (first > 0 && sorted[first - 1]?.box.x === sorted[place]?.box.x) first--;
  return first;
}

function boxFits(inner: Sized, outer: Sized): boolean {
  return (
    inner.x >= outer.x &&
    inner.y >= outer.y &&
    inner.x + inner.width <= outer.x + outer.width &&
    inner.y + inner.height <= outer.y + outer.height
  );
}

/** Judged by a point of the inner ring that is not on the outer one: a vertex, else the middle of an edge. */
function ringLiesIn(inner: Polygon, outer: Polygon, whenEqual: boolean): boolean {
  for (const vertex of inner) if (!isOnRing(outer, vertex)) return ringContains(outer, vertex);
  for (const [index, vertex] of inner.entries()) {
    const next = inner[(index + 1) % inner.length] ?? vertex;
    const middle = { x: (vertex.x + next.x) / 2, y: (vertex.y + next.y) / 2 };
    if (!isOnRing(outer, middle)) return ringContains(outer, middle);
  }
  return whenEqual;
}

/** Grid rounding puts a touching point up to 0.0005 mm beside the edge it lies on. */
const touchMm = 0.0015;

function isOnRing(ring: Polygon, point: Point): boolean {
  let previous = ring.at(-1);
  for (const next of ring) {
    if (previous) {
      const left = Math.min(previous.x, next.x) - touchMm;
      const right = Math.max(previous.x, next.x) + touchMm;
      const top = Math.min(previous.y, next.y) - touchMm;
      const bottom = Math.max(previous.y, next.y) + touchMm;
      if (
        point.x >= left &&
        point.x <= right &&
        point.y >= top &&
        point.y <= bottom &&
        distanceToSegmentMm(point, previous, next) <= touchMm
      )
        return true;
    }
    previous = next;
  }
  return false;
}
