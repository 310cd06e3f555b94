import createClipper from "clipper2-wasm";
import { describe, expect, it } from "vitest";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { catchGroundsOf } from "@/features/mockup/model/catch-grounds.ts";
import { catchGuides } from "@/features/mockup/model/catch-guides.ts";
import { hideLayer } from "@/features/mockup/model/commands/show-layer.ts";
import { moveMeasures } from "@/features/mockup/model/move-measures.ts";
import { buildLayer, buildSign, plate } from "../../../../../support/build-sign.ts";

const kernel = clipperKernel(await createClipper());

type Aids = { readonly marginMm?: number | null; readonly gridMm?: number | null; readonly moved?: readonly string[] };
const groundsOf = (document: MockupDocument, { marginMm = null, gridMm = null, moved = ["moved"] }: Aids = {}) =>
  catchGroundsOf({
    document,
    figures: computeFigures(document, kernel),
    shifts: new Map(),
    movedIds: moved,
    marginMm,
    gridMm,
  });

/** A board of 600 × 400 with `pieces` in layer B and the one that is moved in layer C: 80 × 40 with its corner at 100, 50. */
const signOf = (...pieces: ReturnType<typeof plate>[]) =>
  buildSign([
    ...(pieces.length > 0 ? [buildLayer("B", pieces)] : []),
    buildLayer("C", [plate("moved", 80, 40, [140, 70])]),
  ]);
const box = { x: 100, y: 50, width: 80, height: 40 };
const move = (dx: number, dy: number, reachMm = 2) => ({ box, dx, dy, reachMm });
const at = (x: number, y: number) => ({ ...box, x, y });
const bare = groundsOf(signOf());

describe("catching the board", () => {
  it("catches its middle on both axes by centre lines over all of it", () => {
    // Middle of the box at 140, 70: 160 and 130 short of the board's.
    const caught = catchGuides(move(158.5, 131), bare);
    expect(caught).toMatchObject({ dx: 160, dy: 130 });
    expect(caught.guides).toEqual([
      { axis: "x", at: 300, of: "board", isMiddle: true, along: { from: 0, to: 400 } },
      { axis: "y", at: 200, of: "board", isMiddle: true, along: { from: 0, to: 600 } },
    ]);
  });

  it("catches an edge with an edge, not with a middle", () => {
    const caught = catchGuides(move(419, 33), bare);
    expect(caught).toMatchObject({ dx: 420, dy: 33 });
    expect(caught.guides.map(({ axis, at: place }) => [axis, place])).toEqual([["x", 600]]);
  });

  it("catches the margin where one is set, and none that would leave nothing of the board", () => {
    expect(catchGuides(move(-78.7, 291), groundsOf(signOf(), { marginMm: 20 }))).toMatchObject({ dx: -80, dy: 290 });
    expect(catchGuides(move(-78.7, 291), bare)).toMatchObject({ dx: -78.7, dy: 291, guides: [] });
    expect(groundsOf(signOf(), { marginMm: 200 }).y.edges.map(({ of }) => of)).toEqual(["board", "board"]);
  });

  it("leaves a move alone that comes near nothing", () => {
    expect(catchGuides(move(33, 44), bare)).toEqual({ dx: 33, dy: 44, guides: [] });
  });
});

describe("catching other pieces", () => {
  it("takes the nearest of several lines, and draws it over both", () => {
    const grounds = groundsOf(signOf(plate("a", 10, 10, [208, 105]), plate("b", 10, 10, [206.5, 125])));
    const { dx, guides } = catchGuides(move(101, 11, 3), grounds);
    expect(dx).toBe(101.5);
    expect(guides[0]).toMatchObject({ axis: "x", at: 201.5, along: { from: 60, to: 130 } });
  });

  it("takes the board's line before a piece's that is as near", () => {
    // The piece begins at 1.6: the box's edge at 0.8 is as far from it as from the board's.
    const grounds = groundsOf(signOf(plate("a", 10, 10, [6.6, 105])));
    expect(catchGuides({ box: at(0.8, 50), dx: 0, dy: 0, reachMm: 2 }, grounds).dx).toBe(-0.8);
    expect(catchGuides({ box: at(1.4, 50), dx: 0, dy: 0, reachMm: 2 }, grounds).dx).toBeCloseTo(0.2, 9);
  });

  it("asks more of the hand for a piece across the board than for one beside it", () => {
    const [near, far] = [signOf(plate("a", 60, 20, [250, 120])), signOf(plate("a", 60, 20, [250, 390]))];
    // The piece begins at 220, which is 1.4 from the box that was moved by 118.6.
    expect(catchGuides(move(118.6, 0), groundsOf(near)).dx).toBe(120);
    expect(catchGuides(move(118.6, 0), groundsOf(far)).dx).toBe(118.6);
    expect(catchGuides(move(119.5, 0), groundsOf(far)).dx).toBe(120);
  });

  it("catches nothing that is hidden, and not what moves along", () => {
    const sign = signOf(plate("a", 60, 20, [250, 110]));
    expect(catchGuides(move(119, 0), groundsOf(hideLayer(sign, { key: "B", hidden: true }))).guides).toEqual([]);
    expect(catchGuides(move(119, 0), groundsOf(sign, { moved: ["moved", "a"] })).guides).toEqual([]);
  });

  it("knows the box round a layer of several pieces", () => {
    const grounds = groundsOf(signOf(plate("a", 20, 20, [210, 300]), plate("b", 20, 20, [430, 300])));
    // The layer reaches from 200 to 440: its middle is no piece's.
    const { dx, guides } = catchGuides(move(181, 0), grounds);
    expect(dx).toBe(180);
    expect(guides[0]).toMatchObject({ at: 320, of: "layer", isMiddle: true });
  });
});

