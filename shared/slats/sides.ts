import type { Point } from "../geometry/path.ts";
import { spineWidthOf } from "./check-slats.ts";
import { cornerPhase, slopeOf } from "./half-board.ts";
import type { Slat, SlatBoard, SlatDesign, SlatEdge } from "./slat-layout.ts";

/**
 * One side of a board that slats of one direction cover. Its own axes: x out from the spine's edge (from the left edge for
 * one direction), y from the edge that slats rise from, so that y runs up, or down for slats that fall.
 */
export type Side = {
  readonly name: Slat["side"];
  /** From the spine's edge to the board's. */
  readonly reach: number;
  readonly height: number;
  /** How far slats are laid past the side's beginning: nothing at a spine. */
  readonly nearOverhang: number;
  readonly overhang: number;
  /** The c of slat 0's first edge, in the side's own axes. */
  readonly phase: number;
  /** The edges as the board names them. */
  readonly edges: {
    readonly foot: SlatEdge;
    readonly spine: SlatEdge;
    readonly outer: SlatEdge;
    readonly head: SlatEdge;
  };
  readonly toBoard: (point: Point) => Point;
  readonly fromBoard: (point: Point) => Point;
};

/** The sides of a board, left before right. The start is the same for both, so that slats meet at the spine. */
export function sidesOf(board: SlatBoard, design: SlatDesign): Side[] {
  const { width, height } = board;
  const half = spineWidthOf(design) / 2;
  const middle = width / 2 + design.spineOffset;
  const phase = startHeightMm(board, design);
  const side = (name: Side["name"], nearX: number, outwards: 1 | -1): Side => ({
    name,
    reach: outwards === 1 ? width - nearX : nearX,
    height,
    nearOverhang: name === "whole" ? design.overhang : 0,
    overhang: design.overhang,
    phase,
    edges: {
      foot: design.direction === "up" ? "lower" : "upper",
      head: design.direction === "up" ? "upper" : "lower",
      spine: name === "whole" ? "left" : "spine",
      outer: outwards === 1 ? "right" : "left",
    },
    toBoard: ({ x, y }) => ({ x: nearX + outwards * x, y: design.direction === "up" ? height - y : y }),
    fromBoard: ({ x, y }) => ({ x: outwards * (x - nearX), y: design.direction === "up" ? height - y : y }),
  });
  if (design.pattern === "single") return [side("whole", 0, 1)];
  return [side("left", middle - half, -1), side("right", middle + half, 1)];
}

/**
 * The start as a height at the spine over the edge that slats rise from. A start in the corner means the corner of the
 * board with its overhang, on the wider side where the spine is not in the middle.
 */
export function startHeightMm({ width }: Pick<SlatBoard, "width">, design: SlatDesign): number {
  if (design.start.kind === "height") return design.start.height;
  const { angle, overhang } = design;
  const whole = design.pattern === "single";
  const reach = whole ? width : (width - spineWidthOf(design)) / 2 + Math.abs(design.spineOffset);
  return cornerPhase({ reach: reach + overhang, angle }) - overhang;
}

/** A point of a side in the slats' own axes: x along them, y across. Turned only, so that lengths stay. */
export function alongSlats({ x, y }: Point, angle: number): Point {
  const { sin, cos } = slopeOf(angle);
  return { x: x * sin + y * cos, y: y * sin - x * cos };
}

/** The point of a side that lies so far along the slats and across them. */
export function fromSlats({ x, y }: Point, angle: number): Point {
  const { sin, cos } = slopeOf(angle);
  return { x: x * sin - y * cos, y: x * cos + y * sin };
}

/** Where a strip's two edges lie across the slats. */
export function stripEdges(strip: number, { phase }: Side, design: SlatDesign): readonly [from: number, to: number] {
  const from = phase * slopeOf(design.angle).sin + strip * (design.slatWidth + design.gap);
  return [from, from + design.slatWidth];
}
