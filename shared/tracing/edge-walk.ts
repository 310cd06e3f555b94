import type { Labels } from "./label-pixels.ts";
import { diagonalAt } from "./pixel-areas.ts";

/** East, south, west, north: a quarter turn to the right each. */
export type Heading = 0 | 1 | 2 | 3;
export const headings: readonly Heading[] = [0, 1, 2, 3];
const steps = [
  [1, 0],
  [0, 1],
  [-1, 0],
  [0, -1],
] as const;
/** The pixel to the right of one who leaves a grid corner, seen from the corner's own pixel, which lies south-east of it. */
const rightPixels = [
  [0, 0],
  [-1, 0],
  [-1, -1],
  [0, -1],
] as const;

/** The edge that each of the four edges of a corner runs on into, where one diagonal of its pixels hangs together. */
const fallingPairs = [3, 2, 1, 0] as const;
const risingPairs = [1, 0, 3, 2] as const;

/** Beyond the picture. */
export const outside = -1;

/**
 * The grid of pixel corners, on whose lines the edges between colours run. A corner is named by its number, row by row, in a
 * grid one wider and one higher than the picture.
 */
export class EdgeGrid {
  readonly columns: number;
  readonly corners: number;

  constructor(readonly labels: Labels) {
    this.columns = labels.width + 1;
    this.corners = this.columns * (labels.height + 1);
  }

  /** The pixel to the right of one who leaves `corner`, or `outside`. */
  rightPixel(corner: number, heading: Heading): number {
    const x = (corner % this.columns) + rightPixels[heading][0];
    const y = Math.floor(corner / this.columns) + rightPixels[heading][1];
    const { width, height } = this.labels;
    return x < 0 || y < 0 || x >= width || y >= height ? outside : y * width + x;
  }

  leftPixel(corner: number, heading: Heading): number {
    return this.rightPixel(corner, turned(heading, 3));
  }

  labelOf(pixel: number): number {
    return pixel === outside ? outside : (this.labels.first[pixel] ?? outside);
  }

  /** Whether an edge leaves the corner this way: two colours meet there, or one and the outside. */
  hasEdge(corner: number, heading: Heading): boolean {
    return this.labelOf(this.rightPixel(corner, heading)) !== this.labelOf(this.leftPixel(corner, heading));
  }

  step(corner: number, heading: Heading): number {
    return corner + steps[heading][0] + steps[heading][1] * this.columns;
  }

  /** How the edge that arrives with this heading goes on; null at a junction, where three edges or more end. */
  passOn(corner: number, arriving: Heading): Heading | null {
    const back = turned(arriving, 2);
    const ways = headings.filter((heading) => heading !== back && this.hasEdge(corner, heading));
    const [only] = ways;
    if (ways.length === 1 && only !== undefined) return only;
    if (ways.length === 2) return null;
    const diagonal = diagonalAt(this.labels, corner % this.columns, Math.floor(corner / this.columns));
    if (diagonal === "none") return null;
    // Falling: what hangs together cuts off the north-east (north and east edges) and the south-west.
    return (diagonal === "falling" ? fallingPairs : risingPairs)[back];
  }

  isJunction(corner: number): boolean {
    const ways = headings.filter((heading) => this.hasEdge(corner, heading));
    const [way] = ways;
    return ways.length > 2 && way !== undefined && this.passOn(corner, turned(way, 2)) === null;
  }
}

/** A heading after so many quarter turns to the right. */
export function turned(heading: Heading, quarters: 1 | 2 | 3): Heading {
  return headings[(heading + quarters) % 4] ?? 0;
}