describe("equal gaps", () => {
  it("come out between two neighbours", () => {
    const grounds = groundsOf(signOf(plate("a", 40, 40, [60, 70]), plate("b", 40, 40, [353, 70])));
    // From 80 to 333 there are 253, less 80 for the box: 86.5 on each side.
    expect(catchGuides(move(65.5, 0), grounds).dx).toBe(66.5);
    const measures = moveMeasures(at(166.5, 50), grounds).filter(({ of }) => of === "piece");
    expect(measures).toEqual([
      { axis: "x", of: "piece", from: 80, to: 166.5, level: 70, isEqual: true },
      { axis: "x", of: "piece", from: 246.5, to: 333, level: 70, isEqual: true },
    ]);
  });

  it("come out after two neighbours, as far as these are apart", () => {
    const grounds = groundsOf(signOf(plate("a", 40, 40, [60, 70]), plate("b", 40, 40, [137, 70])));
    // 80 to 117 are 37 apart; the second ends at 157.
    expect(catchGuides(move(95, 0), grounds).dx).toBe(94);
    expect(moveMeasures(at(194, 50), grounds).filter(({ of }) => of === "piece")).toEqual([
      { axis: "x", of: "piece", from: 80, to: 117, level: 70, isEqual: true },
      { axis: "x", of: "piece", from: 157, to: 194, level: 70, isEqual: true },
    ]);
  });
});

describe("a grid", () => {
  it("catches an edge wherever nothing else is meant", () => {
    // 2.4 from the lines on both sides, across; down 0.75 from the one at 50.
    const caught = catchGuides(move(2.4, 0.75, 1.5), groundsOf(signOf(), { gridMm: 5 }));
    expect(caught).toMatchObject({ dx: 2.4, dy: 0 });
    // Only the right edge, which is 81 from the left one, comes near a line.
    const odd = { box: { ...box, width: 81 }, dx: 3.3, dy: 0.75, reachMm: 1.5 };
    const right = catchGuides(odd, groundsOf(signOf(), { gridMm: 5 }));
    expect(right.dx).toBeCloseTo(4, 9);
    expect(right.guides[0]).toMatchObject({ axis: "x", at: 185, of: "grid" });
  });
});

describe("measured distances", () => {
  it("go from the box to the board's edges, and are told equal in the middle", () => {
    expect(moveMeasures(at(260, 30), bare)).toEqual([
      { axis: "x", of: "board", from: 0, to: 260, level: 30, isEqual: true },
      { axis: "x", of: "board", from: 340, to: 600, level: 30, isEqual: true },
      { axis: "y", of: "board", from: 0, to: 30, level: 260, isEqual: false },
      { axis: "y", of: "board", from: 70, to: 400, level: 260, isEqual: false },
    ]);
  });

  it("leave out what is nothing, and measure what hangs over the edge", () => {
    expect(moveMeasures(at(0, -12), bare).map(({ axis, from, to }) => [axis, from, to])).toEqual([
      ["x", 80, 600],
      ["y", -12, 0],
      ["y", 28, 400],
    ]);
  });

  it("go to the nearest neighbour only, and not to what lies under or over the box", () => {
    const grounds = groundsOf(
      signOf(plate("under", 300, 200, [150, 120]), plate("near", 30, 30, [345, 60]), plate("far", 30, 30, [445, 60])),
    );
    const found = moveMeasures(box, grounds).filter(({ of }) => of === "piece");
    expect(found).toEqual([{ axis: "x", of: "piece", from: 180, to: 330, level: 62.5, isEqual: false }]);
  });
});
