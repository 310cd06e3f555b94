import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { circlePath, ellipsePath, rectanglePath } from "#shared/geometry/shapes.ts";
import { regionTransform, rotateMatrix, translateMatrix } from "#shared/geometry/transform.ts";
import { areaMoment } from "#shared/pieces/area-moments.ts";
import { dropOuts } from "#shared/pieces/drop-outs.ts";
import { faceMatters } from "#shared/pieces/handed-pieces.ts";
import { mirrorLine } from "#shared/pieces/mirror-symmetry.ts";
import { nearTwins } from "#shared/pieces/near-twins.ts";
import { smallPieces } from "#shared/pieces/small-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const box = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));
const joined = (...parts: Region[]): Region => kernel.union(parts.flat(), "nonzero");
const disc = (radius: number, x = 0, y = 0): Region =>
  kernel.union(flattenPath(circlePath({ x, y }, radius)), "evenodd");
const moved = (region: Region, degrees: number): Region =>
  kernel.union(
    regionTransform(regionTransform(region, rotateMatrix(degrees)), translateMatrix(123.4, -56.7)),
    "evenodd",
  );
const star = (points: number): Region => [
  Array.from({ length: 2 * points }, (_, k) => {
    const radius = k % 2 === 0 ? 30 : 14;
    return { x: radius * Math.cos((Math.PI * k) / points), y: radius * Math.sin((Math.PI * k) / points) };
  }),
];

/** Shapes with what a mirror makes of them, from plane geometry. */
const shapes = {
  E: {
    region: () => joined(box(0, 0, 10, 60), box(0, 0, 40, 10), box(0, 25, 40, 10), box(0, 50, 40, 10)),
    mirror: true,
  },
  L: { region: () => joined(box(0, 0, 10, 60), box(0, 50, 40, 10)), mirror: false },
  "equal L": { region: () => joined(box(0, 0, 10, 40), box(0, 30, 40, 10)), mirror: true },
  S: {
    region: () =>
      joined(box(0, 0, 40, 10), box(0, 0, 10, 30), box(0, 25, 40, 10), box(30, 25, 10, 30), box(0, 45, 40, 10)),
    mirror: false,
  },
  square: { region: () => box(0, 0, 30, 30), mirror: true },
  parallelogram: {
    region: (): Region => [
      [
        { x: 0, y: 0 },
        { x: 50, y: 0 },
        { x: 65, y: 30 },
        { x: 15, y: 30 },
      ],
    ],
    mirror: false,
  },
  triangle: {
    region: (): Region => [
      [
        { x: 0, y: 0 },
        { x: 60, y: 0 },
        { x: 20, y: 35 },
      ],
    ],
    mirror: false,
  },
  disc: { region: () => disc(25), mirror: true },
  ellipse: { region: () => flattenPath(ellipsePath({ x: 0, y: 0 }, 40, 15)), mirror: true },
  "star of five": { region: () => star(5), mirror: true },
  "star of seven": { region: () => star(7), mirror: true },
  "ring with its hole off to one side": { region: () => kernel.difference(disc(30), disc(8, 12, 5)), mirror: true },
  "square with its hole off the diagonals": {
    region: () => kernel.difference(box(-30, -30, 60, 60), disc(8, 12, 5)),
    mirror: false,
  },
} as const;

describe.each(Object.entries(shapes))("%s", (_, { region, mirror }) => {
  it.each([0, 17, 90, 143])(`turned by %d° has a mirror line: ${mirror}`, (degrees) => {
    const line = mirrorLine(moved(region(), degrees), kernel);
    expect(line !== null).toBe(mirror);
    if (line !== null) {
      expect(line).toBeGreaterThanOrEqual(0);
      expect(line).toBeLessThan(180);
    }
  });

  it("is handed when it has none", () => {
    expect(faceMatters({ region: region(), facesDiffer: false }, kernel)).toBe(mirror ? "no" : "handed");
    expect(faceMatters({ region: region(), facesDiffer: true }, kernel)).toBe(mirror ? "faces differ" : "handed");
  });
});

it("nothing has no mirror line and no hand", () => {
  expect(mirrorLine([], kernel)).toBeNull();
  expect(faceMatters({ region: [], facesDiffer: true }, kernel)).toBe("no");
});

// Closed forms: a rectangle's ∫ z⁰ is its area, ∫ z² about its middle a b (a² − b²)/12; an annulus has area and no more.
describe("moments of an area", () => {
  it("are those of the closed forms", () => {
    const about = { x: 20, y: 15 };
    const region = box(0, 0, 40, 30);
    expect(areaMoment(region, about, 0).re).toBeCloseTo(1200, 6);
    expect(areaMoment(region, about, 1).re).toBeCloseTo(0, 6);
    expect(areaMoment(region, about, 2).re).toBeCloseTo((1200 * (1600 - 900)) / 12, 4);
    expect(areaMoment(region, about, 2).im).toBeCloseTo(0, 6);
    const annulus = kernel.difference(disc(20), disc(10));
    expect(areaMoment(annulus, { x: 0, y: 0 }, 0).re).toBeCloseTo(regionAreaMm2(annulus), 6);
  });

  it("turn p times as far as the region", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 8 }), fc.double({ min: 0, max: 360, noNaN: true }), (power, degrees) => {
        const region: Region = [
          [
            { x: 1, y: 0 },
            { x: 5, y: 1 },
            { x: 2, y: 4 },
          ],
        ];
        const before = areaMoment(region, { x: 0, y: 0 }, power);
        const after = areaMoment(regionTransform(region, rotateMatrix(degrees)), { x: 0, y: 0 }, power);
        const angle = (power * degrees * Math.PI) / 180;
        const size = Math.hypot(before.re, before.im);
        expect(after.re / size).toBeCloseTo((before.re * Math.cos(angle) - before.im * Math.sin(angle)) / size, 9);
        expect(after.im / size).toBeCloseTo((before.re * Math.sin(angle) + before.im * Math.cos(angle)) / size, 9);
      }),
    );
  });
});

