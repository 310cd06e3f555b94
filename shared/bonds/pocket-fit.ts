import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";
import { checked, type Outcome, type Range, spanRange } from "../units/outcome.ts";

/** A piece goes in and does not rattle with a gap between these, per side, mm (common practice). */
export const pocketGap = { least: 0.05, most: 0.25 } as const;

const kerfRange: Range = { least: 0, most: 10 };

export type PocketGap = { readonly gapMm: number; readonly verdict: "tight" | "fits" | "loose" };

/**
 * Gap per side in mm between a piece and its pocket: the clearance drawn, and half of each kerf where the cutter follows
 * the line (0 where its path is already set off by half a kerf). Arithmetic; its limits are common practice.
 */
export function pocketGapMm(fit: {
  readonly clearance: number;
  readonly pieceKerf: number;
  readonly pocketKerf: number;
}): Outcome<PocketGap> {
  const { clearance, pieceKerf, pocketKerf } = fit;
  return checked(
    { clearance: [clearance, spanRange], pieceKerf: [pieceKerf, kerfRange], pocketKerf: [pocketKerf, kerfRange] },
    () => {
      const gapMm = clearance + pieceKerf / 2 + pocketKerf / 2;
      const verdict = isShorter(gapMm, pocketGap.least) ? "tight" : isShorter(pocketGap.most, gapMm) ? "loose" : "fits";
      return { gapMm, verdict };
    },
  );
}

/** What the grid and the flattening leave over, mm per side. */
const slackMm = 0.03;
/** Corners that bind by less than this, in mm², come from rounding. */
const smallestMm2 = 0.002;

/**
 * Where a piece does not go into a pocket that a round bit of that radius in mm has cut: the bit can't follow a corner of
 * the piece that is sharper than its radius, unless the gap makes up for it. Ordered as the piece's outline runs; none
 * when it goes in all round.
 */
export function bindingCorners(piece: Region, gapMm: number, bitRadiusMm: number, kernel: Kernel): Point[] {
  if (piece.length === 0 || !(bitRadiusMm > 0)) return [];
  const pocket = kernel.offset(piece, gapMm, "round");
  const cut = kernel.offset(kernel.offset(pocket, -bitRadiusMm, "round"), bitRadiusMm + slackMm, "round");
  return connectedPieces(kernel.difference(piece, cut))
    .filter((part) => regionAreaMm2(part) > smallestMm2)
    .map((part) => regionCentroid(part))
    .filter((place) => place !== null);
}
