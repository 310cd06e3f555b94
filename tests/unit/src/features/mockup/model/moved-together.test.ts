import { describe, expect, it } from "vitest";
import { flatRuns } from "@/features/mockup/canvas/flat-runs.ts";
import { movedTogether } from "@/features/mockup/model/moved-together.ts";

const shifts = (places: Record<string, [number, number]>) =>
  new Map(Object.entries(places).map(([id, [dx, dy]]) => [id, { dx, dy }] as const));

describe("what moved together", () => {
  it("is what moved by one distance, whatever lay off its place before", () => {
    const moved = movedTogether(shifts({ a: [5, 0], rests: [1, 1] }), shifts({ a: [8, 4], b: [3, 4], rests: [1, 1] }));
    expect(moved?.by).toEqual({ dx: 3, dy: 4 });
    expect([...(moved?.ids ?? [])]).toEqual(["a", "b"]);
  });

  it("is nothing when nothing moved, and no group when there are two distances", () => {
    expect(movedTogether(shifts({ a: [5, 0] }), shifts({ a: [5, 0] }))).toEqual({
      ids: new Set(),
      by: { dx: 0, dy: 0 },
    });
    expect(movedTogether(shifts({}), shifts({ a: [5, 0], b: [6, 0] }))).toBeNull();
  });

  it("counts what went back to its place", () => {
    expect(movedTogether(shifts({ a: [5, 0] }), shifts({}))).toEqual({ ids: new Set(["a"]), by: { dx: -5, dy: 0 } });
  });
});

describe("the runs of a picture", () => {
  const drawn = [
    { id: "board", layer: null },
    { id: "b1", layer: "layer:B" },
    { id: "b2", layer: "layer:B" },
    { id: "b3", layer: "layer:B" },
    { id: null, layer: null },
    { id: "c1", layer: "layer:C" },
  ];

  it("are one when nothing moves", () => {
    expect(flatRuns(drawn, new Set())).toEqual([{ moves: false, places: [0, 1, 2, 3, 4, 5] }]);
  });

  it("draw the rest of a layer before what moves in it, and everything above after it", () => {
    expect(flatRuns(drawn, new Set(["b2"]))).toEqual([
      { moves: false, places: [0, 1, 3] },
      { moves: true, places: [2] },
      { moves: false, places: [4, 5] },
    ]);
  });

  it("are few when much moves", () => {
    expect(flatRuns(drawn, new Set(["b1", "b3", "c1"]))).toEqual([
      { moves: false, places: [0, 2] },
      { moves: true, places: [1, 3] },
      { moves: false, places: [4] },
      { moves: true, places: [5] },
    ]);
  });
});
