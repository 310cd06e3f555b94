import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2, signedRingArea } from "#shared/geometry/area.ts";
import { connectedPieces } from "#shared/geometry/connected.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import type { Slat, SlatBoard, SlatDesign } from "#shared/slats/slat-layout.ts";
import { resultOf } from "../../../support/reference-data.ts";
import { outlines, rectangle, usualBoard, usualSlats } from "../../../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const lay = (change: Partial<SlatDesign> = {}, board: SlatBoard = usualBoard) =>
  resultOf(layOutSlats(board, { ...usualSlats, ...change }, kernel));
const slatOf = (slats: readonly Slat[], side: Slat["side"], strip = 5) => {
  const slat = slats.find((one) => one.side === side && one.strip === strip);
  if (!slat) throw new Error(`No slat ${strip} on side ${side}.`);
  return slat;
};

describe("a board of 457.2 × 482.6 with 38.1 slats at 45 degrees to a spine of 38.1", () => {
  it("has 13 slats a side and a spine as long as the board", () => {
    const { slats, spine } = lay();
    expect(slats.filter(({ side }) => side === "left")).toHaveLength(13);
    expect(slats.filter(({ side }) => side === "right")).toHaveLength(13);
    expect(spine?.length).toBeCloseTo(482.6, 9);
    expect(regionAreaMm2(spine?.trimmed ?? [])).toBeCloseTo(38.1 * 482.6, 6);
  });

  it("covers the board without a gap", () => {
    const { slats, spine } = lay();
    const area = slats.reduce((sum, { trimmed }) => sum + regionAreaMm2(trimmed), regionAreaMm2(spine?.trimmed ?? []));
    expect(area).toBeCloseTo(457.2 * 482.6, 4);
  });

  it("cuts its full slats at 45 degrees both ends, 334.45 tip to tip and 296.35 along either edge", () => {
    const slat = slatOf(lay().slats, "right");
    expect(slat.longPoint).toBeCloseTo(334.448, 3);
    // a/sin 45 on both edges, a = 209.55.
    expect(slat.shortPoint).toBeCloseTo(296.348, 3);
    expect(slat.near).toEqual([{ edge: "spine", setting: 45, mustFit: true }]);
    expect(slat.far).toEqual([{ edge: "right", setting: 45, mustFit: true }]);
    expect(slat.isTrimmed).toBe(false);
  });

  it("rises outwards on both sides, mirrored at the spine", () => {
    const { slats } = lay();
    const [left, right] = [slatOf(slats, "left"), slatOf(slats, "right")];
    expect(right.axis.to.x).toBeGreaterThan(right.axis.from.x);
    expect(right.axis.to.y).toBeLessThan(right.axis.from.y);
    expect(left.axis.to.x).toBeCloseTo(457.2 - right.axis.to.x, 9);
    expect(left.axis.to.y).toBeCloseTo(right.axis.to.y, 9);
    for (const one of slats.filter(({ side }) => side === "right")) {
      const other = slats.find(({ side, strip }) => side === "left" && strip === one.strip);
      expect(other?.longPoint).toBeCloseTo(one.longPoint, 9);
    }
  });

  it("falls outwards as the mirror image of rising", () => {
    const [up, down] = [lay().slats, lay({ direction: "down" }).slats];
    expect(down).toHaveLength(up.length);
    for (const [index, slat] of down.entries()) {
      const other = up[index];
      expect(slat.axis.to.y).toBeCloseTo(482.6 - (other?.axis.to.y ?? 0), 9);
      expect(slat.axis.to.x).toBeCloseTo(other?.axis.to.x ?? 0, 9);
      expect(slat.longPoint).toBe(other?.longPoint);
    }
    expect(down[0]?.near).toEqual([{ edge: "upper", setting: 45, mustFit: true }]);
  });

  it("is laid past the edge and trimmed flush", () => {
    const { slats, spine } = lay({ overhang: 30 });
    const slat = slatOf(slats, "right", 7);
    // Past the edge by 30, which is 42.43 along the slat.
    expect(slat.longPoint - slat.trimmedLongPoint).toBeCloseTo(30 * Math.SQRT2, 6);
    expect(slat.isTrimmed).toBe(true);
    expect(slat.near[0]?.mustFit).toBe(true);
    expect(slat.far[0]?.mustFit).toBe(false);
    expect(spine?.length).toBeCloseTo(542.6, 9);
    for (const point of slats.flatMap(({ trimmed }) => trimmed.flat())) {
      expect(Math.max(-point.x, point.x - 457.2, -point.y, point.y - 482.6)).toBeLessThan(1e-9);
    }
    for (const point of slats.flatMap(({ untrimmed }) => untrimmed)) {
      expect(Math.max(-point.x, point.x - 457.2, -point.y, point.y - 482.6)).toBeLessThan(30 + 1e-9);
    }
  });

  it("leaves out slats that trimming would take whole", () => {
    // The topmost slat begins 2 mm over the board.
    const start = { kind: "height", height: 484.6 - 9 * (38.1 * Math.SQRT2) } as const;
    const { slats } = lay({ start, overhang: 30 });
    expect(Math.max(...slats.map(({ strip }) => strip))).toBe(8);
  });

  it("begins with the slat at the start and goes back from there", () => {
    const { slats } = lay({ start: { kind: "height", height: 100 } });
    expect(slats.map(({ order }) => order)).toEqual(slats.map((_, index) => index + 1));
    expect(slats.slice(0, 2).map(({ side, strip }) => `${side} ${strip}`)).toEqual(["left 0", "right 0"]);
    const strips = slats.filter(({ side }) => side === "left").map(({ strip }) => strip);
    expect(strips).toEqual([0, 1, 2, 3, 4, 5, 6, 7, -1, -2, -3, -4, -5, -6]);
    // Its lower edge meets the spine at 100 over the lower edge.
    const right = slats[1];
    const atSpine = right?.trimmed.flat().filter(({ x }) => Math.abs(x - 247.65) < 1e-6) ?? [];
    expect(Math.max(...atSpine.map(({ y }) => y))).toBeCloseTo(482.6 - 100, 6);
  });

  it("meets at a spine that is not in the middle", () => {
    const { slats } = lay({ spineOffset: 60 });
    const heights = (side: Slat["side"], x: number) =>
      slats
        .filter((slat) => slat.side === side)
        .flatMap(({ trimmed }) => trimmed.flat())
        .filter((point) => Math.abs(point.x - x) < 1e-6 && point.y > 1e-6 && point.y < 482.6 - 1e-6)
        .map(({ y }) => y.toFixed(6))
        .toSorted();
    expect(heights("right", 228.6 + 60 + 19.05).length).toBeGreaterThan(14);
    expect(heights("right", 228.6 + 60 + 19.05)).toEqual(heights("left", 228.6 + 60 - 19.05));
  });
});

