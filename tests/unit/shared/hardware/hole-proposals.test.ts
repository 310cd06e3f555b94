import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import { edgeOverlapMm } from "#shared/hardware/edge-grip.ts";
import { edgeGripPlaces } from "#shared/hardware/edge-places.ts";
import { cornerHoles, evenHoles, keepsLevel, rowHoles } from "#shared/hardware/hole-proposals.ts";

const box = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));
const panel = box(0, 0, 300, 200);
const usual = { edge: 15, apart: 30, level: [] };

describe("holes towards the corners", () => {
  it("are four on a panel, in from each corner, and symmetric", () => {
    const holes = cornerHoles(panel, usual);
    expect(holes.map(({ x, y }) => [x < 150, y < 100])).toEqual([
      [true, true],
      [false, true],
      [true, false],
      [false, false],
    ]);
    const [first] = holes;
    // On the diagonal, 15 mm off the long edges or a sixtieth of the way more.
    expect(first?.y).toBeGreaterThanOrEqual(15);
    expect(first?.y).toBeLessThan(15 + 100 / 60);
    expect((holes[3]?.x ?? 0) + (first?.x ?? 0)).toBeCloseTo(300, 9);
  });

  it.each([
    { name: "a panel of 44 by 44", piece: box(0, 0, 44, 44), count: 1 },
    { name: "a panel of 29 by 200", piece: box(0, 0, 29, 200), count: 0 },
    { name: "a disc of 100", piece: flattenPath(circlePath({ x: 0, y: 0 }, 50)), count: 4 },
    { name: "nothing", piece: [], count: 0 },
  ])("on $name are $count", ({ piece, count }) => {
    expect(cornerHoles(piece, usual)).toHaveLength(count);
  });

  it("come nearer each other until they fit, and stay outermost when they never do", () => {
    const across = (holes: readonly { x: number }[]) => (holes[1]?.x ?? 0) - (holes[0]?.x ?? 0);
    const near = cornerHoles(panel, usual, (holes) => across(holes) <= 150);
    expect(near).toHaveLength(4);
    expect(across(near)).toBeLessThanOrEqual(150);
    // One step further out they did not fit.
    expect(across(near)).toBeGreaterThan(150 - 300 / 60);
    expect(cornerHoles(panel, usual, () => false)).toEqual(cornerHoles(panel, usual));
  });

  it("keep a barrel on one level", () => {
    // Something ends at x 40 under the panel: a barrel of 15 mm may not stand across that line.
    const holes = cornerHoles(panel, { ...usual, level: [{ outlines: box(-100, -100, 140, 400), diameter: 15 }] });
    expect(holes).toHaveLength(4);
    for (const { x } of holes) expect(Math.abs(x - 40)).toBeGreaterThanOrEqual(7.5 - 1e-3);
  });
});

describe("even holes", () => {
  it("stand in rows no further apart than the pitch", () => {
    const holes = evenHoles(panel, usual, 100);
    // 270 mm take three gaps of 90, 170 two of 85.
    expect(holes).toHaveLength(12);
    expect(holes.slice(0, 4).map(({ x }) => x)).toEqual([15, 105, 195, 285]);
    expect(new Set(holes.map(({ y }) => y))).toEqual(new Set([15, 100, 185]));
  });

  it("of a piece as wide as its edges ask for are one column", () => {
    expect(evenHoles(box(0, 0, 30, 100), usual, 500).map(({ x }) => x)).toEqual([15, 15]);
  });

  it("leave out places in a cut-out", () => {
    const frame = [...panel, ...box(50, 50, 200, 100)];
    const holes = evenHoles(frame, { ...usual, edge: 10 }, 60);
    expect(holes.length).toBeGreaterThan(8);
    for (const hole of holes) expect(regionContains(frame, hole)).toBe(true);
  });

  it.each([0, -1, Number.NaN])("a pitch of %d gives none", (pitch) => {
    expect(evenHoles(panel, usual, pitch)).toEqual([]);
  });

  it("a pitch of next to nothing ends", () => {
    expect(evenHoles(panel, { ...usual, apart: 0 }, 1e-9).length).toBeLessThanOrEqual(400);
  });
});

