import { boxesOverlap } from "../geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Box, Point, Region } from "../geometry/path.ts";
import { circlePath } from "../geometry/shapes.ts";
import { isShorter } from "../geometry/tolerance.ts";
import { capFootprint, liesWhollyOn } from "../hardware/cap-footprint.ts";
import { type OverPanel, overPanel } from "../hardware/over-panel.ts";
import type { Hole, Piece } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { Banded } from "../units/banded.ts";
import type { RuleInput } from "./rule.ts";
import { footHeightMm, pieceAt, type StandoffHold, type StandoffLayer } from "./standoff-layers.ts";
import { layersWithFigures, pieceWordsWithin } from "./words.ts";

/** Something outward of a panel's face: a piece, or the barrel of another panel that stands on it. */
export type Thing = {
  readonly id: string;
  /** Null for a barrel. */
  readonly pieceId: string | null;
  readonly words: string;
  readonly region: Region;
  readonly box: Box;
  readonly bottom: number;
  readonly top: Banded;
  /** Held up by standoffs, so that a cap fits under it if it is high enough. */
  readonly raised: boolean;
};

/** Layers outward of one, with their pieces' figures. */
type Outward = ReturnType<typeof layersWithFigures>;

/** For the pieces of the layer at `level`, what stands outward of the face of each and over it, in document order. */
export function thingsOver(
  input: Pick<RuleInput, "document" | "figures">,
  level: number,
): (piece: PieceFigures) => readonly Thing[] {
  const outward = layersWithFigures(input).slice(level + 1);
  const known = new Map<string, readonly Thing[]>();
  return (piece) => {
    const things = known.get(piece.pieceId) ?? thingsOn(piece, outward);
    known.set(piece.pieceId, things);
    return things;
  };
}

function thingsOn(piece: PieceFigures, outward: Outward): Thing[] {
  const face = piece.top.nominal;
  return outward.flatMap(({ layer, pieces }) => {
    const over = pieces.filter(({ figures }) => figures.areaMm2 > 0 && boxesOverlap(figures.box, piece.box));
    const raised = layer.hold.kind === "standoff";
    const higher = over.filter(({ figures }) => isShorter(face, figures.top.nominal));
    const things = higher.map(({ piece: one, figures }) => thingOf(pieceWordsWithin(layer, one), one, figures, raised));
    const { hold } = layer;
    if (hold.kind !== "standoff") return things;
    return [...things, ...over.flatMap(({ figures }) => barrelsOn(face, layer.key, hold, figures))];
  });
}

function thingOf(words: string, piece: Piece, figures: PieceFigures, raised: boolean): Thing {
  const { region, box, bottom, top } = figures;
  return { id: piece.id, pieceId: piece.id, words, region, box, bottom: bottom.nominal, top, raised };
}

function barrelsOn(face: number, key: string, hold: StandoffHold, piece: PieceFigures): Thing[] {
  const foot = footHeightMm(hold, piece);
  if (isShorter(foot, face) || isShorter(face, foot)) return [];
  const radius = hold.hardware.barrelDiameter / 2;
  return hold.holes.map((hole) => ({
    id: hole.id,
    pieceId: null,
    words: `a barrel of ${key}`,
    region: flattenPath(circlePath(hole, radius)),
    box: { x: hole.x - radius, y: hole.y - radius, width: 2 * radius, height: 2 * radius },
    bottom: foot,
    top: piece.bottom,
    raised: false,
  }));
}

/** How a standoff's front lies at a place of its panel. */
export type FrontPlace = {
  readonly front: OverPanel | null;
  /** What lies between the panel's back and the front: the panel, and what the front lies on wholly. */
  readonly stack: Banded;
  /** What it would stand on with a part only, with how deep that must be notched to clear it, mm. */
  readonly over: readonly { readonly thing: Thing; readonly notchMm: number }[];
  /** What is raised over it, but not high enough. */
  readonly under: readonly Thing[];
};

/**
 * How the front of a standoff lies at `place` on its panel, by `things` over the panel. A front that lies wholly on a
 * piece bonded there stands that much higher; a slot takes the panel alone.
 */
export function frontAt(
  place: Point,
  {
    hold,
    piece,
    things,
    clearanceMm,
  }: { hold: StandoffHold; piece: PieceFigures; things: readonly Thing[]; clearanceMm: number },
): FrontPlace {
  const front = overPanel(hold.hardware, piece.top.nominal - footHeightMm(hold, piece));
  const panel = between(piece.bottom, piece.top);
  if (!front) return { front, stack: panel, over: [], under: [] };
  const disc = { x: place.x, y: place.y, diameter: front.diameter };
  const reach = front.diameter / 2 + clearanceMm;
  const around = { x: place.x - reach, y: place.y - reach, width: 2 * reach, height: 2 * reach };
  const near = things.filter((thing) => boxesOverlap(thing.box, around));
  const lying = near.filter((thing) => !thing.raised);
  let base = piece.top;
  if (front.what !== "grip") {
    for (const thing of lying.toSorted((a, b) => a.bottom - b.bottom)) {
      const higher = isShorter(base.nominal, thing.top.nominal) && !isShorter(base.nominal, thing.bottom);
      if (higher && liesWhollyOn(disc, thing.region)) base = thing.top;
    }
  }
  const top = base.nominal + front.heightMm;
  const beside = lying.filter((thing) => isShorter(thing.bottom, top) && isShorter(base.nominal, thing.top.nominal));
  const low = near.filter(({ raised, bottom }) => raised && isShorter(bottom, top));
  const over = beside.flatMap((thing) => {
    const footprint = capFootprint(disc, [thing], clearanceMm);
    if (footprint.kind === "several levels") return footprint.over.map(({ notchMm }) => ({ thing, notchMm }));
    return footprint.on === null ? [] : [{ thing, notchMm: distanceToRegionEdgeMm(thing.region, place) + reach }];
  });
  return { front, stack: between(piece.bottom, base), over, under: low.filter(({ region }) => isOver(disc, region)) };
}

/** A standoff that holds a piece, with what lies between its barrel and its front. */
export type HeldPlace = { readonly hole: Hole; readonly piece: PieceFigures; readonly stack: Banded };

/** Every standoff of a layer that holds a piece, in the order of its holes. */
export function heldPlaces(
  standing: StandoffLayer,
  input: Pick<RuleInput, "document" | "figures" | "limits">,
): HeldPlace[] {
  const { hold, level } = standing;
  const over = thingsOver(input, level);
  return hold.holes.flatMap((hole) => {
    const piece = pieceAt(standing, hole);
    if (!piece) return [];
    const { stack } = frontAt(hole, { hold, piece, things: over(piece), clearanceMm: input.limits.capClearanceMm });
    return [{ hole, piece, stack }];
  });
}

function isOver(disc: Hole | (Point & { diameter: number }), region: Region): boolean {
  return regionContains(region, disc) || isShorter(distanceToRegionEdgeMm(region, disc), disc.diameter / 2);
}

/** The sheets between two heights of one stack: both bands grow from the same ground. */
function between(lower: Banded, upper: Banded): Banded {
  return {
    nominal: upper.nominal - lower.nominal,
    least: upper.least - lower.least,
    most: upper.most - lower.most,
  };
}
