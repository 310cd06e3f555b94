import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Point, Polygon, Region } from "#shared/geometry/path.ts";
import { ellipsePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";
import type { SlatBoard, SlatDesign } from "#shared/slats/slat-layout.ts";
import { seededRandom } from "./seeded-random.ts";

/** The board and slats of the worked example: 45 degrees, mitred to a spine. */
export const usualBoard: SlatBoard = { width: 457.2, height: 482.6, outline: null };
export const usualSlats: SlatDesign = {
  pattern: "spine",
  angle: 45,
  slatWidth: 38.1,
  gap: 0,
  spineWidth: 38.1,
  spineOffset: 0,
  start: { kind: "corner" },
  direction: "up",
  overhang: 0,
};

/** A board and slats that are the same for the same seed; round angles and equal measures come up more often than by chance. */
export function randomSlats(seed: number): { board: SlatBoard; design: SlatDesign } {
  const random = seededRandom(seed * 7919 + 17);
  for (let skip = 0; skip < 5; skip++) random();
  const between = (least: number, most: number) => least + random() * (most - least);
  const oneOf = <T>(...choices: readonly [T, ...T[]]): T =>
    choices[Math.floor(random() * choices.length)] ?? choices[0];
  const board = { width: between(150, 1200), height: between(150, 1200), outline: null };
  const slatWidth = between(12, 90);
  const pattern = oneOf("spine", "mitred", "single");
  const room = Math.max(0, board.width / 2 - 60);
  return {
    board,
    design: {
      pattern,
      angle: oneOf(between(15, 90), between(15, 90), between(15, 90), 45, 90, 15, 30),
      slatWidth,
      gap: oneOf(0, between(0, slatWidth), 3),
      spineWidth: between(5, 60),
      spineOffset: oneOf(0, between(-room, room)),
      start: oneOf<SlatDesign["start"]>({ kind: "corner" }, { kind: "height", height: between(-300, 1500) }),
      direction: oneOf("up", "down"),
      overhang: oneOf(0, between(0, 50)),
    },
  };
}

/** A slat's whole strip on a board, built from its direction and its normal, without the closed form. Side by its name. */
export function wholeStrip(
  strip: number,
  side: "left" | "right" | "whole",
  board: SlatBoard,
  design: SlatDesign,
  startHeight: number,
): { polygon: Polygon; along: Point; misses: boolean } {
  const turned = (design.angle * Math.PI) / 180;
  const out = side === "left" ? -1 : 1;
  const rise = design.direction === "up" ? -1 : 1;
  const along = { x: out * Math.sin(turned), y: rise * Math.cos(turned) };
  // Square to the slat, away from the edge that slats rise from.
  const across = { x: -out * Math.cos(turned), y: rise * Math.sin(turned) };
  const half = design.pattern === "spine" ? design.spineWidth / 2 : 0;
  const spineX = side === "whole" ? 0 : board.width / 2 + design.spineOffset + out * half;
  const base = design.direction === "up" ? board.height : 0;
  const first = { x: spineX, y: base + rise * startHeight };
  const from = strip * (design.slatWidth + design.gap);
  const at = (u: number, v: number) => ({
    x: first.x + u * along.x + v * across.x,
    y: first.y + u * along.y + v * across.y,
  });
  const to = from + design.slatWidth;
  // A strip misses the board when all its corners, overhang and all, lie beside it.
  const beside = rectangle(-60, -60, board.width + 60, board.height + 60).map(
    ({ x, y }) => (x - first.x) * across.x + (y - first.y) * across.y,
  );
  const misses = Math.max(...beside) < from || Math.min(...beside) > to;
  return { misses, polygon: [at(-8000, from), at(8000, from), at(8000, to), at(-8000, to)], along };
}

/** The rectangle of a side of a board, grown by the overhang except at a spine. */
export function sideRectangle(
  side: "left" | "right" | "whole",
  board: SlatBoard,
  design: SlatDesign,
  overhang: number,
): Polygon {
  const half = design.pattern === "spine" ? design.spineWidth / 2 : 0;
  const middle = board.width / 2 + design.spineOffset;
  const left = side === "right" ? middle + half : -overhang;
  const right = side === "left" ? middle - half : board.width + overhang;
  return rectangle(left, -overhang, right, board.height + overhang);
}

export const rectangle = (left: number, top: number, right: number, bottom: number): Polygon => [
  { x: left, y: top },
  { x: right, y: top },
  { x: right, y: bottom },
  { x: left, y: bottom },
];

/** How far a region reaches along a direction, mm; nothing for an empty one. */
export function reachAlong(region: Region, { x, y }: Point): number {
  const along = region.flat().map((point) => point.x * x + point.y * y);
  return along.length === 0 ? 0 : Math.max(...along) - Math.min(...along);
}

/** Outlines of boards that are no rectangles, 600 × 500 mm. */
export const outlines: Readonly<Record<string, Region>> = {
  "rounded corners": flattenPath(roundedRectanglePath({ x: 0, y: 0, width: 600, height: 500 }, 40)),
  ellipse: flattenPath(ellipsePath({ x: 300, y: 250 }, 300, 250)),
  ring: flattenPath([...ellipsePath({ x: 300, y: 250 }, 300, 250), ...ellipsePath({ x: 320, y: 240 }, 90, 70)]),
  notched: [
    [
      { x: 0, y: 0 },
      { x: 380, y: 0 },
      { x: 400, y: 300 },
      { x: 480, y: 300 },
      { x: 500, y: 0 },
      { x: 600, y: 0 },
      { x: 600, y: 500 },
      { x: 0, y: 500 },
    ],
  ],
  islands: [rectangle(0, 0, 250, 500), rectangle(350, 20, 600, 480)],
  triangle: [
    [
      { x: 300, y: 0 },
      { x: 600, y: 500 },
      { x: 0, y: 500 },
    ],
  ],
};

/** A region drawn larger, so that the kernel's grid is finer against it. */
export const enlarged = (region: Region, factor: number): Region =>
  region.map((ring) => ring.map(({ x, y }) => ({ x: x * factor, y: y * factor })));
