import { regionAreaMm2 } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { ringDepths } from "../geometry/ring-depths.ts";
import { coveredBy, type Outline, type Shaped, shapedFromRegion } from "./shaped.ts";

export type MarginChoice = {
  readonly marginMm: number;
  readonly corners: "round" | "sharp";
  /** Openings of the shapes, and what they leave between them: cut through, as far as the margin leaves any, or filled. */
  readonly openings: "filled" | "kept";
};

/** A sharp corner reaches no farther than this many margins: one under 29° is cut off square. */
export const sharpestCornerDegrees = 2 * ((180 / Math.PI) * Math.asin(1 / 4));

/** A plate that follows shapes at a distance; figures mm and mm². */
export type MarginPlate = {
  /** One for each region that hangs together. */
  readonly plates: readonly Shaped[];
  readonly widthMm: number;
  readonly heightMm: number;
  readonly areaMm2: number;
};

/** The plate, or plates where the shapes lie far apart, round outlines at a margin outside them. Null when they cover nothing. */
export function marginPlate(
  outlines: readonly Outline[],
  { marginMm, corners, openings }: MarginChoice,
  kernel: Kernel,
): MarginPlate | null {
  const shapes = kernel.union(
    outlines.flatMap((outline) => coveredBy(outline, kernel)),
    "nonzero",
  );
  const grown = kernel.offset(shapes, marginMm, corners === "round" ? "round" : "mitre");
  const depths = ringDepths(grown);
  const plate = openings === "kept" ? grown : grown.filter((_, index) => depths[index] === 0);
  const box = boxOfRegion(plate);
  if (!box) return null;
  return {
    plates: connectedPieces(plate).flatMap((region) => shapedFromRegion(region) ?? []),
    widthMm: box.width,
    heightMm: box.height,
    areaMm2: regionAreaMm2(plate),
  };
}
