import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Point } from "#shared/geometry/path.ts";
import { screwReach } from "#shared/hardware/screw-reach.ts";
import { backerMovement } from "#shared/slats/backer-movement.ts";
import { checkedSlats } from "#shared/slats/check-slats.ts";
import { footOnSlats, openJointsOf } from "#shared/slats/foot-on-slats.ts";
import { glueArea } from "#shared/slats/glue-area.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import { sawSettings, settingsBeyond } from "#shared/slats/saw-settings.ts";
import { slatHold } from "#shared/slats/slat-hold.ts";
import type { SlatBoard, SlatCut, SlatDesign, SlatEdge } from "#shared/slats/slat-layout.ts";
import { slatRefusalWords } from "#shared/slats/slat-words.ts";
import { hasParallelCuts, stockTaken } from "#shared/slats/stock-taken.ts";
import { resultOf } from "../../../support/reference-data.ts";
import { outlines, usualBoard, usualSlats } from "../../../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const lay = (change: Partial<SlatDesign> = {}, board: SlatBoard = usualBoard) =>
  resultOf(layOutSlats(board, { ...usualSlats, ...change }, kernel));
const cut = (edge: SlatEdge, setting: number, mustFit = true): SlatCut => ({ edge, setting, mustFit });

describe("saw settings", () => {
  it("of 45 degrees are 45 all through", () => {
    const { slats } = lay();
    const [only, second] = sawSettings(slats);
    expect(second).toBeUndefined();
    // 26 slats of two ends, and one corner more in each where the spine's foot or the upper corner lies in it.
    const corners = slats.filter(({ near, far }) => near.length + far.length > 2).length;
    expect(only).toEqual({ setting: 45, cuts: 52 + corners, fitting: 52 + corners });
  });

  it("of 30 degrees are 60 at the spine and 30 along the level edges", () => {
    expect(sawSettings(lay({ angle: 30 }).slats).map(({ setting }) => setting)).toEqual([60, 30]);
  });

  it("count only cuts at the spine as fitting where the rest is trimmed", () => {
    const [steep, flat] = sawSettings(lay({ angle: 30, overhang: 25 }).slats);
    expect(steep?.fitting).toBeGreaterThan(0);
    expect(steep?.fitting).toBeLessThan(steep?.cuts ?? 0);
    expect(flat?.fitting).toBe(0);
  });

  it.each([
    { angle: 40, most: 50, beyond: [] },
    { angle: 39.9, most: 50, beyond: [50.1] },
    { angle: 15, most: 60, beyond: [75] },
    { angle: 80, most: 60, beyond: [] },
  ])("$angle degrees and a saw that turns $most: beyond it $beyond", ({ angle, most, beyond }) => {
    const { slats } = lay({ angle, overhang: 30 });
    expect(settingsBeyond(slats, most).map(({ setting }) => setting)).toEqual(beyond);
  });

  it("that are trimmed away ask nothing of the saw", () => {
    const slat = { near: [cut("lower", 80, false)], far: [cut("right", 10)] };
    expect(settingsBeyond([slat], 50)).toEqual([]);
    expect(settingsBeyond([{ ...slat, near: [cut("lower", 80)] }], 50)).toEqual([{ setting: 80, cuts: 1, fitting: 1 }]);
  });
});

