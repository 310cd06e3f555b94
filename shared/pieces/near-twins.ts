import { boxOfRegion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { centred, isWithin } from "./same-outline.ts";

/** A piece with its outline on the board, as the kernel gives it. */
export type TwinPiece = { readonly id: string; readonly region: Region };

export type NearTwins =
  /** Each goes into its own place turned by 180° and looks right, but is not. */
  | { readonly kind: "turned"; readonly ids: readonly string[] }
  /** Any of `ids` goes into the place of any of `others` and looks right, but is not; `turn` is 180 when only upside down. */
  | {
      readonly kind: "exchanged";
      readonly ids: readonly string[];
      readonly others: readonly string[];
      readonly turn: 0 | 180;
    };

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
 * Pieces are compared with the middles of their boxes on each other; the same ones stand together, so that a hundred equal
 * dots are compared once. In the order of the pieces.
 */
export function nearTwins(
  pieces: readonly TwinPiece[],
  kernel: Kernel,
  limits: TwinLimits = usualTwinLimits,
): NearTwins[] {
  const shapes = shapesOf(pieces, limits, kernel);
  const found: NearTwins[] = [];
  for (const [index, one] of shapes.entries()) {
    if (areNear(one.upright, one.turned, alikeMm(one, limits), limits, kernel)) {
      found.push({ kind: "turned", ids: one.ids });
    }
    for (const other of shapes.slice(index + 1)) {
      const alike = Math.min(alikeMm(one, limits), alikeMm(other, limits));
      if (!sizesAreAlike(one, other, alike)) continue;
      const turn = exchangeTurn(one, other, alike, limits, kernel);
      if (turn !== null) found.push({ kind: "exchanged", ids: one.ids, others: other.ids, turn });
    }
  }
  return found;
}

/** Pieces that are the same lying as they do, by the outline of the first of them. */
type Shape = {
  readonly ids: readonly string[];
  readonly width: number;
  readonly height: number;
  readonly upright: Region;
  readonly turned: Region;
};

function shapesOf(pieces: readonly TwinPiece[], limits: TwinLimits, kernel: Kernel): Shape[] {
  const shapes: (Omit<Shape, "ids"> & { ids: string[] })[] = [];
  for (const { id, region } of pieces) {
    const box = boxOfRegion(region);
    if (!box) continue;
    const upright = centred(region);
    const shape = { ids: [id], width: box.width, height: box.height, upright, turned: centred(region, 180) };
    const same = shapes.find(
      (known) => sizesAreAlike(known, shape, limits.sameMm) && isWithin(known.upright, upright, limits.sameMm, kernel),
    );
    if (same) same.ids.push(id);
    else shapes.push(shape);
  }
  return shapes;
}

type Size = Pick<Shape, "width" | "height">;

function alikeMm({ width, height }: Size, limits: TwinLimits): number {
  return Math.max(limits.alikeMm, limits.alikeShare * Math.max(width, height));
}

function sizesAreAlike(one: Size, other: Size, alike: number): boolean {
  return Math.abs(one.width - other.width) <= 2 * alike && Math.abs(one.height - other.height) <= 2 * alike;
}

function exchangeTurn(one: Shape, other: Shape, alike: number, limits: TwinLimits, kernel: Kernel): 0 | 180 | null {
  if (isWithin(one.upright, other.upright, alike, kernel)) return 0;
  return areNear(one.upright, other.turned, alike, limits, kernel) ? 180 : null;
}

function areNear(one: Region, other: Region, alike: number, limits: TwinLimits, kernel: Kernel): boolean {
  return isWithin(one, other, alike, kernel) && !isWithin(one, other, limits.sameMm, kernel);
}
