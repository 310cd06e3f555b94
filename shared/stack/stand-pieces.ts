import { pocketDepthToleranceMm } from "../bonds/pocket-floor.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { sheetBand } from "../materials/sheet-tolerance.ts";
import type { Hold, Hole, Layer, MockupDocument, Piece } from "../mockup/document.ts";
import { type Banded, bandHighest, bandSum, exactly } from "../units/banded.ts";
import { backerThicknessMm, faceRegion } from "./backer.ts";
import { holdsPiece } from "./held-piece.ts";
import { discsRegion, pieceRegion } from "./piece-region.ts";
import { areasTouch, type Spread, spreadOf } from "./touching.ts";

/** A piece at its height. */
export type StandingPiece = Spread & {
  readonly piece: Piece;
  readonly layer: Layer;
  /** Place of its layer, from the wall outward. */
  readonly level: number;
  /** Holes of its layer that are drilled in it. */
  readonly holes: readonly Hole[];
  /** Keys of what it stands on, highest first. */
  readonly restsOn: readonly string[];
  /** Top of the highest thing under it. */
  readonly base: Banded;
  readonly bottom: Banded;
  readonly top: Banded;
};

/** The face of the backer above its back. Boards are planed to their thickness, so their band is nothing. */
export function backerTopOf(document: MockupDocument): Banded {
  return exactly(backerThicknessMm(document.backer));
}

/**
 * Every piece of the document at its height, layer by layer from the wall outward. A bonded piece stands on the highest
 * thing under it, a piece in a pocket that depth lower, a piece on standoffs the offset above what its barrels stand on
 * (or, as long as it has no holes, above the highest thing under it). A piece over nothing is taken as standing on the
 * plane of the backer's face.
 */
export function standPieces(document: MockupDocument, kernel: Kernel): StandingPiece[] {
  const backerTop = backerTopOf(document);
  const board = spreadOf(faceRegion(document, kernel));
  const standing: StandingPiece[] = [];
  for (const [level, layer] of document.layers.entries()) {
    const below = standing.slice();
    for (const piece of layer.pieces) {
      const region = pieceRegion(piece, kernel);
      const holes = heldBy(layer.hold, region);
      const foot = footOf(layer.hold, holes, region, kernel);
      const under = thingsUnder(foot, below, { region: board, top: backerTop }, kernel);
      const base = bandHighest(under.map((thing) => thing.top)) ?? backerTop;
      const bottom = bandSum(base, rise(layer.hold));
      const top = bandSum(bottom, sheetBand(layer.stock.process, layer.thickness));
      const restsOn = under.map((thing) => thing.key);
      standing.push({ ...spreadOf(region), piece, layer, level, holes, restsOn, base, bottom, top });
    }
  }
  return standing;
}

function heldBy(hold: Hold, region: Spread["region"]): readonly Hole[] {
  return hold.kind === "standoff" ? hold.holes.filter((hole) => holdsPiece(hold.hardware, region, hole)) : [];
}

/** How far a hold lifts a piece over what it stands on. */
export function rise(hold: Hold): Banded {
  switch (hold.kind) {
    case "bond":
      return exactly(0);
    case "pocket":
      return {
        nominal: -hold.depth,
        least: -hold.depth - pocketDepthToleranceMm,
        most: -hold.depth + pocketDepthToleranceMm,
      };
    case "standoff":
      return exactly(hold.offset);
  }
}

/** Where a piece meets what is under it: its barrels' feet, or all of it. */
function footOf(hold: Hold, holes: readonly Hole[], region: Spread["region"], kernel: Kernel): Spread {
  if (hold.kind !== "standoff" || holes.length === 0) return spreadOf(region);
  const feet = holes.map(({ x, y }) => ({ x, y, diameter: hold.hardware.barrelDiameter }));
  return spreadOf(discsRegion(feet, kernel));
}

/** Layers and backer under a foot, each with the highest of its tops there; highest first, of equals the outer one. */
function thingsUnder(
  foot: Spread,
  below: readonly StandingPiece[],
  board: { readonly region: Spread; readonly top: Banded },
  kernel: Kernel,
): { readonly key: string; readonly top: Banded }[] {
  const tops = new Map<string, { top: Banded; level: number }>();
  if (areasTouch(foot, board.region, kernel)) tops.set("A", { top: board.top, level: -1 });
  for (const { layer, level, top, ...spread } of below) {
    if (!areasTouch(foot, spread, kernel)) continue;
    const known = tops.get(layer.key);
    tops.set(layer.key, { top: known ? (bandHighest([known.top, top]) ?? top) : top, level });
  }
  return [...tops]
    .map(([key, { top, level }]) => ({ key, top, level }))
    .sort((a, b) => b.top.nominal - a.top.nominal || b.level - a.level)
    .map(({ key, top }) => ({ key, top }));
}