describe("what a slat takes of its stock", () => {
  it("is its length and a kerf along it: 3 mm at 45 degrees is 4.24", () => {
    const slat = { longPoint: 334.448, near: [cut("spine", 45)], far: [cut("right", 45)] };
    const taken = resultOf(stockTaken(slat, { kerf: 3, slatWidth: 38.1 }));
    expect(taken.aloneMm - 334.448).toBeCloseTo(4.2426, 4);
    // a/sin 45 and the kerf, a = 209.55; one point of w cot 45 more.
    expect(taken.nested?.eachMm).toBeCloseTo(209.55 * Math.SQRT2 + 3 * Math.SQRT2, 2);
    expect(taken.nested?.onceMm).toBeCloseTo(38.1, 9);
  });

  it("is the kerf alone for a square cut", () => {
    const slat = { longPoint: 100, near: [cut("spine", 0)], far: [cut("right", 0)] };
    expect(resultOf(stockTaken(slat, { kerf: 3, slatWidth: 38.1 }))).toEqual({
      aloneMm: 103,
      nested: { eachMm: 103, onceMm: 0 },
    });
  });

  it("goes by the flattest cut, and does not nest what is not parallel", () => {
    const slat = { longPoint: 100, near: [cut("spine", 60)], far: [cut("upper", 30)] };
    expect(resultOf(stockTaken(slat, { kerf: 3, slatWidth: 38.1 }))).toEqual({
      aloneMm: expect.closeTo(106, 9),
      nested: null,
    });
  });

  it.each([
    { near: ["spine"], far: ["right"], parallel: true },
    { near: ["lower"], far: ["upper"], parallel: true },
    { near: ["left"], far: ["right"], parallel: true },
    { near: ["spine"], far: ["upper"], parallel: false },
    { near: ["spine", "lower"], far: ["right"], parallel: false },
    { near: ["outline"], far: ["outline"], parallel: false },
  ] as const)("$near to $far: parallel $parallel", ({ near, far, parallel }) => {
    const cuts = (edges: readonly SlatEdge[]) => edges.map((edge) => cut(edge, 45));
    expect(hasParallelCuts({ near: cuts(near), far: cuts(far) })).toBe(parallel);
  });

  it("refuses a kerf that is none", () => {
    const slat = { longPoint: 100, near: [cut("spine", 0)], far: [cut("right", 0)] };
    expect(stockTaken(slat, { kerf: Number.NaN, slatWidth: 38.1 })).toMatchObject({
      ok: false,
      reason: { field: "kerf" },
    });
  });
});

describe("glue", () => {
  it("covers the whole board without gaps, and what lies over the edge too while it is spread", () => {
    const { areaMm2, massG } = resultOf(glueArea(lay()));
    expect(areaMm2).toBeCloseTo(457.2 * 482.6, 3);
    expect(massG).toBeCloseTo((457.2 * 482.6 * 200) / 1e6, 6);
    const over = resultOf(glueArea(lay({ overhang: 30 }), 150));
    expect(over.areaMm2).toBeCloseTo(457.2 * 482.6, 3);
    expect(over.massG).toBeGreaterThan((457.2 * 482.6 * 150) / 1e6);
    expect(over.massG).toBeLessThan((517.2 * 542.6 * 150) / 1e6 + 1e-6);
  });

  it("is refused a spread below nothing", () => {
    expect(glueArea(lay(), -1)).toMatchObject({ ok: false, reason: { field: "spread" } });
  });
});

describe("what holds a screw", () => {
  const reach = (length: number) =>
    resultOf(screwReach({ kind: "capStud", length, floor: 2.5, seat: "flat in a countersunk floor", headHeight: 2 }))
      .point;
  // A flat head of 16 in a floor of 2.5: the point is 13.5 deep.
  it.each([
    { length: 16, slat: 7.5, past: 6, only: false },
    { length: 16, slat: 7.6, past: 5.9, only: true },
    { length: 12, slat: 12, past: -2.5, only: true },
  ])("$length long through a slat of $slat: $past past it", ({ length, slat, past, only }) => {
    const hold = resultOf(slatHold(reach(length), { slat, substrate: 12 }));
    expect(hold).toEqual({ pastSlatMm: expect.closeTo(past, 9), neededMm: 6, onlySlat: only });
  });
  it("refuses what is no number", () => {
    expect(slatHold({ least: Number.NaN }, { slat: 9, substrate: 12 })).toMatchObject({ ok: false });
  });
});

