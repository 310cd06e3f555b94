import { regionCentroid } from "../geometry/area.ts";
import { boxOfPoints } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import { type CutLine, cutPath } from "../geometry/cut-path.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path, Point, Region } from "../geometry/path.ts";
import { placePath, unplacePoint } from "../geometry/placement.ts";
import { convexHull, type SmallestBox, smallestBox } from "../geometry/smallest-box.ts";
import { fitOnBed } from "../materials/bed-fit.ts";
import { partsOfOutline } from "./parts-of-outline.ts";
import { coveredBy, type Outline, type Shaped, shapedAboutMiddle } from "./shaped.ts";

export type Bed = { readonly widthMm: number; readonly heightMm: number };

/** How the seams run on the board: across the piece's longer side, upright, or level. */
export type SeamWay = "across" | "upright" | "level";

export type SplitChoice = {
  readonly seams: SeamWay;
  /** How many parts side by side; null for as few as go on the bed. */
  readonly count: number | null;
  /** How far the seams lie from where they part it evenly, mm along the parts. */
  readonly shiftMm: number;
};

export type SplitPart = {
  readonly shaped: Shaped;
  readonly region: Region;
  /** As it lies best on the bed. */
  readonly widthMm: number;
  readonly heightMm: number;
  readonly fits: boolean;
};

export type Split = {
  /** Whether it goes on the bed as it is, and need not be split. */
  readonly fitsWhole: boolean;
  readonly parts: readonly SplitPart[];
  /** Where the seams fall, from one side of the piece's box to the other, on the board. */
  readonly seams: readonly (readonly [Point, Point])[];
};

/** More parts than this beside each other are no split but a mistake, and more cells than that, either. */
export const mostParts = 12;
const mostCells = 24;
/** Splits tried before the first of them is given as it is: a cell that goes on the bed nearly always does with what is in it. */
const mostTries = 4;
/** A cut that would run through a node is moved aside by one of these, mm. */
const asideMm = [0, 0.013, -0.017, 0.031, -0.037, 0.059, -0.061, 0.11, -0.13];

/**
 * Splits an outline along straight seams so that each part goes on the bed, turned as need be: side by side, and where that
 * does not do, in rows, too. Its own curves are kept. A piece that hung together comes apart into all that the seams leave
 * apart. With a count, or seams moved, parts may be too large for the bed, and say so. Null for an outline that covers nothing, where
 * no seam meets it, and without a count where no split into up to 24 goes on the bed.
 */
export function splitToBed(outline: Outline, bed: Bed, choice: SplitChoice, kernel: Kernel): Split | null {
  const frame = frameOf(outline, choice.seams);
  if (!frame) return null;
  const grids = gridsFor(frame, bed, choice.count);
  if (grids.length === 0 && choice.count === null) return null;
  const isOne = connectedPieces(coveredBy(outline, kernel)).length === 1;
  const at = (grid: Grid, shiftMm: number) => splitAt(outline, frame, { grid, shiftMm, isOne, bed }, kernel);
  for (const grid of grids.slice(0, mostTries)) {
    const even = at(grid, 0);
    if (!even?.parts.every(({ fits }) => fits)) continue;
    return choice.shiftMm === 0 ? even : at(grid, choice.shiftMm);
  }
  return at(grids[0] ?? { columns: choice.count ?? mostParts, rows: 1 }, choice.shiftMm);
}

/** A box round the piece, turned: parts lie side by side along it. */
type Frame = {
  readonly along: Point;
  readonly from: number;
  readonly length: number;
  readonly low: number;
  readonly width: number;
};
type Grid = { readonly columns: number; readonly rows: number };

function frameOf({ path, placement }: Outline, seams: SeamWay): Frame | null {
  const hull = convexHull(flattenPath(placePath(path, placement)).flat());
  const box = smallestBox([hull]);
  if (!box || box.width === 0) return null;
  const radians = ((seams === "across" ? turnAcross(hull, box) : 0) * Math.PI) / 180;
  // Parts are numbered along it: from the left, and those of an upright piece from the top.
  const forth = Math.cos(radians) < -1e-9 ? -1 : 1;
  const along = seams === "level" ? { x: 0, y: 1 } : { x: forth * Math.cos(radians), y: forth * Math.sin(radians) };
  const [from, to] = extent(hull.map(({ x, y }) => x * along.x + y * along.y));
  const [low, high] = extent(hull.map(({ x, y }) => y * along.x - x * along.y));
  return { along, from, length: to - from, low, width: high - low };
}

/** Which way the longer side runs, degrees: upright or level for a piece that is hardly larger so, as a disc or a square on its side. */
function turnAcross(hull: readonly Point[], { length, width, turn }: SmallestBox): number {
  const upright = boxOfPoints(hull);
  if (!upright || upright.width * upright.height > length * width * 1.01) return turn;
  return upright.width >= upright.height ? 0 : 90;
}

