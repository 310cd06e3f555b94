import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fillRoom, type RectangleWay } from "#shared/sheets/skyline.ts";

const upright = (wide: number, long: number): RectangleWay[] => [{ long, wide, way: 0 }];
const fill = (ways: RectangleWay[][], room: { long: number; wide: number }) => {
  const order = ways.map((_, index) => index);
  const laid = fillRoom(
    order,
    ways.map((_, index) => index),
    ways,
    room,
    { probes: 0 },
  );
  return { laid, left: order };
};

describe("filling a room with rectangles", () => {
  it("four quarters fill it", () => {
    const { laid, left } = fill([upright(5, 5), upright(5, 5), upright(5, 5), upright(5, 5)], { long: 10, wide: 10 });
    expect(laid.map(({ u, v }) => [u, v]).sort()).toEqual([
      [0, 0],
      [0, 5],
      [5, 0],
      [5, 5],
    ]);
    expect(left).toEqual([]);
  });

  it("prefers what fills a step to what comes first", () => {
    const { laid } = fill([upright(4, 2), upright(10, 3)], { long: 5, wide: 10 });
    expect(laid[0]?.rectangle).toBe(1);
  });

  it("leaves what is too long or too wide", () => {
    expect(fill([upright(11, 1), upright(1, 11), upright(3, 3)], { long: 10, wide: 10 }).left).toEqual([0, 1]);
  });

  it("turns a rectangle where it fits only so", () => {
    const ways = [
      [
        { long: 4, wide: 8, way: 0 },
        { long: 8, wide: 4, way: 1 },
      ],
    ];
    expect(fill(ways, { long: 9, wide: 5 }).laid[0]?.way.way).toBe(1);
  });

  it("never lays one over another or out of the room, and loses none", () => {
    const size = fc.integer({ min: 1, max: 12 });
    fc.assert(
      fc.property(fc.array(fc.tuple(size, size), { minLength: 1, maxLength: 25 }), size, size, (sizes, long, wide) => {
        const ways = sizes.map(([a, b]) => [
          { long: a, wide: b, way: 0 },
          { long: b, wide: a, way: 1 },
        ]);
        const room = { long: 2 * long, wide: 2 * wide };
        const { laid, left } = fill(ways, room);
        const cells = new Set<string>();
        for (const { u, v, way } of laid) {
          expect(u + way.long <= room.long && v + way.wide <= room.wide && u >= 0 && v >= 0).toBe(true);
          for (let x = 0; x < way.long; x++) for (let y = 0; y < way.wide; y++) cells.add(`${u + x},${v + y}`);
        }
        expect(cells.size).toBe(laid.reduce((sum, { way }) => sum + way.long * way.wide, 0));
        expect([...left, ...laid.map(({ rectangle }) => rectangle)].sort((a, b) => a - b)).toEqual(
          sizes.map((_, i) => i),
        );
      }),
      { numRuns: 300 },
    );
  });
});
