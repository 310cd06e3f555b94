import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { boxOfPolygon } from "../geometry/box.ts";
import type { Point, Polygon, Region } from "../geometry/path.ts";
import { clipConvex } from "./clip-convex.ts";
import { slopeOf } from "./half-board.ts";
import { alongSlats, fromSlats, type Side, stripEdges } from "./sides.ts";
import type { Slat, SlatCut, SlatDesign } from "./slat-layout.ts";

/** How far the kernel's grid may put a corner beside the line it was cut on, mm. */
const besideMm = 0.003;

/** A cut across a slat, by where it meets the edges of the strip's parts. In the slats' own axes. */
type End = { readonly lower: Point; readonly upper: Point; readonly straight: boolean };

/**
 * The slat that a strip's parts are cut out of, on a board that is no rectangle. An end that meets one straight edge is cut
 * along it; one that meets a curve, a corner or several edges is cut square past them; at a spine it is mitred whatever else
 * it meets.
 */
export function outlineSlat(
  parts: { readonly strip: number; readonly laid: readonly Region[]; readonly trimmed: Region },
  side: Side,
  design: SlatDesign,
): Omit<Slat, "order"> {
  const { angle } = design;
  const toSlat = (ring: Polygon) => ring.map((point) => alongSlats(side.fromBoard(point), angle));
  const toBoard = (point: Point) => side.toBoard(fromSlats(point, angle));
  const rings = parts.laid.flat().map(toSlat);
  const box = boxOfPolygon(rings.flat());
  const [from, to] = stripEdges(parts.strip, side, design);
  const ends = {
    near: endOf(rings, -1) ?? square(box.x, from, to),
    far: endOf(rings, 1) ?? square(box.x + box.width, from, to),
  };
  const cut = cutBetween(box, [from, to], ends, side, angle);
  const { x: start, width: longPoint } = boxOfPolygon(cut);
  const middle = (along: number) => toBoard({ x: along, y: (from + to) / 2 });
  const untrimmed = cut.map(toBoard);
  const left = boxOfPolygon(parts.trimmed.flatMap(toSlat));
  const trimmedAway = regionAreaMm2([untrimmed]) - regionAreaMm2(parts.trimmed);
  return {
    strip: parts.strip,
    side: side.name,
    untrimmed,
    trimmed: parts.trimmed,
    isTrimmed: trimmedAway > besideMm * regionPerimeterMm([untrimmed]),
    axis: { from: middle(start), to: middle(start + longPoint) },
    longPoint,
    shortPoint: Math.min(edgeLength(cut, from), edgeLength(cut, to)),
    trimmedLongPoint: left.width,
    trimmedWidth: left.height,
    near: nearCuts(ends.near, rings, side, design),
    far: [outlineCut(ends.far, design)],
  };
}

const square = (along: number, from: number, to: number): End => ({
  lower: { x: along, y: from },
  upper: { x: along, y: to },
  straight: false,
});

/** The one straight edge that closes a strip's parts at an end (−1 the near one, 1 the far one); null when there is none. */
function endOf(rings: readonly Polygon[], sign: 1 | -1): End | null {
  const [ring, second] = rings;
  if (!ring || second) return null;
  const { y, height } = boxOfPolygon(ring);
  const [lower, upper] = [outermost(ring, y, sign), outermost(ring, y + height, sign)];
  const apart = Math.abs(lower - upper);
  if (apart !== 1 && apart !== ring.length - 1) return null;
  const [a, b] = [ring[lower], ring[upper]];
  return a && b ? { lower: a, upper: b, straight: true } : null;
}

/** Of a ring's corners at a place across the slats, the one farthest to an end, by index. */
function outermost(ring: Polygon, across: number, sign: 1 | -1): number {
  return ring.reduce((best, point, index) => {
    if (Math.abs(point.y - across) > besideMm) return best;
    const than = ring[best];
    return than && (point.x - than.x) * sign <= 0 ? best : index;
  }, -1);
}

/** The strip from one end's cut to the other's, and to the spine where there is one. In the slats' own axes. */
function cutBetween(
  { x, width }: { readonly x: number; readonly width: number },
  [from, to]: readonly [number, number],
  { near, far }: { readonly near: End; readonly far: End },
  side: Side,
  angle: number,
): Polygon {
  // Long enough for cuts of the flattest slope to cross the whole strip.
  const room = width + 10 * (to - from) + 1;
  const strip = [
    { x: x - room, y: from },
    { x: x + width + room, y: from },
    { x: x + width + room, y: to },
    { x: x - room, y: to },
  ];
  const beyond = ({ lower, upper }: End, sign: 1 | -1) => {
    const [a, b] = [sign * (upper.y - lower.y), sign * (lower.x - upper.x)];
    return { a, b, limit: a * lower.x + b * lower.y };
  };
  const cut = clipConvex(clipConvex(strip, beyond(near, -1)), beyond(far, 1));
  const { sin, cos } = slopeOf(angle);
  return side.name === "whole" ? cut : clipConvex(cut, { a: -sin, b: cos, limit: 0 });
}

/** A spine is met where corners lie on it; a square cut past a curve beside it is one more. */
function nearCuts(near: End, rings: readonly Polygon[], side: Side, design: SlatDesign): readonly SlatCut[] {
  const atSpine = rings.flat().filter((point) => fromSlats(point, design.angle).x < besideMm).length;
  if (side.name === "whole" || atSpine < 2) return [outlineCut(near, design)];
  const mitre: SlatCut = { edge: "spine", setting: 90 - design.angle, mustFit: true };
  return near.straight ? [mitre] : [outlineCut(near, design), mitre];
}

function outlineCut({ lower, upper }: End, { overhang }: SlatDesign): SlatCut {
  const setting = (Math.atan2(Math.abs(upper.x - lower.x), upper.y - lower.y) * 180) / Math.PI;
  return { edge: "outline", setting, mustFit: overhang === 0 };
}

function edgeLength(cut: Polygon, across: number): number {
  const on = cut.filter((point) => Math.abs(point.y - across) <= besideMm).map(({ x }) => x);
  return on.length < 2 ? 0 : Math.max(...on) - Math.min(...on);
}