it("every proposed hole keeps its distances", () => {
  const mm = fc.double({ min: 10, max: 400, noNaN: true });
  const small = fc.double({ min: 1, max: 30, noNaN: true });
  fc.assert(
    fc.property(mm, mm, small, small, mm, (width, height, edge, apart, pitch) => {
      const piece = box(-7, 3, width, height);
      const step = box(20, -1000, 10_000, 5000);
      const constraints = { edge, apart, level: [{ outlines: step, diameter: 15 }] };
      for (const holes of [cornerHoles(piece, constraints), evenHoles(piece, constraints, pitch)]) {
        for (const [index, hole] of holes.entries()) {
          expect(distanceToRegionEdgeMm(piece, hole)).toBeGreaterThanOrEqual(edge - 1e-3);
          expect(Math.abs(hole.x - 20)).toBeGreaterThanOrEqual(7.5 - 1e-3);
          for (const other of holes.slice(index + 1)) {
            expect(Math.hypot(hole.x - other.x, hole.y - other.y)).toBeGreaterThanOrEqual(apart - 1e-3);
          }
        }
      }
    }),
    { numRuns: 60 },
  );
});

describe("a row", () => {
  it("runs along a bar, however it is turned, no further apart than the pitch", () => {
    expect(rowHoles(box(0, 0, 400, 30), usual, 200)).toEqual([15, 200, 385].map((x) => ({ x, y: 15 })));
    const turned = rowHoles(box(0, 0, 30, 400), usual, 500);
    expect(turned.map(({ y }) => Math.round(y)).toSorted((a, b) => a - b)).toEqual([15, 385]);
  });
  it("is one hole on what is too short, and none on what is too narrow", () => {
    expect(rowHoles(box(0, 0, 40, 30), usual, 500)).toHaveLength(1);
    expect(rowHoles(box(0, 0, 400, 29), usual, 500)).toEqual([]);
    expect(rowHoles([], usual, 500)).toEqual([]);
    expect(rowHoles(panel, usual, 0)).toEqual([]);
  });
  it("draws together until it fits", () => {
    const across = (holes: readonly { x: number }[]) => (holes.at(-1)?.x ?? 0) - (holes[0]?.x ?? 0);
    const near = rowHoles(box(0, 0, 400, 30), usual, 500, (holes) => across(holes) <= 200);
    expect(across(near)).toBeLessThanOrEqual(200);
    expect(across(near)).toBeGreaterThan(200 - 370 / 60);
  });
});

describe("a level", () => {
  const plate = box(0, 0, 100, 100);
  it.each([
    { x: 50, either: true, inside: true, outside: false },
    { x: 92.5, either: true, inside: true, outside: false },
    { x: 93, either: false, inside: false, outside: false },
    { x: 107, either: false, inside: false, outside: false },
    { x: 107.5, either: true, inside: false, outside: true },
    { x: 500, either: true, inside: false, outside: true },
  ])("keeps a disc of 15 at $x: $either, inside $inside, outside $outside", ({ x, either, inside, outside }) => {
    const level = { outlines: plate, diameter: 15 };
    const at = { x, y: 50 };
    expect(keepsLevel(at, level)).toBe(either);
    expect(keepsLevel(at, { ...level, side: "inside" })).toBe(inside);
    expect(keepsLevel(at, { ...level, side: "outside" })).toBe(outside);
  });
  it("of nothing is kept outside only", () => {
    expect(keepsLevel({ x: 0, y: 0 }, { outlines: [], diameter: 15, side: "outside" })).toBe(true);
    expect(keepsLevel({ x: 0, y: 0 }, { outlines: [], diameter: 15, side: "inside" })).toBe(false);
  });
});

describe("places of edge grips", () => {
  const holder = { barrelDiameter: 16, gripDepth: 5 };
  it("are two at the upper edge and two at the lower one", () => {
    expect(edgeGripPlaces(panel, holder, []).map(({ x, y }) => [x, Math.round(y * 100) / 100])).toEqual([
      [75, -3],
      [225, -3],
      [75, 203],
      [225, 203],
    ]);
  });
  it("are moved along the edge off what is in the way, or left out", () => {
    const way = { outlines: box(60, -20, 40, 60), diameter: 16, side: "outside" as const };
    const [first] = edgeGripPlaces(panel, holder, [way]);
    expect(first?.x).toBe(45);
    const all = { outlines: box(-100, -100, 600, 150), diameter: 16, side: "outside" as const };
    expect(edgeGripPlaces(panel, holder, [all]).map(({ y }) => y > 100)).toEqual([true, true]);
  });
  it("reach over any edge by the slot's depth", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 20, max: 300, noNaN: true }),
        fc.double({ min: 1, max: 8, noNaN: true }),
        (radius, gripDepth) => {
          const round = flattenPath(circlePath({ x: 0, y: 0 }, radius));
          for (const place of edgeGripPlaces(round, { barrelDiameter: 16, gripDepth }, [])) {
            expect(edgeOverlapMm(16, round, place)).toBeCloseTo(gripDepth, 2);
          }
        },
      ),
    );
    expect(edgeGripPlaces([], holder, [])).toEqual([]);
  });
});
