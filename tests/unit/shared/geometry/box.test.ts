import { describe, expect, it } from "vitest";
import {
  boxCentre,
  boxContains,
  boxesOverlap,
  boxGrow,
  boxIntersection,
  boxOfPath,
  boxOfRegion,
  boxUnion,
} from "#shared/geometry/box.ts";
import { circlePath } from "#shared/geometry/shapes.ts";

const box = (x: number, y: number, width: number, height: number) => ({ x, y, width, height });

describe("boxes", () => {
  it("a cubic's box is that of the curve, not of its handles", () => {
    // B(t) of 0, 0, 30, 30 rises without turning; across, 0, 40, 40, 0 peaks at t = 1/2 with 30.
    const path = [
      {
        start: { x: 0, y: 0 },
        segments: [{ kind: "cubic" as const, c1: { x: 40, y: 0 }, c2: { x: 40, y: 30 }, to: { x: 0, y: 30 } }],
      },
    ];
    expect(boxOfPath(path)).toEqual(box(0, 0, 30, 30));
  });

  it("a circle of four cubics fits its square exactly", () => {
    const found = boxOfPath(circlePath({ x: 7, y: -3 }, 5));
    expect(found?.x).toBeCloseTo(2, 12);
    expect(found?.y).toBeCloseTo(-8, 12);
    expect(found?.width).toBeCloseTo(10, 12);
    expect(found?.height).toBeCloseTo(10, 12);
  });

  it("a cubic whose derivative is a straight line still finds its turn", () => {
    // Along y the cubic is the parabola 0, 20/3, 20/3, 0 with its top of 5 at t = 1/2.
    const path = [
      {
        start: { x: 0, y: 0 },
        segments: [{ kind: "cubic" as const, c1: { x: 1, y: 20 / 3 }, c2: { x: 2, y: 20 / 3 }, to: { x: 3, y: 0 } }],
      },
    ];
    expect(boxOfPath(path)?.height).toBeCloseTo(5, 12);
  });

  it("nothing has no box", () => {
    expect(boxOfPath([])).toBeNull();
    expect(boxOfRegion([])).toBeNull();
    expect(boxUnion([null, null])).toBeNull();
  });

  it("joins, shares, grows and centres", () => {
    expect(boxUnion([box(0, 0, 2, 2), null, box(5, -1, 1, 1)])).toEqual(box(0, -1, 6, 3));
    expect(boxIntersection(box(0, 0, 10, 10), box(6, 8, 9, 9))).toEqual(box(6, 8, 4, 2));
    expect(boxIntersection(box(0, 0, 10, 10), box(10, 0, 5, 5))).toEqual(box(10, 0, 0, 5));
    expect(boxIntersection(box(0, 0, 10, 10), box(11, 0, 5, 5))).toBeNull();
    expect(boxesOverlap(box(0, 0, 10, 10), box(10, 10, 1, 1))).toBe(true);
    expect(boxContains(box(0, 0, 10, 10), box(0, 0, 10, 10))).toBe(true);
    expect(boxContains(box(0, 0, 10, 10), box(1, 1, 10, 2))).toBe(false);
    expect(boxGrow(box(0, 0, 10, 4), 3)).toEqual(box(-3, -3, 16, 10));
    expect(boxGrow(box(0, 0, 10, 4), -3)).toEqual(box(3, 2, 4, 0));
    expect(boxCentre(box(2, 4, 10, 6))).toEqual({ x: 7, y: 7 });
  });
});
