import type { Labels } from "./label-pixels.ts";

/** Which connected area of one colour each pixel belongs to. Areas are numbered in the order of their first pixels. */
export type PixelAreas = {
  readonly of: Int32Array;
  readonly areas: readonly { readonly label: number; readonly pixels: number }[];
};

/** How two pixels that only touch at a corner hang together there: not at all, or falling or rising from left to right. */
export type Diagonal = "none" | "falling" | "rising";

/**
 * Pixels of one colour that share a side hang together. Where two of one colour touch at a corner only, they do when the four
 * pixels around it, mixes counted, are for the most part of that colour: else thin slanting strokes would fall to beads.
 */
export function pixelAreas(labels: Labels): PixelAreas {
  const { width, height, first } = labels;
  const parents = new Int32Array(width * height).map((_, index) => index);
  const rootOf = (pixel: number): number => {
    let root = pixel;
    for (let next = parents[root] ?? root; next !== root; next = parents[root] ?? root) root = next;
    for (let at = pixel; at !== root; ) {
      const next = parents[at] ?? root;
      parents[at] = root;
      at = next;
    }
    return root;
  };
  const join = (a: number, b: number): void => {
    const ra = rootOf(a);
    const rb = rootOf(b);
    if (ra !== rb) parents[Math.max(ra, rb)] = Math.min(ra, rb);
  };
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const pixel = y * width + x;
      if (x > 0 && first[pixel] === first[pixel - 1]) join(pixel, pixel - 1);
      if (y > 0 && first[pixel] === first[pixel - width]) join(pixel, pixel - width);
      if (x === 0 || y === 0) continue;
      const diagonal = diagonalAt(labels, x, y);
      if (diagonal === "falling") join(pixel, pixel - width - 1);
      if (diagonal === "rising") join(pixel - 1, pixel - width);
    }
  }
  const of = new Int32Array(width * height);
  const areas: { label: number; pixels: number }[] = [];
  for (let pixel = 0; pixel < of.length; pixel++) {
    const root = rootOf(pixel);
    const area = root === pixel ? areas.push({ label: first[pixel] ?? 0, pixels: 0 }) - 1 : (of[root] ?? 0);
    of[pixel] = area;
    const found = areas[area];
    if (found) found.pixels++;
  }
  return { of, areas };
}

/** What hangs together at the corner between pixels (x−1, y−1), (x, y−1), (x−1, y) and (x, y), all four in the picture. */
export function diagonalAt(labels: Labels, x: number, y: number): Diagonal {
  const { width, first } = labels;
  const southEast = y * width + x;
  const southWest = southEast - 1;
  const northEast = southEast - width;
  const northWest = northEast - 1;
  const falling = first[northWest] === first[southEast];
  const rising = first[northEast] === first[southWest];
  if (falling === rising && first[northWest] === first[northEast]) return "none";
  if (!falling && !rising) return "none";
  // Two of one colour side by side would hang together anyway.
  if (first[northWest] === first[northEast] || first[northWest] === first[southWest]) return "none";
  if (first[southEast] === first[northEast] || first[southEast] === first[southWest]) return "none";
  const around = [northWest, northEast, southWest, southEast];
  const part = (colour: number) => around.reduce((sum, pixel) => sum + shareOf(labels, pixel, colour), 0);
  const inFalling = falling ? part(first[northWest] ?? 0) : 0;
  const inRising = rising ? part(first[northEast] ?? 0) : 0;
  if (Math.max(inFalling, inRising) <= 2) return "none";
  return inFalling >= inRising ? "falling" : "rising";
}

/** How much of a colour is in a pixel, from 0 to 1. */
export function shareOf({ first, second, share }: Labels, pixel: number, colour: number): number {
  const part = share[pixel] ?? 1;
  if (first[pixel] === colour) return second[pixel] === colour ? 1 : part;
  return second[pixel] === colour ? 1 - part : 0;
}