describe("a spine off the middle", () => {
  it("to the left is the mirror image of one to the right, with the corner of the wider side as its start", () => {
    const [right, left] = [lay({ spineOffset: 60 }), lay({ spineOffset: -60 })];
    expect(left.startHeight).toBe(right.startHeight);
    expect(left.startHeight).toBeCloseTo(-(209.55 + 60), 9);
    const mirrored = left.slats.filter(({ side }) => side === "left").map(({ longPoint }) => longPoint);
    expect(mirrored).toEqual(
      right.slats.filter(({ side }) => side === "right").map(({ longPoint }) => expect.closeTo(longPoint, 9)),
    );
  });
});

describe("slats as they are laid", () => {
  const cases = [...Object.keys(outlines), ""].flatMap((name) =>
    (["spine", "mitred", "single"] as const).map((pattern) => ({
      name: name || "rectangle",
      outline: outlines[name],
      pattern,
    })),
  );
  it.each(cases)("$pattern on $name: no two lie on each other", ({ outline, pattern }) => {
    const board = outline ? { width: 600, height: 500, outline } : usualBoard;
    const { slats, spine } = lay({ pattern, overhang: 30, angle: 52 }, board);
    const pieces = [...slats, ...(spine ? [spine] : [])].map(({ untrimmed }) => untrimmed);
    const area = pieces.reduce((sum, piece) => sum + regionAreaMm2([piece]), 0);
    const joined = regionAreaMm2(
      kernel.union(
        pieces.map((piece) => (signedRingArea(piece) < 0 ? piece.toReversed() : piece)),
        "nonzero",
      ),
    );
    expect(Math.abs(area - joined)).toBeLessThan(pieces.length * 2);
  });
});