describe("a barrel on slats", () => {
  it("stands on wood all round, and over no joint where there is no gap", () => {
    const foot = footOnSlats({ x: 120, y: 200, diameter: 15 }, lay(), [{ x: 120, y: 206 }], kernel);
    expect(foot.onWood).toBeCloseTo(1, 3);
    expect(foot.overJoint).toBe(false);
    expect(foot.nearestBradMm).toBeCloseTo(6, 9);
  });

  it("stands on the spine", () => {
    const foot = footOnSlats({ x: 228.6, y: 200, diameter: 15 }, lay({ gap: 6 }), [], kernel);
    expect(foot.onWood).toBeCloseTo(1, 3);
    expect(foot.overJoint).toBe(false);
  });

  it("over an open joint misses the joint's wood", () => {
    const layout = lay({ gap: 6 });
    const joint = openJointsOf(layout)[8];
    if (!joint) throw new Error("No joint.");
    const middle = { x: (joint.from.x + joint.to.x) / 2, y: (joint.from.y + joint.to.y) / 2 };
    const foot = footOnSlats({ ...middle, diameter: 15 }, layout, [], kernel);
    expect(foot.overJoint).toBe(true);
    // A band of 6 through the middle of a disc of 15.
    const half = 7.5;
    const band = 2 * (half ** 2 * Math.asin(3 / half) + 3 * Math.sqrt(half ** 2 - 9));
    expect(foot.onWood).toBeCloseTo(1 - band / (Math.PI * half ** 2), 2);
  });

  it.each([
    { pattern: "spine", name: "" },
    { pattern: "mitred", name: "" },
    { pattern: "single", name: "" },
    { pattern: "single", name: "ellipse" },
    { pattern: "spine", name: "notched" },
  ] as const)("open joints of $pattern $name run where there is no wood", ({ pattern, name }) => {
    const board = name ? { width: 600, height: 500, outline: outlines[name] ?? [] } : usualBoard;
    const layout = lay({ pattern, gap: 8, overhang: 10, angle: 60 }, board);
    const joints = openJointsOf(layout);
    expect(joints.length).toBeGreaterThan(8);
    const wood = layout.slats.flatMap(({ untrimmed }) => [untrimmed]);
    for (const { from, to, width } of joints) {
      expect(width).toBe(8);
      const along = Math.hypot(to.x - from.x, to.y - from.y);
      const turned: Point = { x: (-(to.y - from.y) / along) * 3.9, y: ((to.x - from.x) / along) * 3.9 };
      const band = [
        { x: from.x + turned.x, y: from.y + turned.y },
        { x: to.x + turned.x, y: to.y + turned.y },
        { x: to.x - turned.x, y: to.y - turned.y },
        { x: from.x - turned.x, y: from.y - turned.y },
      ];
      expect(regionAreaMm2(kernel.intersect([band], wood))).toBeLessThan(0.05);
    }
  });
});

