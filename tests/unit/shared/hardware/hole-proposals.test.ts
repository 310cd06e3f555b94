import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import { cornerHoles, evenHoles } from "#shared/hardware/hole-proposals.ts";

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
