import type { Point } from "../geometry/path.ts";
import { EdgeGrid, type Heading, headings, outside, turned } from "./edge-walk.ts";
import type { Labels } from "./label-pixels.ts";
import { shareOf } from "./pixel-areas.ts";

/**
 * A border between two areas from junction to junction, or once around when it has none. `points` lie on it, one for each pixel side,
 * the junctions not among them, in pixels from the picture's upper left corner. On the picture's rim they are grid corners.
 */
export type Edge = {
  readonly from: number | null;
  readonly to: number | null;
  readonly leaving: Heading;
  readonly arriving: Heading;
  readonly points: readonly Point[];
  /** A pixel of the area on either side, seen from `from`; −1 outside the picture. */
  readonly left: number;
  readonly right: number;
};

/** All borders of a picture, each once: both areas take their outline from the same one, so that they neither overlap nor gap. */
export function traceEdges(labels: Labels): { readonly grid: EdgeGrid; readonly edges: readonly Edge[] } {
  const grid = new EdgeGrid(labels);
  const walked = new Uint8Array(grid.corners * 2);
  const edges: Edge[] = [];
  const junctions: number[] = [];
  const starts: number[] = [];
  for (let corner = 0; corner < grid.corners; corner++) {
    const east = grid.hasEdge(corner, 0);
    const south = grid.hasEdge(corner, 1);
    if (!east && !south && !grid.hasEdge(corner, 2)) continue;
    if (grid.isJunction(corner)) junctions.push(corner);
    else if (east) starts.push(corner);
  }
  for (const corner of junctions)
    for (const heading of headings)
      if (grid.hasEdge(corner, heading) && walked[sideOf(grid, corner, heading)] !== 1)
        edges.push(walk(grid, walked, corner, heading, corner));
  // What is left are borders without a junction, and each of those runs east or west somewhere.
  for (const corner of starts)
    if (walked[sideOf(grid, corner, 0)] !== 1) edges.push(walk(grid, walked, corner, 0, null));
  return { grid, edges };
}

function walk(grid: EdgeGrid, walked: Uint8Array, start: number, leaving: Heading, from: number | null): Edge {
  const points: Point[] = [];
  const left = grid.leftPixel(start, leaving);
  const right = grid.rightPixel(start, leaving);
  const onRim = left === outside || right === outside;
  let corner = start;
  let heading = leaving;
  for (;;) {
    walked[sideOf(grid, corner, heading)] = 1;
    const next = grid.step(corner, heading);
    if (!onRim) points.push(crossing(grid, corner, heading));
    const onward = grid.passOn(next, heading);
    const closed = from === null && next === start;
    if (onRim && (closed || onward !== null)) points.push(cornerPoint(grid, next));
    if (closed) return { from: null, to: null, leaving, arriving: heading, points, left, right };
    if (onward === null) return { from, to: next, leaving, arriving: heading, points, left, right };
    corner = next;
    heading = onward;
  }
}

/** Every side of a pixel once, whichever way it is walked. */
function sideOf(grid: EdgeGrid, corner: number, heading: Heading): number {
  const first = heading < 2 ? corner : grid.step(corner, heading);
  return first * 2 + (heading % 2);
}

/** Between the middles of the two pixels, where as much of the one colour is mixed in as of the other. */
function crossing(grid: EdgeGrid, corner: number, heading: Heading): Point {
  const { labels } = grid;
  const right = grid.rightPixel(corner, heading);
  const left = grid.leftPixel(corner, heading);
  const a = grid.labelOf(right);
  const b = grid.labelOf(left);
  const atRight = shareOf(labels, right, a) - shareOf(labels, right, b);
  const atLeft = shareOf(labels, left, b) - shareOf(labels, left, a);
  const sum = atRight + atLeft;
  const along = sum > 0 ? Math.max(0.02, Math.min(0.98, atRight / sum)) : 0.5;
  const from = pixelMiddle(labels, right);
  const to = pixelMiddle(labels, left);
  return { x: from.x + along * (to.x - from.x), y: from.y + along * (to.y - from.y) };
}

const pixelMiddle = ({ width }: Labels, pixel: number): Point => ({
  x: (pixel % width) + 0.5,
  y: Math.floor(pixel / width) + 0.5,
});

/** Where a corner of the grid lies, in pixels. */
export const cornerPoint = ({ columns }: EdgeGrid, corner: number): Point => ({
  x: corner % columns,
  y: Math.floor(corner / columns),
});

/** The way back along an edge. */
export const reversedEdge = (edge: Edge): Edge => ({
  from: edge.to,
  to: edge.from,
  leaving: turned(edge.arriving, 2),
  arriving: turned(edge.leaving, 2),
  points: edge.points.toReversed(),
  left: edge.right,
  right: edge.left,
});