describe("movement of slats and what they are glued to", () => {
  // Eastern white pine, 0.00212 a point; 6 to 11 %.
  const backer = {
    width: 457.2,
    height: 482.6,
    angle: 45,
    slatWidth: 100,
    slatPerPoint: 0.00212,
    substrate: { perPoint: 0.0002, grain: 0 },
    from: 6,
    to: 11,
  };

  it("a slat of 100 grows 1.06 mm, and at 45 degrees half of that goes each way", () => {
    const { slat, acrossWidth, acrossHeight } = resultOf(backerMovement(backer));
    // Wood Handbook, eq. 13-2, calculated.
    expect(slat).toBeCloseTo(1.06, 9);
    expect(acrossWidth.slats).toBeCloseTo(457.2 * 0.00212 * 5 * 0.5, 9);
    expect(acrossHeight.slats).toBeCloseTo(482.6 * 0.00212 * 5 * 0.5, 9);
    expect(acrossWidth.substrate).toBeCloseTo(0, 9);
    expect(acrossHeight.substrate).toBeCloseTo(482.6 * 0.0002 * 5, 9);
  });

  it("level slats move upright only", () => {
    const { acrossWidth, acrossHeight, held } = resultOf(backerMovement({ ...backer, angle: 90 }));
    expect(acrossWidth.slats).toBeCloseTo(0, 9);
    expect(acrossHeight.slats).toBeCloseTo(482.6 * 0.00212 * 5, 9);
    expect(held.along).toBe("height");
    expect(held.mm).toBeCloseTo(482.6 * (0.00212 - 0.0002) * 5, 9);
  });

  it("steep slats move level the most", () => {
    expect(resultOf(backerMovement({ ...backer, angle: 15 })).held.along).toBe("width");
  });

  it.each([
    { from: 6, to: 11, hollow: "back" },
    { from: 11, to: 6, hollow: "front" },
    { from: 8, to: 8, hollow: "neither" },
  ] as const)("from $from to $to % the hollow side is: $hollow", ({ from, to, hollow }) => {
    expect(resultOf(backerMovement({ ...backer, from, to })).held.hollow).toBe(hollow);
  });

  it.each([
    { change: { from: 5 }, field: "from" },
    { change: { to: 15 }, field: "to" },
    { change: { angle: 10 }, field: "angle" },
    { change: { width: Number.NaN }, field: "width" },
    { change: { slatPerPoint: -1 }, field: "perPoint" },
    { change: { substrate: { perPoint: Number.NaN, grain: 0 } }, field: "perPoint" },
    { change: { substrate: { perPoint: 0.001, grain: Number.NaN } }, field: "grainAngle" },
  ])("$change is refused", ({ change, field }) => {
    expect(backerMovement({ ...backer, ...change })).toMatchObject({ ok: false, reason: { field } });
  });

  const number = fc.oneof(fc.double(), fc.constantFrom(0, 6, 14, 45, 90, 0.002, Number.NaN, 1e308));
  it("is sound or refused for any numbers", () => {
    fc.assert(
      fc.property(fc.array(number, { minLength: 9, maxLength: 9 }), (values) => {
        const [width = 0, height = 0, angle = 0, slatWidth = 0, slatPerPoint = 0, perPoint = 0, grain = 0] = values;
        const [from = 0, to = 0] = values.slice(7);
        const outcome = backerMovement({
          width,
          height,
          angle,
          slatWidth,
          slatPerPoint,
          substrate: { perPoint, grain },
          from,
          to,
        });
        if (outcome.ok) expect(Object.values(outcome.value.acrossWidth).every(Number.isFinite)).toBe(true);
      }),
      { numRuns: 300 },
    );
  });
});

describe("words of refusal", () => {
  const words = (change: Partial<SlatDesign>, board: Partial<SlatBoard> = {}) => {
    const outcome = checkedSlats({ ...usualBoard, ...board }, { ...usualSlats, ...change }, () => null);
    return outcome.ok ? null : slatRefusalWords(outcome.reason, "mm");
  };
  it.each([
    { change: { slatWidth: 600 }, text: "A slat of 600 mm is wider than the board: choose 457.2 mm at most." },
    { change: { angle: 10 }, text: "Slats stand at 15 to 90 degrees to the spine, not at 10." },
    { change: { angle: Number.NaN }, text: "Slats stand at 15 to 90 degrees to the spine." },
    { change: { gap: 50 }, text: "A gap of 50 mm is wider than the slats of 38.1 mm: choose a narrower one." },
    { change: { gap: Number.NaN }, text: "The gap between slats must lie between 0 mm and 38.1 mm." },
    { change: { overhang: -3 }, text: "The overhang must lie between 0 mm and 1000 mm, not at −3 mm." },
    { change: {}, board: { width: Number.NaN }, text: "The board's width must lie between 0 mm and 10000 mm." },
    {
      change: { slatWidth: 1, gap: 0 },
      board: { width: 9000, height: 9000 },
      text: "That is about 19092 slats, and a board takes 2000 at most: choose wider ones or a wider gap.",
    },
    {
      change: { slatWidth: 1, spineWidth: 1, pattern: "spine" as const },
      board: { width: 1.5 },
      text: "The board is too narrow for slats on both sides of a spine.",
    },
    {
      change: { slatWidth: 2 },
      board: { outline: [Array.from({ length: 5000 }, (_, index) => ({ x: index / 20, y: (index % 2) * 400 }))] },
      text: "The board's outline is too jagged for slats this narrow: simplify it, or choose wider ones.",
    },
    { change: {}, board: { outline: [] }, text: "The board's outline has 0 points: it takes 3 to 20000. Simplify it." },
  ])("$text", ({ change, board, text }) => {
    expect(words(change, board)).toBe(text);
  });
});