const extent = (values: readonly number[]): readonly [number, number] => [
  values.reduce((a, b) => Math.min(a, b), Infinity),
  values.reduce((a, b) => Math.max(a, b), -Infinity),
];

/** Splits whose cells go on the bed, fewest parts first, and of equally many the one with fewer rows. */
function gridsFor({ length, width }: Frame, bed: Bed, count: number | null): Grid[] {
  const sizes = Array.from({ length: mostParts }, (_, index) => index + 1);
  const goes = (a: number, b: number) => a <= bed.widthMm && b <= bed.heightMm;
  return (count === null ? sizes : [count])
    .flatMap((columns) => sizes.map((rows) => ({ columns, rows })))
    .filter(({ columns, rows }) => columns * rows > 1 && columns * rows <= mostCells)
    .filter(({ columns, rows }) => {
      const [a, b] = [length / columns, width / rows];
      return goes(a, b) || goes(b, a);
    })
    .toSorted((a, b) => a.columns * a.rows - b.columns * b.rows || a.rows - b.rows);
}

type SplitAt = { readonly grid: Grid; readonly shiftMm: number; readonly isOne: boolean; readonly bed: Bed };

function splitAt(outline: Outline, frame: Frame, { grid, shiftMm, isOne, bed }: SplitAt, kernel: Kernel): Split | null {
  const { along, from, length, low, width } = frame;
  const across = { x: -along.y, y: along.x };
  const on = (a: number, b: number): Point => ({ x: a * along.x + b * across.x, y: a * along.y + b * across.y });
  const places = (count: number, start: number, size: number, shift: number) =>
    Array.from({ length: count - 1 }, (_, index) => start + (size * (index + 1)) / count + shift).filter(
      (place) => place > start && place < start + size,
    );
  const columns = places(grid.columns, from, length, shiftMm).map(
    (place) => [on(place, low), on(place, low + width), along] as const,
  );
  const rows = places(grid.rows, low, width, 0).map(
    (place) => [on(from, place), on(from + length, place), across] as const,
  );
  let paths: readonly Path[] = [outline.path];
  for (const seam of [...columns, ...rows]) paths = paths.flatMap((path) => cutAlong(path, seam, outline));
  if (paths.length < 2) return null;
  const parts = paths.flatMap((path) => (isOne ? loosened(path, outline, kernel) : [{ ...outline, path }]));
  const passed = (seams: readonly (readonly [Point, Point, Point])[], { x, y }: Point) =>
    seams.filter(([a, , aside]) => (x - a.x) * aside.x + (y - a.y) * aside.y > 0).length;
  const cellOf = ({ region }: SplitPart) => {
    const middle = regionCentroid(region) ?? { x: 0, y: 0 };
    return { row: passed(rows, middle), column: passed(columns, middle) };
  };
  const ordered = parts
    .flatMap((part) => measuredPart(part, bed, kernel) ?? [])
    .map((part) => ({ part, ...cellOf(part) }))
    .toSorted((a, b) => a.row - b.row || a.column - b.column);
  const fitsWhole = fitOnBed([convexHull(coveredBy(outline, kernel).flat())], bed)?.overMm === 0;
  return {
    fitsWhole,
    parts: ordered.map(({ part }) => part),
    seams: [...columns, ...rows].map(([a, b]) => [a, b] as const),
  };
}

function cutAlong(path: Path, [a, b, aside]: readonly [Point, Point, Point], { placement }: Outline): Path[] {
  for (const mm of asideMm) {
    const moved = ({ x, y }: Point) => unplacePoint({ x: x + mm * aside.x, y: y + mm * aside.y }, placement);
    const cut = cutPath(path, lineThrough(moved(a), moved(b)));
    if (!cut) continue;
    return [cut.left, cut.right].filter((side) => side.length > 0);
  }
  return [path];
}

function lineThrough(through: Point, to: Point): CutLine {
  const length = Math.hypot(to.x - through.x, to.y - through.y);
  return { through, along: { x: (to.x - through.x) / length, y: (to.y - through.y) / length } };
}

function loosened(path: Path, { placement }: Outline, kernel: Kernel): Outline[] {
  if (connectedPieces(coveredBy({ path, placement }, kernel)).length < 2) return [{ path, placement }];
  const parted = partsOfOutline({ path, placement }, kernel);
  return parted.parts.map((part) => ({ path: part.path, placement: parted.placement }));
}

function measuredPart(outline: Outline, bed: Bed, kernel: Kernel): SplitPart | null {
  const shaped = shapedAboutMiddle(outline);
  const region = coveredBy(outline, kernel);
  const fit = fitOnBed([convexHull(region.flat())], bed);
  if (!shaped || !fit) return null;
  return { shaped, region, widthMm: fit.widthMm, heightMm: fit.heightMm, fits: fit.overMm === 0 };
}
