import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { frameBrads } from "#shared/frame/frame-brads.ts";
import { frameCover } from "#shared/frame/frame-cover.ts";
import { frameRefusalWords } from "#shared/frame/frame-words.ts";
import { bodyInFrame, layOutFrame } from "#shared/frame/lay-out-frame.ts";
import { regionAreaMm2, signedRingArea } from "#shared/geometry/area.ts";
import { boxOfPolygon } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path, Point } from "#shared/geometry/path.ts";
import { circlePath, polygonRing, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";
import { resultOf } from "../../../support/reference-data.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const board = rectanglePath({ x: 0, y: 0, width: 600, height: 400 });
const path = (...points: [number, number][]): Path => [polygonRing(points.map(([x, y]) => ({ x, y })))];
const ell = path([0, 0], [400, 0], [400, 200], [200, 200], [200, 400], [0, 400]);
const hexagon: Path = [
  polygonRing(
    Array.from({ length: 6 }, (_, k) => ({
      x: 300 + 200 * Math.cos((k * Math.PI) / 3),
      y: 300 + 200 * Math.sin((k * Math.PI) / 3),
    })),
  ),
];
const mitred = (outline: Path, width = 20) => resultOf(layOutFrame(outline, { width, mitred: true }, kernel));

describe("a mitred frame round a rectangle", () => {
  it("measures the body plus twice its width outside", () => {
    expect(boxOfPolygon(mitred(board).outer)).toEqual({ x: -20, y: -20, width: 640, height: 440 });
  });

  it("has long points outside and short points inside, cut at 45", () => {
    const { members } = mitred(board);
    expect(members.map(({ longPoint, shortPoint }) => [longPoint, shortPoint])).toEqual([
      [640, 600],
      [440, 400],
      [640, 600],
      [440, 400],
    ]);
    for (const { settings } of members) expect(settings).toEqual([expect.closeTo(45, 9), expect.closeTo(45, 9)]);
  });

  it("is true when both diagonals are √(640² + 440²)", () => {
    const { diagonals } = mitred(board);
    expect(diagonals.map(({ lengthMm }) => lengthMm)).toEqual([
      expect.closeTo(776.6595, 3),
      expect.closeTo(776.6595, 3),
    ]);
  });

  it.each([{ turned: false }, { turned: true }])("does not mind which way the outline runs: $turned", ({ turned }) => {
    const corners: [number, number][] = [
      [0, 0],
      [600, 0],
      [600, 200],
      [600, 400],
      [0, 400],
      [0, 0],
    ];
    const frame = mitred(path(...(turned ? corners.toReversed() : corners)));
    // The corner in the middle of the right edge and the repeated first one are none.
    expect(frame.members).toHaveLength(4);
    expect(boxOfPolygon(frame.outer)).toEqual({ x: -20, y: -20, width: 640, height: 440 });
  });
});

describe("butted corners", () => {
  it("let the uprights run through", () => {
    const { members } = resultOf(layOutFrame(board, { width: 20, mitred: false }, kernel));
    expect(members.map(({ longPoint }) => longPoint)).toEqual([600, 440, 600, 440]);
    expect(members.every(({ settings }) => settings[0] === 0 && settings[1] === 0)).toBe(true);
    const area = members.reduce((sum, { outline }) => sum + regionAreaMm2([outline]), 0);
    expect(area).toBeCloseTo(640 * 440 - 600 * 400, 6);
    expect(
      regionAreaMm2(
        kernel.union(
          members.map(({ outline }) => outline),
          "nonzero",
        ),
      ),
    ).toBeCloseTo(area, 3);
  });
});

describe("other boards with straight edges", () => {
  it("a hexagon has mitres of 30 degrees", () => {
    const { members, diagonals } = mitred(hexagon);
    // 200 inside, plus 2 · 20 · tan 30 outside.
    for (const { longPoint, shortPoint, settings } of members) {
      expect(longPoint).toBeCloseTo(200 + 40 * Math.tan(Math.PI / 6), 6);
      expect(shortPoint).toBeCloseTo(200, 6);
      expect(settings[0]).toBeCloseTo(30, 6);
    }
    expect(diagonals).toHaveLength(3);
  });

  it("an L has its long point inside at the corner that turns back", () => {
    const { members } = mitred(ell);
    expect(members.map(({ longPoint, shortPoint }) => [longPoint, shortPoint].map(Math.round))).toEqual([
      [440, 400],
      [240, 200],
      [220, 200],
      [220, 200],
      [240, 200],
      [440, 400],
    ]);
    expect(members.flatMap(({ settings }) => settings).every((setting) => Math.abs(setting - 45) < 1e-6)).toBe(true);
  });

  it.each([
    { name: "rectangle", outline: board },
    { name: "hexagon", outline: hexagon },
    { name: "L", outline: ell },
    { name: "triangle", outline: path([0, 0], [500, 100], [200, 600]) },
  ])("pieces round a $name lie side by side and fill the frame", ({ outline }) => {
    const { members, outer } = mitred(outline);
    const area = members.reduce((sum, member) => sum + regionAreaMm2([member.outline]), 0);
    const joined = regionAreaMm2(
      kernel.union(
        members.map((member) => member.outline),
        "nonzero",
      ),
    );
    expect(joined).toBeCloseTo(area, 0);
    const inner = Math.abs(
      signedRingArea(outline.flatMap(({ start, segments }) => [start, ...segments.map(({ to }) => to)])),
    );
    expect(area).toBeCloseTo(Math.abs(signedRingArea(outer)) - inner, 3);
  });
});

describe("boards that no frame goes round", () => {
  const refusal = (outline: Path, width = 20, isMitred = true) => {
    const outcome = layOutFrame(outline, { width, mitred: isMitred }, kernel);
    return outcome.ok ? null : frameRefusalWords(outcome.reason, "mm");
  };
  const round =
    "A frame is made of straight pieces, and this board has round edges. Leave the frame off, or choose a board with corners.";
  it.each([
    { name: "a circle", outline: circlePath({ x: 100, y: 100 }, 100), words: round },
    {
      name: "rounded corners",
      outline: roundedRectanglePath({ x: 0, y: 0, width: 600, height: 400 }, 10),
      words: round,
    },
    {
      name: "a board with a hole",
      outline: [...board, ...rectanglePath({ x: 100, y: 100, width: 50, height: 50 })],
      words: "A frame goes round one outline, and this board has holes or several parts.",
    },
    {
      name: "nothing",
      outline: [],
      words: "A frame goes round one outline, and this board has holes or several parts.",
    },
    {
      name: "a splinter",
      outline: path([0, 0], [600, 0], [0, 100]),
      words: "A corner of 9.5° is too sharp for a mitre: 30° at least.",
    },
    {
      name: "a line",
      outline: path([0, 0], [100, 0], [200, 0]),
      words: "A frame has 3 to 40 corners, and this board has 2.",
    },
    {
      name: "a narrow notch",
      outline: path([0, 0], [200, 0], [200, 200], [230, 200], [230, 0], [600, 0], [600, 400], [0, 400]),
      words: "The frame's pieces run into each other: choose a narrower frame.",
    },
  ])("$name: $words", ({ outline, words }) => {
    expect(refusal(outline)).toBe(words);
  });

  it("butted corners on anything but a rectangle", () => {
    const words = "Butted corners need a rectangular board. Choose mitred ones.";
    expect(refusal(hexagon, 20, false)).toBe(words);
    expect(refusal(path([0, 0], [400, 0], [500, 300], [0, 300]), 20, false)).toBe(words);
    expect(refusal(board, 20, false)).toBeNull();
  });

  it("a width that is none", () => {
    expect(refusal(board, Number.NaN)).toBe("The frame's width must lie between 0 mm and 10000 mm.");
    expect(refusal(board, 0)).toBe("The frame's width must lie between 0 mm and 10000 mm.");
  });

  const coordinate = fc.oneof(
    fc.integer({ min: -20, max: 600 }),
    fc.double(),
    fc.constantFrom(Number.NaN, Number.POSITIVE_INFINITY, 1e308, 0, 100, 400),
  );
  const point: fc.Arbitrary<Point> = fc.record({ x: coordinate, y: coordinate });
  it("any outline has a sound frame or is refused in words", () => {
    fc.assert(
      fc.property(
        fc.array(point, { minLength: 3, maxLength: 8 }),
        fc.double(),
        fc.boolean(),
        (points, width, isMitred) => {
          for (const wide of [width, 20]) {
            const outcome = layOutFrame([polygonRing(points)], { width: wide, mitred: isMitred }, kernel);
            if (!outcome.ok) {
              expect(frameRefusalWords(outcome.reason, "mm")).toMatch(/^[A-Z].*\.$/);
              continue;
            }
            const { members, outer, diagonals } = outcome.value;
            const numbers = [
              ...outer.flatMap(({ x, y }) => [x, y]),
              ...members.flatMap(({ longPoint, shortPoint, settings }) => [longPoint, shortPoint, ...settings]),
              ...diagonals.map(({ lengthMm }) => lengthMm),
            ];
            expect(numbers.every(Number.isFinite)).toBe(true);
          }
        },
      ),
      { numRuns: 400 },
    );
  });
});

describe("the body inside a frame", () => {
  it("is less by twice the width each way", () => {
    expect(resultOf(bodyInFrame({ width: 640, height: 440 }, 20))).toEqual({ width: 600, height: 400 });
  });
  it.each([
    {
      size: { width: 40, height: 440 },
      words: "Nothing is left inside the frame: the sign must be 41 mm at least each way.",
    },
    {
      size: { width: 640, height: Number.NaN },
      words: "Nothing is left inside the frame: the sign must be 41 mm at least each way.",
    },
  ])("$size: $words", ({ size, words }) => {
    const outcome = bodyInFrame(size, 20);
    expect(outcome.ok ? "" : frameRefusalWords(outcome.reason, "mm")).toBe(words);
  });
});

describe("what a frame covers", () => {
  const backer = { substrate: 12, slats: 9, sanding: 0.3 };
  it.each([
    { depth: 12, bareSubstrate: 0, bareSlats: 8.7, proud: -8.7 },
    { depth: 11, bareSubstrate: 1, bareSlats: 8.7, proud: -9.7 },
    { depth: 20.7, bareSubstrate: 0, bareSlats: 0, proud: 0 },
    { depth: 25, bareSubstrate: 0, bareSlats: 0, proud: 4.3 },
  ])("$depth deep", ({ depth, bareSubstrate, bareSlats, proud }) => {
    expect(resultOf(frameCover(depth, backer))).toEqual({
      bareSubstrateMm: expect.closeTo(bareSubstrate, 9),
      bareSlatsMm: expect.closeTo(bareSlats, 9),
      proudMm: expect.closeTo(proud, 9),
      flushDepthMm: expect.closeTo(20.7, 9),
    });
  });
  it("refuses what is no number", () => {
    expect(frameCover(Number.NaN, backer)).toMatchObject({ ok: false, reason: { field: "frameDepth" } });
    expect(frameCover(12, { ...backer, sanding: 10 })).toMatchObject({ ok: false, reason: { field: "sanding" } });
  });
});

describe("brads of a frame", () => {
  // Set half a mm under the face: 30 long through 20 of frame comes 10.5 into the edge.
  it.each([
    { length: 30, into: 10.5, holds: true },
    { length: 29.5, into: 10, holds: true },
    { length: 29.4, into: 9.9, holds: false },
  ])("$length long go $into into the edge: $holds", ({ length, into, holds }) => {
    const brads = resultOf(frameBrads(mitred(board), { length, frameWidth: 20, substrate: 12 }));
    expect(brads.intoEdgeMm).toBeCloseTo(into, 9);
    expect(brads.holds).toBe(holds);
    expect(brads.heightMm).toBe(6);
  });

  it("keep off the corners, and 150 apart at most", () => {
    const { brads } = resultOf(frameBrads(mitred(board), { length: 30, frameWidth: 20, substrate: 12 }));
    const upper = brads.filter(({ member }) => member === 0).map(({ x }) => x);
    expect(upper).toEqual([25, 162.5, 300, 437.5, 575]);
    expect(brads.filter(({ member }) => member === 1).map(({ y }) => y)).toEqual([
      25,
      expect.closeTo(141.667, 3),
      expect.closeTo(258.333, 3),
      375,
    ]);
  });

  it("a short piece takes one in its middle", () => {
    const small = mitred(rectanglePath({ x: 0, y: 0, width: 40, height: 200 }));
    const { brads } = resultOf(frameBrads(small, { length: 30, frameWidth: 20, substrate: 12 }));
    expect(brads.filter(({ member }) => member === 0)).toEqual([{ x: 20, y: 0, member: 0 }]);
  });

  it("refuses what is no number", () => {
    expect(frameBrads(mitred(board), { length: Number.NaN, frameWidth: 20, substrate: 12 })).toMatchObject({
      ok: false,
    });
    expect(frameBrads(mitred(board), { length: 30, frameWidth: Number.NaN, substrate: 12 })).toMatchObject({
      ok: false,
    });
  });
});
