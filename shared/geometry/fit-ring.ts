import { signedRingArea } from "./area.ts";
import { fitCurves } from "./fit-curves.ts";
import { flattenRing } from "./flatten.ts";
import type { Point, Polygon, Ring, Segment } from "./path.ts";
import { polygonRing } from "./shapes.ts";

/** A turn of more than this is a corner: no curve flattened finely enough to be fitted again bends so much at a point. */
const cornerRadians = (30 * Math.PI) / 180;
/** A straight edge and a curve that meet at less than this were drawn to run into each other. */
const tangentRadians = (8 * Math.PI) / 180;

/**
 * A finely flattened ring as lines and cubics that pass within `toleranceMm` of its points: corners and straight edges stay
 * what they are, points that follow a curve become few cubics. A ring that is all corners, or whose area the curves
 * would change by more than the tolerance along its edge, keeps its straight edges. Throws a RangeError for fewer than three points.
 */
export function fitRing(ring: Polygon, toleranceMm: number): Ring {
  if (ring.length < 6) return polygonRing(ring);
  const breaks = breaksOf(ring, toleranceMm);
  const starts = breaks.length > 0 ? breaks : quarters(ring);
  const segments: Segment[] = [];
  for (const [place, from] of starts.entries()) {
    const next = starts[(place + 1) % starts.length] ?? from;
    // Back to the same place means once around.
    const steps = (next.index - from.index + ring.length) % ring.length || ring.length;
    const run = Array.from({ length: steps + 1 }, (_, step) => pointAt(ring, from.index + step));
    segments.push(...fitCurves(run, { toleranceMm, start: from.after, end: next.before && minus(next.before) }));
  }
  const fitted: Ring = { start: pointAt(ring, starts[0]?.index ?? 0), segments };
  const area = Math.abs(signedRingArea(flattenRing(fitted, toleranceMm)) - signedRingArea(ring));
  return area > toleranceMm * perimeter(ring) ? polygonRing(ring) : fitted;
}

/** Where the outline must not be smoothed over, with the directions it has there when a straight edge gives them. */
type Break = { readonly index: number; readonly before: Point | null; readonly after: Point | null };

function breaksOf(ring: Polygon, toleranceMm: number): Break[] {
  const turns = ring.map((point, index) => turn(pointAt(ring, index - 1), point, pointAt(ring, index + 1)));
  const turnAt = (index: number) => turns[(index + ring.length) % ring.length] ?? 0;
  // A chord of a smooth curve leaves it by about length × turn / 8, which flattening keeps within its tolerance.
  const straight = ring.map((point, index) => {
    const length = distance(point, pointAt(ring, index + 1));
    return (length * Math.max(turnAt(index), turnAt(index + 1))) / 8 > 3 * toleranceMm;
  });
  const breaks: Break[] = [];
  for (let index = 0; index < ring.length; index++) {
    const before = straight[(index + ring.length - 1) % ring.length];
    const after = straight[index];
    if (turnAt(index) <= cornerRadians && !before && !after) continue;
    // Where a straight edge runs into a curve, the curve starts in the edge's direction.
    const runsOn = turnAt(index) < tangentRadians;
    breaks.push({
      index,
      before: runsOn && after ? direction(pointAt(ring, index), pointAt(ring, index + 1)) : null,
      after: runsOn && before ? direction(pointAt(ring, index - 1), pointAt(ring, index)) : null,
    });
  }
  return breaks;
}

/** Four places about as far apart along a ring without corners, each with the one direction in which the ring passes it. */
function quarters(ring: Polygon): Break[] {
  const quarter = perimeter(ring) / 4;
  const found: Break[] = [];
  let travelled = 0;
  for (let index = 0; index < ring.length && found.length < 4; index++) {
    if (travelled >= found.length * quarter) {
      const passing = direction(pointAt(ring, index - 1), pointAt(ring, index + 1));
      found.push({ index, before: passing, after: passing });
    }
    travelled += distance(pointAt(ring, index), pointAt(ring, index + 1));
  }
  return found;
}

function turn(a: Point, b: Point, c: Point): number {
  const cross = (b.x - a.x) * (c.y - b.y) - (b.y - a.y) * (c.x - b.x);
  const dot = (b.x - a.x) * (c.x - b.x) + (b.y - a.y) * (c.y - b.y);
  return Math.abs(Math.atan2(cross, dot));
}

function pointAt(ring: Polygon, index: number): Point {
  const point = ring[(index + ring.length) % ring.length];
  if (!point) throw new RangeError("A ring needs points.");
  return point;
}

function perimeter(ring: Polygon): number {
  return ring.reduce((sum, point, index) => sum + distance(point, pointAt(ring, index + 1)), 0);
}

function direction(from: Point, to: Point): Point {
  const length = distance(from, to) || 1;
  return { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
}

const distance = (a: Point, b: Point) => Math.hypot(b.x - a.x, b.y - a.y);
const minus = ({ x, y }: Point): Point => ({ x: -x, y: -y });
