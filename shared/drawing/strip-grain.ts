import type { Box, Point, Region } from "../geometry/path.ts";
import { base64OfBytes } from "./base64.ts";
import type { Colour, Item } from "./display-list.ts";
import { grainColours, tonedWood } from "./grain-colours.ts";
import { latticeValue, noise } from "./noise.ts";
import { palettePng } from "./png.ts";

/** One piece of wood in a face that is put together of many: where it lies, the way its grain runs, and which it is. */
export type GrainStrip = {
  readonly region: Region;
  readonly axis: { readonly from: Point; readonly to: Point };
  /** From 0, the darkest, to `stripTones` - 1. */
  readonly tone: number;
  /** Strips with different seeds show different wood. */
  readonly seed: number;
};

/** Tones that strips of one stock come in, one step of CIELAB L* apart. */
export const stripTones = 9;
const middleTone = (stripTones - 1) / 2;
const shades = 26;
/** The finest picture, and the most cells of a large one. */
const finestMm = 0.5;
const mostCells = 600_000;
/** Grain is drawn as wide as it is where cells are this large or smaller, wider above it. */
const fineEnoughMm = 0.65;

export type GrainImage = Extract<Item, { kind: "image" }>;

/**
 * Grain of many strips as one image over `box`: each strip has its own tone and its own stretch of grain along its axis. What no strip
 * covers is the wood's plain colour. Same strips, same bytes.
 */
export function stripGrain(box: Box, strips: readonly GrainStrip[], colour: Colour): GrainImage {
  const cell = Math.max(finestMm, Math.sqrt((box.width * box.height) / mostCells));
  const width = Math.max(2, Math.ceil(box.width / cell));
  const height = Math.max(2, Math.ceil(box.height / cell));
  const pixels = new Uint8Array(width * height).fill(middleTone * shades + Math.floor(shades / 2));
  for (const strip of strips) {
    const grain = grainOf(strip, Math.max(1, cell / fineEnoughMm));
    const { from } = strip.axis;
    const along = directionOf(strip);
    eachSpan(strip.region, box, cell, { width, height }, (row, first, end) => {
      const x = box.x + (first + 0.5) * cell - from.x;
      const y = box.y + (row + 0.5) * cell - from.y;
      let [u, v] = [x * along.x + y * along.y, y * along.x - x * along.y];
      for (let at = row * width + first; at < row * width + end; at += 1) {
        pixels[at] = strip.tone * shades + Math.min(shades - 1, Math.floor(grain(u, v) * shades));
        u += cell * along.x;
        v -= cell * along.y;
      }
    });
  }
  const colours = Array.from({ length: stripTones }, (_, tone) =>
    grainColours(tonedWood(colour, tone - middleTone), shades),
  ).flat();
  const png = palettePng({ width, height, pixels }, colours);
  return { kind: "image", box: { ...box, width: width * cell, height: height * cell }, pngBase64: base64OfBytes(png) };
}

/** A unit vector along a strip's grain. */
export function directionOf({ axis: { from, to } }: GrainStrip): Point {
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1;
  return { x: (to.x - from.x) / length, y: (to.y - from.y) / length };
}

/**
 * How dark a strip's grain is, 0 to below 1, at `u` mm along its axis and `v` mm across: growth rings sawn nearer to or farther from the heart, so
 * wider or narrower apart, over them long fibres. `coarse` widens what would be lost between the cells of a large picture.
 */
export function grainOf({ seed }: GrainStrip, coarse: number): (u: number, v: number) => number {
  const own = (what: number) => latticeValue(seed, what, 77);
  const ringMm = (4.6 + 5.2 * own(1)) * coarse;
  const heart = (own(2) < 0.5 ? -1 : 1) * (6 + 62 * own(3));
  const middle = 500 * (own(4) - 0.5);
  const sweep = 0.012 + 0.024 * own(5);
  return (u, v) => {
    const wander = 5 * noise(u / 300, v / 90, seed) + 1.3 * noise(u / 85, v / 16, seed + 1);
    const ring = (Math.hypot(v - heart, sweep * (u - middle)) + wander) / ringMm;
    const year = Math.floor(ring);
    const phase = ring - year;
    // Late wood darkens slowly and ends fast where the next year's early wood starts.
    const late = phase < 0.86 ? (phase / 0.86) ** 3 : (1 - phase) / 0.14;
    const strength = 0.35 + 0.65 * noise(year * 7.3, u / 240, seed + 3);
    const fibre = 0.6 * noise(u / 54, v / (2.2 * coarse), seed + 4) + 0.4 * noise(u / 21, v / (1.6 * coarse), seed + 5);
    const cloud = noise(u / 190, v / 14, seed + 6);
    return Math.min(0.999, Math.max(0, 0.1 + 0.34 * late * strength + 0.42 * fibre + 0.16 * cloud));
  };
}

/** Calls back with each run of cells, in one row from `first` to before `end`, whose middles lie in a region (even-odd). */
function eachSpan(
  region: Region,
  box: Box,
  cell: number,
  grid: { readonly width: number; readonly height: number },
  found: (row: number, first: number, end: number) => void,
): void {
  const crossings = new Map<number, number[]>();
  for (const polygon of region) {
    let from = polygon.at(-1);
    for (const to of polygon) {
      if (from) addCrossings(crossings, from, to, box, cell, grid.height);
      from = to;
    }
  }
  for (const [row, places] of crossings) {
    places.sort((a, b) => a - b);
    for (let index = 0; index + 1 < places.length; index += 2) {
      const first = Math.max(0, Math.ceil((places[index] ?? 0) - 0.5));
      const end = Math.min(grid.width, Math.ceil((places[index + 1] ?? 0) - 0.5));
      if (end > first) found(row, first, end);
    }
  }
}

/** Where an edge crosses the middles of rows, in cells from the box's left. */
function addCrossings(
  crossings: Map<number, number[]>,
  from: Point,
  to: Point,
  box: Box,
  cell: number,
  rows: number,
): void {
  const [upper, lower] = from.y < to.y ? [from, to] : [to, from];
  const first = Math.max(0, Math.ceil((upper.y - box.y) / cell - 0.5));
  const end = Math.min(rows, Math.ceil((lower.y - box.y) / cell - 0.5));
  for (let row = first; row < end; row += 1) {
    const y = box.y + (row + 0.5) * cell;
    const x = upper.x + ((lower.x - upper.x) * (y - upper.y)) / (lower.y - upper.y);
    const places = crossings.get(row);
    if (places) places.push((x - box.x) / cell);
    else crossings.set(row, [(x - box.x) / cell]);
  }
}