describe("near twins", () => {
  const at = (region: Region, x: number, y = 0): Region =>
    kernel.union(regionTransform(region, translateMatrix(x, y)), "evenodd");
  const twins = (...regions: Region[]) =>
    nearTwins(
      regions.map((region, index) => ({ id: String(index), region })),
      kernel,
    );
  /** An H of 60 by 80 with its bar that far over the middle. */
  const aitch = (raised: number) => joined(box(0, 0, 12, 80), box(48, 0, 12, 80), box(0, 34 - raised, 60, 12));

  it("are discs of 20 and 21 mm, but not of 20 and 24, nor two of 20", () => {
    expect(twins(disc(10), at(disc(10.5), 50))).toEqual([{ kind: "exchanged", ids: ["0"], others: ["1"], turn: 0 }]);
    expect(twins(disc(10), at(disc(12), 50))).toEqual([]);
    expect(twins(disc(10), at(disc(10), 50.0004))).toEqual([]);
  });

  it("are an H whose bar is a little high, upside down, but not one whose bar is in the middle or far up", () => {
    expect(twins(aitch(1))).toEqual([{ kind: "turned", ids: ["0"] }]);
    expect(twins(aitch(0))).toEqual([]);
    expect(twins(aitch(8))).toEqual([]);
  });

  it("are an 8 with a smaller upper half, turned", () => {
    const eight = joined(disc(18.8, 0, 0), disc(20, 0, 34));
    expect(twins(eight)).toEqual([{ kind: "turned", ids: ["0"] }]);
  });

  it("are wedges that look alike only upside down", () => {
    const wedge = (thin: number): Region => [
      [
        { x: 0, y: 0 },
        { x: 60, y: 0 },
        { x: 60, y: thin },
        { x: 0, y: 30 },
      ],
    ];
    expect(twins(wedge(10), moved(wedge(11), 180))).toEqual([
      { kind: "exchanged", ids: ["0"], others: ["1"], turn: 180 },
    ]);
    // The very same wedge upside down can't come into the wrong place.
    expect(twins(wedge(10), moved(wedge(10), 180))).toEqual([]);
  });

  it("name all of the equal ones together", () => {
    const row = [disc(10), at(disc(10.5), 50), at(disc(10), 100), at(disc(10.5), 150), at(disc(10), 200)];
    expect(twins(...row)).toEqual([{ kind: "exchanged", ids: ["0", "2", "4"], others: ["1", "3"], turn: 0 }]);
  });

  it("do not come of pieces that cover nothing", () => {
    expect(twins([], [])).toEqual([]);
    expect(nearTwins([], kernel)).toEqual([]);
  });

  it("are found the same wherever the pieces lie", () => {
    const place = fc.double({ min: -500, max: 500, noNaN: true });
    fc.assert(
      fc.property(place, place, fc.double({ min: 0.25, max: 0.6, noNaN: true }), (x, y, more) => {
        expect(twins(disc(10), at(disc(10 + more), x, y))).toHaveLength(1);
      }),
      { numRuns: 30 },
    );
  });
});

describe("drop-outs", () => {
  it("are the islands of openings, and not what is held or what lies beside", () => {
    const plate = kernel.difference(box(0, 0, 100, 60), kernel.difference(disc(20, 50, 30), disc(8, 50, 30)));
    const found = dropOuts(plate);
    expect(found).toHaveLength(1);
    expect(found[0]?.where.x).toBeCloseTo(50, 3);
    // The flattened disc is a quarter of a percent smaller.
    expect(Math.abs((found[0]?.areaMm2 ?? 0) - Math.PI * 64)).toBeLessThan(0.8);
    expect(dropOuts(box(0, 0, 10, 10))).toEqual([]);
    expect(dropOuts([...box(0, 0, 10, 10), ...box(20, 0, 10, 10)])).toEqual([]);
    expect(dropOuts([])).toEqual([]);
  });

  it("keep their own holes, and what lies in those drops out too", () => {
    const rings = [40, 30, 20, 10, 5].map((radius) => disc(radius));
    const [a = [], b = [], c = [], d = [], e = []] = rings;
    const plate = kernel.union([...kernel.difference(a, b), ...kernel.difference(c, d), ...e], "evenodd");
    const areas = dropOuts(plate).map(({ areaMm2 }) => Math.round(areaMm2 / Math.PI));
    expect(areas.sort((x, y) => x - y)).toEqual([25, 300]);
  });
});

describe("small pieces", () => {
  it("are shorter than 8 mm over the longer side of their smallest box", () => {
    const pieces = [
      { id: "dot", region: disc(3.9) },
      { id: "dot of 8", region: box(0, 0, 8, 8) },
      { id: "thin bar", region: box(0, 0, 40, 2) },
      { id: "turned tile", region: moved(box(0, 0, 7.9, 7), 45) },
      { id: "nothing", region: [] },
    ];
    expect(smallPieces(pieces)).toEqual(["dot", "turned tile"]);
    expect(smallPieces(pieces, 3)).toEqual([]);
  });
});