describe("other patterns", () => {
  it("mitred to each other have no spine and reach to the middle", () => {
    const { slats, spine } = lay({ pattern: "mitred" });
    expect(spine).toBeNull();
    expect(slatOf(slats, "right").longPoint).toBeCloseTo(361.388, 2);
    expect(slatOf(slats, "right").axis.from.x).toBeGreaterThan(228.6 - 14);
  });

  it("in one direction run from edge to edge, past both", () => {
    const { slats } = lay({ pattern: "single", overhang: 20 });
    expect(new Set(slats.map(({ side }) => side))).toEqual(new Set(["whole"]));
    const full = slats.find(({ near, far }) => near[0]?.edge === "left" && far[0]?.edge === "right");
    expect(full).toBeUndefined();
    const low = lay({ pattern: "single", overhang: 20, angle: 75 }).slats;
    const across = low.find(({ near, far }) => near[0]?.edge === "left" && far[0]?.edge === "right");
    expect(across?.near).toEqual([{ edge: "left", setting: 15, mustFit: false }]);
    expect(across?.longPoint).toBeCloseTo(
      497.2 / Math.sin((75 * Math.PI) / 180) + 38.1 / Math.tan((75 * Math.PI) / 180),
      9,
    );
  });

  it("square to the spine are all as long as the side is wide", () => {
    const { slats } = lay({ angle: 90, overhang: 10 });
    expect(slats.every(({ longPoint }) => Math.abs(longPoint - 219.55) < 1e-9)).toBe(true);
    expect(slats.every(({ near, far }) => near[0]?.setting === 0 && far[0]?.setting === 0)).toBe(true);
  });

  it("with gaps leave them open", () => {
    const { slats, spine, pitch } = lay({ gap: 4 });
    expect(pitch).toBeCloseTo(42.1 * Math.SQRT2, 9);
    const area = slats.reduce((sum, { trimmed }) => sum + regionAreaMm2(trimmed), regionAreaMm2(spine?.trimmed ?? []));
    expect(area / (457.2 * 482.6)).toBeLessThan(1);
    expect(area / (457.2 * 482.6)).toBeGreaterThan(38.1 / 42.1 - 0.02);
  });
});

describe("boards that are no rectangles", () => {
  const board = (outline: SlatBoard["outline"]): SlatBoard => ({ width: 600, height: 500, outline });

  it("a rounded board cuts only the slats in its corners square", () => {
    const { slats } = lay({ overhang: 30 }, board(outlines["rounded corners"] ?? []));
    const settings = slats.filter(({ side }) => side === "right").map(({ far }) => Math.round(far[0]?.setting ?? -1));
    expect(settings.filter((setting) => setting === 45).length).toBeGreaterThan(9);
    expect(settings.filter((setting) => setting === 0).length).toBeGreaterThan(0);
  });

  it("an ellipse is covered from edge to edge", () => {
    const outline = outlines.ellipse ?? [];
    const { slats, spine } = lay({ overhang: 25, angle: 60 }, board(outline));
    const area = slats.reduce((sum, { trimmed }) => sum + regionAreaMm2(trimmed), regionAreaMm2(spine?.trimmed ?? []));
    expect(area).toBeGreaterThan(regionAreaMm2(outline) - 15);
    expect(area).toBeLessThan(regionAreaMm2(outline) + 15);
    expect(slats.every(({ isTrimmed }) => isTrimmed)).toBe(true);
  });

  it("islands have slats of their own, and a narrow notch is laid over and trimmed out", () => {
    const apart = lay({ pattern: "single", angle: 90, overhang: 0 }, board(outlines.islands ?? []));
    const inRow = apart.slats.filter(({ strip }) => strip === 5);
    expect(inRow.map(({ trimmed }) => trimmed.length)).toEqual([1, 1]);
    expect(inRow.map(({ longPoint }) => Math.round(longPoint))).toEqual([250, 250]);
    // 100 mm between them: an overhang of 60 from either side closes it.
    const joined = lay({ pattern: "single", angle: 90, overhang: 60 }, board(outlines.islands ?? []));
    const [one, second] = joined.slats.filter(({ strip }) => strip === 5);
    expect(second).toBeUndefined();
    expect(connectedPieces(one?.trimmed ?? [])).toHaveLength(2);
    expect(one?.longPoint).toBeCloseTo(720, 2);
  });

  it("a board that the spine misses has none", () => {
    expect(lay({}, board([rectangle(0, 0, 200, 500)])).spine).toBeNull();
  });
});

