import type { Limits } from "#shared/dry-fit/limits.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import { windowOfHole } from "#shared/dry-fit/window-of-hole.ts";
import type { Point, Region } from "#shared/geometry/path.ts";
import { isShorter } from "#shared/geometry/tolerance.ts";
import { edgeGripPlaces } from "#shared/hardware/edge-places.ts";
import { cornerHoles, type HoleConstraints, type Level, rowHoles } from "#shared/hardware/hole-proposals.ts";
import { holeWindowOfKind } from "#shared/hardware/hole-window-of-kind.ts";
import { panelHoleOf } from "#shared/hardware/panel-hole.ts";
import { passesPanel, passingDiameterMm, seenDiameterMm, usualOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Hardware, Hold, Hole, Layer, MockupDocument } from "#shared/mockup/document.ts";
import { holeGrounds, outlineOf } from "./hole-grounds.ts";
import { coordinateOf, lengthOf, mostHoles } from "./limits.ts";
import { withFields } from "./same.ts";

/** A panel's rim that stays seen round a front (our choice). */
const rimMm = 2;
/** Standoffs of a row are no further apart (our choice). */
const rowPitchMm = 300;
/** Holes this much nearer the middle are not nearer for the eye. */
const alikeMm = 1;

type StandoffHold = Extract<Hold, { kind: "standoff" }>;

/** Where the sign will hang, and the limits that the shop works to. */
export type Site = { readonly place: "inside" | "outside"; readonly limits: Limits };
/** What a hole's window depends on besides the layer: the board under it, and the site. */
type Where = { readonly document: MockupDocument; readonly site: Site };

/**
 * Places of standoffs on each piece of a layer. Where they pass the panel or are fixed to its back: towards the four
 * corners, as far out as the front and the rule for holes near an edge allow; a piece too narrow for that gets a
 * row. On a layer of one piece they come nearer each other until the panel's movement leaves each of them a diameter that
 * hides. Edge grips stand at the upper and the lower edge. None has its front or its foot on a step as long as there is
 * a place without. A piece too small for four gets fewer; the hole nearest the layer's middle is the fixed one.
 */
export function propose(layer: Layer, { hardware, id, ...where }: { hardware: Hardware; id: string } & Where): Hole[] {
  const regions = layer.pieces.map(outlineOf);
  const holdWith = (points: readonly Point[]): StandoffHold => {
    const placed = points.map(({ x, y }) => ({ x: coordinateOf(x), y: coordinateOf(y) })).filter(isPoint);
    const holes = placed.slice(0, mostHoles).map(({ x, y }, index) => ({
      id: `${id}-${index + 1}`,
      x,
      y,
      diameter: passingDiameterMm(hardware),
      fixed: false,
    }));
    const fixed = nearestMiddle(holes);
    const offset = usualOffsetMm(hardware);
    return { kind: "standoff", hardware, offset, holes: holes.map((hole) => ({ ...hole, fixed: hole.id === fixed })) };
  };
  // Pieces of one layer are bound to one fixed hole: coming nearer its own middle helps a single one only.
  const allHaveWindow = (points: readonly Point[]): boolean => {
    const hold = holdWith(points);
    return regions.length > 1 || hold.holes.every((hole) => hasWindow(hold, hole, where));
  };
  const room = roomOf(hardware, layer, where.site.limits);
  const { document } = where;
  const { capClearanceMm: clearanceMm } = where.site.limits;
  const grounds = holeGrounds(layer, { hardware, document, clearanceMm, reach: room.reach });
  const points = regions.flatMap((region) => {
    const on = (level: readonly Level[]) => placesOn(region, hardware, { ...room, level }, allHaveWindow);
    const most = grounds(region)
      .map(on)
      .reduce<Point[]>((best, one) => (one.length > best.length ? one : best), []);
    return most.length > 0 ? most : on([]);
  });
  return fitDiameters(holdWith(points), where);
}

/** What a standoff asks for round it on a piece, mm, and how far outside the piece it may stand. */
function roomOf(hardware: Hardware, layer: Layer, limits: Limits): Omit<HoleConstraints, "level"> & { reach: number } {
  const seen = seenDiameterMm(hardware);
  const apart = 2 * seen;
  if (!passesPanel(hardware))
    return { edge: hardware.barrelDiameter / 2 + rimMm, apart, reach: hardware.barrelDiameter };
  const window = holeWindowOfKind(panelHoleOf(hardware), {
    placingError: limits.placingErrorMm,
    cover: limits.coverMm,
    movement: 0,
  });
  const widest = window ? Math.max(window.lower, window.upper) : 0;
  const edge = Math.max(
    limits.edgeDiameters * widest,
    seen / 2 + rimMm,
    widest / 2 + limits.webThicknesses * layer.thickness,
  );
  return { edge, apart, reach: 0 };
}

function placesOn(
  region: Region,
  hardware: Hardware,
  constraints: HoleConstraints,
  fits: (points: readonly Point[]) => boolean,
): Point[] {
  if (hardware.kind === "edgeGrip") return edgeGripPlaces(region, hardware, constraints.level);
  const corners = cornerHoles(region, constraints, fits);
  if (corners.length > 2) return corners;
  const row = rowHoles(region, constraints, rowPitchMm, fits);
  return row.length >= corners.length ? row : corners;
}

/** The hole nearest the middle of them all, of about equally near ones the first; undefined for none. */
function nearestMiddle(holes: readonly Hole[]): string | undefined {
  const x = holes.reduce((sum, hole) => sum + hole.x, 0) / holes.length;
  const y = holes.reduce((sum, hole) => sum + hole.y, 0) / holes.length;
  const far = (hole: Hole): number => Math.hypot(hole.x - x, hole.y - y);
  const least = Math.min(...holes.map(far));
  return holes.find((hole) => far(hole) <= least + alikeMm)?.id;
}

function hasWindow(hold: StandoffHold, hole: Hole, where: Where): boolean {
  const window = windowOn(where, hold, hole);
  return !window || !isShorter(window.upper, window.lower);
}

/**
 * The holes of a layer with diameters in mm that have play and hide under the cap: the middle of each hole's window, to a
 * tenth, and the least of it for the fixed one. Where no hole can do both it hides, and the dry fit says what is missing.
 */
export function fitDiameters(hold: StandoffHold, where: Where): Hole[] {
  return hold.holes.map((hole) => {
    const window = windowOn(where, hold, hole);
    if (!window) return hole;
    const { lower, upper } = window;
    // The fixed hole holds the place, so it has the least play there is.
    const wanted = hole.fixed ? lower : Math.round(((lower + upper) / 2) * 10) / 10;
    return withFields(hole, { diameter: lengthOf(Math.min(upper, Math.max(lower, wanted))) ?? hole.diameter });
  });
}

function windowOn({ document, site: { place, limits } }: Where, hold: StandoffHold, hole: Hole) {
  return windowOfHole(hold, hole, { document, limits, context: { ...usualContext, place } });
}

function isPoint(place: { x: number | null; y: number | null }): place is Point {
  return place.x !== null && place.y !== null;
}
