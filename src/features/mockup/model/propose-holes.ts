import type { Limits } from "#shared/dry-fit/limits.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import { windowOfHole } from "#shared/dry-fit/window-of-hole.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Point } from "#shared/geometry/path.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import { isShorter } from "#shared/geometry/tolerance.ts";
import { cornerHoles } from "#shared/hardware/hole-proposals.ts";
import { holeWindowOfKind } from "#shared/hardware/hole-window-of-kind.ts";
import { panelHoleOf } from "#shared/hardware/panel-hole.ts";
import { passingDiameterMm, seenDiameterMm, usualOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Hardware, Hold, Hole, Layer, MockupDocument } from "#shared/mockup/document.ts";
import { coordinateOf, lengthOf, mostHoles } from "./limits.ts";
import { withFields } from "./same.ts";

/** Coarse: a proposal is looked at and moved, and a layer can have hundreds of pieces. */
const flatnessMm = 0.2;

type StandoffHold = Extract<Hold, { kind: "standoff" }>;

/** Where the sign will hang, and the limits that the shop works to. */
export type Site = { readonly place: "inside" | "outside"; readonly limits: Limits };
/** What a hole's window depends on besides the layer: the board under it, and the site. */
type Where = { readonly document: MockupDocument; readonly site: Site };

/**
 * Holes towards the four corners of each piece of a layer, as far out as the cap and the rule for holes near an edge
 * allow. On a layer of one piece they come nearer each other until the panel's movement leaves each of them a diameter
 * that hides. A piece too small for four gets fewer; the first hole of the layer is the fixed one.
 */
export function propose(layer: Layer, { hardware, id, ...where }: { hardware: Hardware; id: string } & Where): Hole[] {
  const { limits } = where.site;
  const window = holeWindowOfKind(panelHoleOf(hardware), {
    placingError: limits.placingErrorMm,
    cover: limits.coverMm,
    movement: 0,
  });
  const lower = window?.lower ?? passingDiameterMm(hardware);
  const widest = window ? Math.max(window.lower, window.upper) : 0;
  const seen = seenDiameterMm(hardware);
  const edge = Math.max(
    limits.edgeDiameters * widest,
    seen / 2 + 2,
    widest / 2 + limits.webThicknesses * layer.thickness,
  );
  const apart = 2 * seen;
  const regions = layer.pieces.map((piece) => placeRegion(flattenPath(piece.path, flatnessMm), piece.placement));
  const holdWith = (points: readonly Point[]): StandoffHold => {
    const holes = points
      .map(({ x, y }) => ({ x: coordinateOf(x), y: coordinateOf(y) }))
      .filter(isPoint)
      .slice(0, mostHoles)
      .map(({ x, y }, index) => ({ id: `${id}-${index + 1}`, x, y, diameter: lower, fixed: index === 0 }));
    return { kind: "standoff", hardware, offset: usualOffsetMm(hardware), holes };
  };
  // Pieces of one layer are bound to one fixed hole: coming nearer its own middle helps a single one only.
  const allHaveWindow = (points: readonly Point[]): boolean => {
    const hold = holdWith(points);
    return regions.length > 1 || hold.holes.every((hole) => hasWindow(hold, hole, where));
  };
  const constraints = { edge, apart, level: [] };
  return fitDiameters(holdWith(regions.flatMap((region) => cornerHoles(region, constraints, allHaveWindow))), where);
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