describe("bad input", () => {
  const refused = (change: Partial<SlatDesign>, board: Partial<SlatBoard> = {}) => {
    const outcome = layOutSlats({ ...usualBoard, ...board }, { ...usualSlats, ...change }, kernel);
    return outcome.ok ? null : outcome.reason.field;
  };
  it.each([
    { change: { slatWidth: 457.3 }, field: "slatWidth" },
    { change: { slatWidth: 0 }, field: "slatWidth" },
    { change: { angle: 14.9 }, field: "angle" },
    { change: { angle: 90.1 }, field: "angle" },
    { change: { angle: Number.NaN }, field: "angle" },
    { change: { gap: 38.2 }, field: "gap" },
    { change: { gap: -1 }, field: "gap" },
    { change: { overhang: -1 }, field: "overhang" },
    { change: { spineWidth: 456 }, field: "spineWidth" },
    { change: { spineOffset: 210 }, field: "spineOffset" },
    { change: { start: { kind: "height", height: Number.NaN } as const }, field: "startHeight" },
    { change: { slatWidth: 1, spineWidth: 1, angle: 45 }, board: { width: 5000, height: 6000 }, field: "slats" },
    { change: {}, board: { width: 0 }, field: "boardWidth" },
    { change: {}, board: { height: Number.POSITIVE_INFINITY }, field: "boardHeight" },
    { change: {}, board: { outline: [] }, field: "outlinePoints" },
    { change: {}, board: { outline: [rectangle(0, 0, Number.NaN, 100)] }, field: "outlineWidth" },
    { change: {}, board: { outline: [rectangle(1e6, 0, 1e6 + 10, 100)] }, field: "outlineLeft" },
  ])("$change on $board is refused for $field", ({ change, board, field }) => {
    expect(refused(change, board)).toBe(field);
  });

  it("takes the edges of every range", () => {
    expect(refused({ angle: 15 })).toBeNull();
    expect(refused({ angle: 90 })).toBeNull();
    expect(refused({ gap: 38.1 })).toBeNull();
    expect(refused({ slatWidth: 457.2 })).toBeNull();
  });

  it("takes as many slats as there may be, on an outline with as many points", () => {
    const points = Array.from({ length: 19_000 }, (_, index) => {
      const turned = (index / 19_000) * 2 * Math.PI;
      const radius = 2400 + 60 * Math.sin(turned * 900);
      return { x: 2500 + radius * Math.cos(turned), y: 2500 + radius * Math.sin(turned) };
    });
    const { slats } = lay(
      { slatWidth: 8, spineWidth: 8, overhang: 20 },
      { width: 5000, height: 5000, outline: [points] },
    );
    expect(slats.length).toBeGreaterThan(1000);
    expect(slats.length).toBeLessThanOrEqual(2000);
  });

  it("refuses a comb whose teeth part the slats into more than 2,000", () => {
    const teeth = Array.from({ length: 300 }, (_, tooth) => rectangle(tooth * 2, 0, tooth * 2 + 1, 500));
    expect(refused({ pattern: "single", angle: 90 }, { width: 600, height: 500, outline: teeth })).toBe("slats");
  });

  it("refuses an outline so jagged that clipping would take minutes", () => {
    const jagged = Array.from({ length: 12_000 }, (_, index) => ({ x: index / 4, y: index % 2 === 0 ? 0 : 2900 }));
    const board = { width: 3000, height: 3000, outline: [[...jagged, { x: 3000, y: 3000 }, { x: 0, y: 3000 }]] };
    expect(refused({ pattern: "single", angle: 90 }, board)).toBe("outlineParts");
  });

  const number = fc.oneof(
    fc.double(),
    fc.double({ min: -10, max: 1200, noNaN: true }),
    fc.constantFrom(0, -0, Number.NaN, Number.POSITIVE_INFINITY, 1e308, -1e308, 5e-324, 15, 45, 90, 10_000),
  );
  const near = (usual: number) =>
    fc.oneof({ weight: 3, arbitrary: fc.constant(usual) }, { weight: 1, arbitrary: number });
  const any = fc.record({
    pattern: fc.constantFrom("spine", "mitred", "single"),
    angle: near(45),
    slatWidth: near(38.1),
    gap: near(0),
    spineWidth: near(38.1),
    spineOffset: near(0),
    start: fc.oneof(
      fc.constant({ kind: "corner" as const }),
      near(10).map((height) => ({ kind: "height" as const, height })),
    ),
    direction: fc.constantFrom("up", "down"),
    overhang: near(0),
  });
  const outline = fc.option(
    fc.array(fc.array(fc.record({ x: near(100), y: near(200) }), { maxLength: 6 }), { maxLength: 3 }),
    { freq: 1 },
  );

  it("gives sound slats or names what is wrong, for any numbers", () => {
    fc.assert(
      fc.property(any, near(457.2), near(482.6), outline, (design, width, height, rings) => {
        const outcome = layOutSlats({ width, height, outline: rings }, design, kernel);
        if (!outcome.ok) {
          expect(outcome.reason.field.length).toBeGreaterThan(0);
          return;
        }
        for (const slat of outcome.value.slats) {
          const numbers = [
            slat.longPoint,
            slat.shortPoint,
            slat.trimmedLongPoint,
            slat.trimmedWidth,
            ...[...slat.near, ...slat.far].map(({ setting }) => setting),
            ...[...slat.untrimmed, ...slat.trimmed.flat(), slat.axis.from, slat.axis.to].flatMap(({ x, y }) => [x, y]),
          ];
          expect(numbers.every(Number.isFinite)).toBe(true);
          expect(slat.longPoint).toBeGreaterThan(0);
          expect(slat.shortPoint).toBeLessThanOrEqual(slat.longPoint + 1e-6);
          expect(slat.near.length * slat.far.length).toBeGreaterThan(0);
        }
      }),
      { numRuns: 400 },
    );
  });
});
