import { boxOfRegion } from "../geometry/box.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { type Spread, spreadOfRegion, spreadsAreWithin } from "./outline-spread.ts";
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
 * dots are compared once, and two that are alike through others already are not compared again. In the order of the pieces.
 */
export function nearTwins(
  pieces: readonly TwinPiece[],
  kernel: Kernel,
  limits: TwinLimits = usualTwinLimits,
): NearTwins[] {
  const shapes = shapesOf(pieces, limits, kernel);
  const found: NearTwins[] = [];
  const linked = shapes.map((_, index) => index);
  for (const [index, one] of shapes.entries()) {
    if (looksRightTurned(one, limits, kernel)) found.push({ kind: "turned", ids: one.ids });
    for (let next = index + 1; next < shapes.length; next++) {
      const other = shapes[next];
      if (!other || linked[index] === linked[next]) continue;
      const turn = exchangeTurn(one, other, limits, kernel);
      if (turn === null) continue;
      found.push({ kind: "exchanged", ids: one.ids, others: other.ids, turn });
      const [into, from] = [linked[index] ?? index, linked[next] ?? next];
      for (const [place, link] of linked.entries()) if (link === from) linked[place] = into;
    }
  }
  return found;
}

/** An outline with the middle of its box at the origin. */
type Outline = {
  /** As it came in: what is worked out of it is remembered by it. */
  readonly region: Region;
  readonly width: number;
  readonly height: number;
  readonly upright: Region;
  readonly spread: Spread;
};
/** Pieces that are the same lying as they do, by the outline of the first of them. */
type Shape = Outline & { readonly ids: readonly string[] };

/** What the kernel's grid and its arcs may add to a distance, mm. */
const slackMm = 0.03;

function shapesOf(pieces: readonly TwinPiece[], limits: TwinLimits, kernel: Kernel): Shape[] {
  const shapes: (Outline & { ids: string[] })[] = [];
  for (const { id, region } of pieces) {
    const outline = remembered(kernel, region, "twin outline", () => outlineOf(region));
    if (!outline) continue;
    const same = shapes.find((known) => isSame(known, outline, limits.sameMm, kernel));
    if (same) same.ids.push(id);
    else shapes.push({ ...outline, ids: [id] });
  }
  return shapes;
}

function outlineOf(region: Region): Outline | null {
  const box = boxOfRegion(region);
  if (!box) return null;
  const upright = centred(region);
  return { region, width: box.width, height: box.height, upright, spread: spreadOfRegion(upright) };
}

const turnedOf = ({ region }: Outline, kernel: Kernel): Region =>
  remembered(kernel, region, "twin turned", () => centred(region, 180));

function alikeMm({ width, height }: Outline, limits: TwinLimits): number {
  return Math.max(limits.alikeMm, limits.alikeShare * Math.max(width, height));
}

function isSame(one: Outline, other: Outline, sameMm: number, kernel: Kernel): boolean {
  if (!spreadsAreWithin(one.spread, other.spread, sameMm + slackMm)) return false;
  return ofPair(one, other, `same ${sameMm}`, kernel, () => isWithin(one.upright, other.upright, sameMm, kernel));
}

function looksRightTurned(one: Outline, limits: TwinLimits, kernel: Kernel): boolean {
  const alike = alikeMm(one, limits);
  if (!spreadsAreWithin(one.spread, one.spread, alike + slackMm, true)) return false;
  return remembered(kernel, one.region, `turned twin ${alike} ${limits.sameMm}`, () =>
    areNear(one.upright, turnedOf(one, kernel), alike, limits, kernel),
  );
}

/** How one shape goes into another's place and looks right; null when it does not. */
function exchangeTurn(one: Outline, other: Outline, limits: TwinLimits, kernel: Kernel): 0 | 180 | null {
  const alike = Math.min(alikeMm(one, limits), alikeMm(other, limits));
  const upright = spreadsAreWithin(one.spread, other.spread, alike + slackMm);
  const turned = spreadsAreWithin(one.spread, other.spread, alike + slackMm, true);
  if (!upright && !turned) return null;
  return ofPair(one, other, `twins ${alike} ${limits.sameMm}`, kernel, () => {
    if (upright && isWithin(one.upright, other.upright, alike, kernel)) return 0;
    return turned && areNear(one.upright, turnedOf(other, kernel), alike, limits, kernel) ? 180 : null;
  });
}

function ofPair<T>(one: Outline, other: Outline, what: string, kernel: Kernel, make: () => T): T {
  return remembered(kernel, [...one.region, ...other.region], `${what} ${one.region.length}`, make);
}

function areNear(one: Region, other: Region, alike: number, limits: TwinLimits, kernel: Kernel): boolean {
  return isWithin(one, other, alike, kernel) && !isWithin(one, other, limits.sameMm, kernel);
}
