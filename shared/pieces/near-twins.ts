import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { centred, isWithin } from "./same-outline.ts";

/** A piece with its outline on the board, as the kernel gives it. */
export type TwinPiece = { readonly id: string; readonly region: Region };

export type NearTwins =
  /** It goes into its own place turned by 180° and looks right, but is not. */
  | { readonly kind: "turned"; readonly id: string }
  /** Each goes into the other's place and looks right, but is not; `turn` is 180 when only upside down. */
  | { readonly kind: "exchanged"; readonly ids: readonly [string, string]; readonly turn: 0 | 180 };

export type TwinLimits = {
  /** Outlines that differ by no more than this are the same piece: exchanging them changes nothing. */
  readonly sameMm: number;
  /** Up to this much, or this share of the longer side, an eye takes one for the other. */
  readonly alikeMm: number;
  readonly alikeShare: number;
};

/** Our choice: half a millimetre a side is what 20 and 21 mm discs differ by. */
export const usualTwinLimits: TwinLimits = { sameMm: 0.1, alikeMm: 0.75, alikeShare: 0.04 };

/**
 * Pieces of one stock that are alike but not the same: on their own turned by 180° (H, S, 8), or one in another's place.
 * In the order of the pieces. Pieces are compared with the middles of their boxes on each other.
 */
export function nearTwins(
  pieces: readonly TwinPiece[],
  kernel: Kernel,
  limits: TwinLimits = usualTwinLimits,
): NearTwins[] {
  const shapes = pieces.flatMap(({ id, region }) => shapeOf(id, region));
  const found: NearTwins[] = [];
  for (const [index, one] of shapes.entries()) {
    if (areNear(one.upright, one.turned, alikeMm(one, limits), limits, kernel))
      found.push({ kind: "turned", id: one.id });
    for (const other of shapes.slice(index + 1)) {
      const alike = Math.min(alikeMm(one, limits), alikeMm(other, limits));
      if (!sizesAreAlike(one, other, alike)) continue;
      const turn = exchangeTurn(one, other, alike, limits, kernel);
      if (turn !== null) found.push({ kind: "exchanged", ids: [one.id, other.id], turn });
    }
  }
  return found;
}

type Shape = {
  readonly id: string;
  readonly width: number;
  readonly height: number;
  readonly upright: Region;
  readonly turned: Region;
};

function shapeOf(id: string, region: Region): Shape[] {
  const box = boxOfRegion(region);
  if (!box) return [];
  return [{ id, width: box.width, height: box.height, upright: centred(region), turned: centred(region, 180) }];
}

function alikeMm({ width, height }: Shape, limits: TwinLimits): number {
  return Math.max(limits.alikeMm, limits.alikeShare * Math.max(width, height));
}

function sizesAreAlike(one: Shape, other: Shape, alike: number): boolean {
  return Math.abs(one.width - other.width) <= 2 * alike && Math.abs(one.height - other.height) <= 2 * alike;
}

function exchangeTurn(one: Shape, other: Shape, alike: number, limits: TwinLimits, kernel: Kernel): 0 | 180 | null {
  // A piece that is the same either way round may be exchanged without harm.
  if (isWithin(one.upright, other.upright, limits.sameMm, kernel)) return null;
  if (isWithin(one.upright, other.upright, alike, kernel)) return 0;
  return areNear(one.upright, other.turned, alike, limits, kernel) ? 180 : null;
}

function areNear(one: Region, other: Region, alike: number, limits: TwinLimits, kernel: Kernel): boolean {
  return isWithin(one, other, alike, kernel) && !isWithin(one, other, limits.sameMm, kernel);
}
