import { describe, expect, it } from "vitest";
import { regionAreaMm2, regionCentroid, regionPerimeterMm } from "#shared/geometry/area.ts";
import { connectedPieces } from "#shared/geometry/connected.ts";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import type { Polygon } from "#shared/geometry/path.ts";
import { ringDepths } from "#shared/geometry/ring-depths.ts";

const square = (x: number, y: number, side: number): Polygon => [
  { x, y },
  { x: x + side, y },
  { x: x + side, y: y + side },
  { x, y: y + side },
];
// A plate with a hole, an island in the hole with a hole of its own, and a plate beside them. Told in no order.
const island = square(8, 8, 14);
const islandHole = square(12, 12, 6);
const plate = square(0, 0, 30);
const hole = square(5, 5, 20);
const other = square(40, 0, 10);
const nest = [islandHole, hole, other, island, plate];

describe("rings in rings", () => {
  it("knows how deep each lies", () => {
    expect(ringDepths(nest)).toEqual([3, 1, 0, 2, 0]);
  });

  it("measures what is material, whichever way the rings run", () => {
    const area = 900 - 400 + 196 - 36 + 100;
    expect(regionAreaMm2(nest)).toBe(area);
    expect(regionAreaMm2(nest.map((ring, i) => (i % 2 ? ring.toReversed() : ring)))).toBe(area);
    expect(regionPerimeterMm(nest)).toBe(4 * (30 + 20 + 14 + 6 + 10));
  });

  it("splits into pieces, each with its own holes", () => {
    expect(connectedPieces(nest)).toEqual([[other], [island, islandHole], [plate, hole]]);
  });

  it("squares that meet in a corner are two pieces", () => {
    expect(connectedPieces([square(0, 0, 10), square(10, 10, 10)])).toHaveLength(2);
  });

  it("a hole that touches its plate's edge in a corner is still a hole", () => {
    const kite: Polygon = [
      { x: 0, y: 15 },
      { x: 8, y: 10 },
      { x: 16, y: 15 },
      { x: 8, y: 20 },
    ];
    expect(ringDepths([kite, plate])).toEqual([1, 0]);
    expect(connectedPieces([kite, plate])).toEqual([[plate, kite]]);
  });

  it("a notch that touches from outside is no hole", () => {
    const tooth: Polygon = [
      { x: 0, y: 15 },
      { x: -8, y: 10 },
      { x: -8, y: 20 },
    ];
    expect(ringDepths([tooth, plate])).toEqual([0, 0]);
  });

  it("two thousand squares side by side are sorted out", () => {
    const many = Array.from({ length: 2000 }, (_, i) => square((i % 50) * 3, Math.floor(i / 50) * 3, 2));
    expect(connectedPieces(many)).toHaveLength(2000);
  });

  it("nothing has no pieces, no area and no centroid", () => {
    expect(connectedPieces([])).toEqual([]);
    expect(regionAreaMm2([])).toBe(0);
    expect(regionCentroid([])).toBeNull();
  });

  it("a line has no area but a middle", () => {
    const line = [
      [
        { x: 0, y: 0 },
        { x: 10, y: 0 },
        { x: 5, y: 0 },
      ],
    ];
    expect(regionAreaMm2(line)).toBe(0);
    expect(regionCentroid(line)).toEqual({ x: 5, y: 0 });
  });

  it("a hole moves the centroid away from itself", () => {
    // 100 at 5 less 16 at 8: (500 − 128) / 84.
    expect(regionCentroid([square(0, 0, 10), square(6, 6, 4)])?.x).toBeCloseTo(372 / 84, 12);
  });
});

describe("a point and a region", () => {
  it.each([
    { x: 2, y: 2, inside: true },
    { x: 6, y: 6, inside: false },
    { x: 10, y: 10, inside: true },
    { x: 15, y: 15, inside: false },
    { x: 45, y: 5, inside: true },
    { x: 35, y: 5, inside: false },
  ])("$x, $y lies inside: $inside", ({ x, y, inside }) => {
    expect(regionContains(nest, { x, y })).toBe(inside);
  });

  it("tells the distance to the nearest edge, inside and out", () => {
    expect(distanceToRegionEdgeMm(nest, { x: 2, y: 15 })).toBe(2);
    expect(distanceToRegionEdgeMm(nest, { x: 53, y: -4 })).toBe(5);
    expect(distanceToRegionEdgeMm([], { x: 0, y: 0 })).toBe(Number.POSITIVE_INFINITY);
  });
});
