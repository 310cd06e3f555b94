import type { Box } from "#shared/geometry/path.ts";
import type { CatchGrounds, CatchLine, LineOf } from "./catch-grounds.ts";
import { rowNeighbours } from "./row-neighbours.ts";
import { type Axis, otherAxis, type Span, spanMiddle, spanOf, spansApart } from "./span.ts";

/** A line that a moved box caught: at x = `at` or y = `at` of the board, in mm, over all that it lines up. */
export type Guide = {
  readonly axis: Axis;
  readonly at: number;
  readonly of: LineOf;
  readonly isMiddle: boolean;
  readonly along: Span;
};

export type Caught = { readonly dx: number; readonly dy: number; readonly guides: readonly Guide[] };

type Move = { readonly box: Box; readonly dx: number; readonly dy: number; readonly reachMm: number };

/**
 * By how much of the reach a line is taken as farther than it is, so that of near lines the one that is meant wins: the
 * board's before a layer's, a layer's before that of one piece, and a piece at hand before one across the board.
 */
const handicap: Readonly<Record<LineOf | "gap", number>> = {
  board: 0,
  margin: 0,
  gap: 0.1,
  layer: 0.15,
  piece: 0.2,
  grid: 0.3,
};
/** A piece that lies so many reaches away across the line has all of this handicap more. */
const farReaches = 60;
const farHandicap = 0.5;

type Candidate = { readonly by: number; readonly score: number; readonly guide: Guide | null };

/**
 * A move of `box` by dx, dy, caught on each axis by what is nearest within `reachMm`: edges and middles of the board and of
 * what rests, the margin, a place that leaves equal gaps to the neighbours, lines of the grid.
 */
export function catchGuides({ box, dx, dy, reachMm }: Move, grounds: CatchGrounds): Caught {
  const moved = { ...box, x: box.x + dx, y: box.y + dy };
  const across = nearestOn("x", moved, grounds, reachMm);
  const down = nearestOn("y", moved, grounds, reachMm);
  const [byX, byY] = [across?.by ?? 0, down?.by ?? 0];
  const at = { ...moved, x: moved.x + byX, y: moved.y + byY };
  return {
    dx: dx + byX,
    dy: dy + byY,
    guides: [across, down].flatMap((caught) => (caught?.guide ? [reaching(caught.guide, at)] : [])),
  };
}

/** A line runs over what it belongs to and over the box that it caught. */
function reaching(guide: Guide, box: Box): Guide {
  const { from, to } = spanOf(box, otherAxis(guide.axis));
  return { ...guide, along: { from: Math.min(guide.along.from, from), to: Math.max(guide.along.to, to) } };
}

function nearestOn(axis: Axis, moved: Box, grounds: CatchGrounds, reachMm: number): Candidate | null {
  const own = spanOf(moved, axis);
  const across = spanOf(moved, otherAxis(axis));
  const { edges, middles } = grounds[axis];
  const candidates = [
    ...linesNear(edges, own.from, { axis, across, reachMm, isMiddle: false }),
    ...linesNear(edges, own.to, { axis, across, reachMm, isMiddle: false }),
    ...linesNear(middles, spanMiddle(own), { axis, across, reachMm, isMiddle: true }),
    ...equalGaps(axis, moved, grounds.resting, reachMm),
    ...gridNear(axis, own, grounds, reachMm),
  ];
  let best: Candidate | null = null;
  for (const candidate of candidates)
    if (candidate.score <= reachMm && (best === null || candidate.score < best.score)) best = candidate;
  return best;
}

type Near = { readonly axis: Axis; readonly across: Span; readonly reachMm: number; readonly isMiddle: boolean };

function linesNear(lines: readonly CatchLine[], place: number, near: Near): Candidate[] {
  const { axis, across, reachMm, isMiddle } = near;
  const found: Candidate[] = [];
  for (let index = firstFrom(lines, place - reachMm); index < lines.length; index += 1) {
    const line = lines[index];
    if (line === undefined || line.at > place + reachMm) break;
    const by = line.at - place;
    const away = line.of === "piece" ? Math.min(1, spansApart(across, line.along) / (farReaches * reachMm)) : 0;
    const score = Math.abs(by) + reachMm * (handicap[line.of] + farHandicap * away);
    found.push({ by, score, guide: { axis, isMiddle, ...line } });
  }
  return found;
}

/** The index of the first line at or behind a place, by halving. */
function firstFrom(lines: readonly CatchLine[], place: number): number {
  let [low, high] = [0, lines.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((lines[middle]?.at ?? place) < place) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Between two neighbours with the same gap to both, or as far from one as that lies from the next. */
function equalGaps(axis: Axis, moved: Box, resting: readonly Box[], reachMm: number): Candidate[] {
  const { before, secondBefore, after, secondAfter } = rowNeighbours(moved, resting, axis, reachMm);
  const own = spanOf(moved, axis);
  const places: number[] = [];
  const endOf = (box: Box) => spanOf(box, axis).to;
  const startOf = (box: Box) => spanOf(box, axis).from;
  if (before && after) places.push((endOf(before) + startOf(after) - (own.to - own.from)) / 2);
  if (before && secondBefore) places.push(endOf(before) + startOf(before) - endOf(secondBefore));
  if (after && secondAfter) places.push(startOf(after) - (startOf(secondAfter) - endOf(after)) - (own.to - own.from));
  return places.map((place) => {
    const by = place - own.from;
    return { by, score: Math.abs(by) + reachMm * handicap.gap, guide: null };
  });
}

function gridNear(axis: Axis, own: Span, { gridMm, board }: CatchGrounds, reachMm: number): Candidate[] {
  if (gridMm === null || gridMm <= 0) return [];
  return [own.from, own.to].map((place) => {
    const at = Math.round(place / gridMm) * gridMm;
    const along = spanOf(board, otherAxis(axis));
    return {
      by: at - place,
      score: Math.abs(at - place) + reachMm * handicap.grid,
      guide: { axis, at, of: "grid", isMiddle: false, along },
    };
  });
}
