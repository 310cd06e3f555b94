import { regionAreaMm2, regionCentroid } from "../geometry/area.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { footLimits } from "../hardware/barrel-foot.ts";
import { checked, lengthRange, type Outcome, spanRange } from "../units/outcome.ts";
import { type Stretch, stretchesOnLine, stretchesWithout } from "./line-stretches.ts";
import type { SlatLayout } from "./slat-layout.ts";

/** A brad through a slat, by the slat's place in the laying order, or through the spine (0). */
export type Brad = Point & { readonly slat: number };

export type BradMap = {
  readonly brads: readonly Brad[];
  /** Slats that no brad fits in, and those that only one fits in: glue and a clamp hold them. The spine is 0. */
  readonly without: readonly number[];
  readonly withOne: readonly number[];
};

/** How brads keep off what is round them, mm: common practice, the barrels' distance as their feet have it. */
export const bradSpacing = { trim: 15, joint: 10, barrel: footLimits.bradMm, apart: 150 } as const;
export type BradSpacing = { readonly [key in keyof typeof bradSpacing]: number };

/** Slats from that width on take two rows, mm. Our choice. */
const twoRowsMm = 60;
/** Room that is kept besides, mm: the kernel's arcs are chords. */
const hairMm = 0.05;
/** Brads nearer than that to each other are one, mm. */
const sameBradMm = 8;

/** A piece of wood with its grain's direction. */
type Laid = { readonly slat: number; readonly trimmed: Region; readonly from: Point; readonly to: Point };

/**
 * Where brads go: along the middle of each slat and of the spine (two rows in wide ones) from end to end, no farther apart
 * than `apart`, inside the trim line by `trim`, off joints and other edges of the slat by `joint`, and off the middles of
 * barrels by `barrel`, all mm. A brad whose place is taken moves along the slat to the nearest free one.
 */
export function bradMap(
  layout: SlatLayout,
  barrels: readonly Point[],
  kernel: Kernel,
  spacing: BradSpacing = bradSpacing,
): Outcome<BradMap> {
  const places = { least: -2 * lengthRange.most, most: 2 * lengthRange.most };
  return checked(
    {
      trim: [spacing.trim, spanRange],
      joint: [spacing.joint, spanRange],
      barrel: [spacing.barrel, spanRange],
      apart: [spacing.apart, { least: 20, most: lengthRange.most }],
      ...Object.fromEntries(
        barrels.flatMap(({ x, y }, index) => [
          [`barrel${index + 1}X`, [x, places]],
          [`barrel${index + 1}Y`, [y, places]],
        ]),
      ),
    },
    () => mapBrads(layout, barrels, kernel, spacing),
  );
}

function mapBrads(layout: SlatLayout, barrels: readonly Point[], kernel: Kernel, spacing: BradSpacing): BradMap {
  const inside = kernel.offset(layout.body, -(spacing.trim + hairMm), "round");
  const byPiece = laidPieces(layout).map((piece) => ({
    slat: piece.slat,
    brads: bradsOf(piece, inside, barrels, layout.design.slatWidth, kernel, spacing),
  }));
  return {
    brads: byPiece.flatMap(({ brads }) => brads),
    without: byPiece.filter(({ brads }) => brads.length === 0).map(({ slat }) => slat),
    withOne: byPiece.filter(({ brads }) => brads.length === 1).map(({ slat }) => slat),
  };
}

function laidPieces({ slats, spine }: SlatLayout): Laid[] {
  const pieces = slats.map(({ order, trimmed, axis }) => ({ slat: order, trimmed, ...axis }));
  const [first, second, third] = spine?.untrimmed ?? [];
  if (!spine || !first || !second || !third) return pieces;
  const x = (first.x + second.x) / 2;
  return [{ slat: 0, trimmed: spine.trimmed, from: { x, y: first.y }, to: { x, y: third.y } }, ...pieces];
}

function bradsOf(
  piece: Laid,
  inside: Region,
  barrels: readonly Point[],
  slatWidth: number,
  kernel: Kernel,
  spacing: BradSpacing,
): Brad[] {
  const free = kernel.intersect(kernel.offset(piece.trimmed, -(spacing.joint + hairMm), "round"), inside);
  if (free.length === 0) return [];
  const length = Math.hypot(piece.to.x - piece.from.x, piece.to.y - piece.from.y);
  const along = { x: (piece.to.x - piece.from.x) / length, y: (piece.to.y - piece.from.y) / length };
  const rows = piece.slat > 0 && slatWidth >= twoRowsMm ? [-slatWidth / 4, slatWidth / 4] : [0];
  const onRows = rows.flatMap((off) => {
    const from = { x: piece.from.x - off * along.y, y: piece.from.y + off * along.x };
    return bradsOnLine(free, from, along, barrels, spacing);
  });
  // In a slat that is only a corner the middle line may miss all that is free.
  const found = onRows.length > 0 ? onRows : bradsOnLine(free, middleOf(free) ?? piece.from, along, barrels, spacing);
  return found.map((point) => ({ ...point, slat: piece.slat }));
}

/** The middle of the largest free part. */
function middleOf(free: Region): Point | null {
  const [largest] = connectedPieces(free).toSorted((a, b) => regionAreaMm2(b) - regionAreaMm2(a));
  return largest ? regionCentroid(largest) : null;
}

function bradsOnLine(
  free: Region,
  from: Point,
  along: Point,
  barrels: readonly Point[],
  spacing: BradSpacing,
): Point[] {
  const open = stretchesOnLine(free, from, along);
  const left = stretchesWithout(
    open,
    barrels.flatMap((barrel) => shadowOf(barrel, from, along, spacing.barrel)),
  );
  const chosen: number[] = [];
  for (const { start, end } of open) {
    const steps = Math.max(1, Math.ceil((end - start) / spacing.apart));
    const wanted =
      end - start < sameBradMm
        ? [(start + end) / 2]
        : Array.from({ length: steps + 1 }, (_, step) => start + (step * (end - start)) / steps);
    for (const place of wanted) {
      const nearest = nearestIn(left, place);
      if (nearest === null || nearest < start || nearest > end) continue;
      if (chosen.every((other) => Math.abs(other - nearest) >= sameBradMm)) chosen.push(nearest);
    }
  }
  return chosen.map((place) => ({ x: from.x + place * along.x, y: from.y + place * along.y }));
}

/** The stretch of a line that lies nearer to a barrel's middle than allowed. */
function shadowOf(barrel: Point, from: Point, along: Point, distance: number): Stretch[] {
  const dx = barrel.x - from.x;
  const dy = barrel.y - from.y;
  const at = dx * along.x + dy * along.y;
  const off = dx * along.y - dy * along.x;
  const half = (distance + hairMm) ** 2 - off ** 2;
  return half <= 0 ? [] : [{ start: at - Math.sqrt(half), end: at + Math.sqrt(half) }];
}

function nearestIn(stretches: readonly Stretch[], place: number): number | null {
  return stretches.reduce<number | null>((best, { start, end }) => {
    const at = Math.max(start, Math.min(end, place));
    return best === null || Math.abs(at - place) < Math.abs(best - place) ? at : best;
  }, null);
}
