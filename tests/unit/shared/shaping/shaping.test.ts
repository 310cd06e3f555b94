import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { nodeCount } from "#shared/geometry/node-count.ts";
import type { Path, Placement, Region } from "#shared/geometry/path.ts";
import { pathToText } from "#shared/geometry/path-text.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { circlePath, ellipsePath, polygonRing, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";
import { cutAway } from "#shared/shaping/cut-away.ts";
import { joinOutlines } from "#shared/shaping/join-outlines.ts";
import { looseBits } from "#shared/shaping/loose-bits.ts";
import { marginPlate, sharpestCornerDegrees } from "#shared/shaping/margin-plate.ts";
import type { Outline } from "#shared/shaping/shaped.ts";
import { splitToBed } from "#shared/shaping/split-to-bed.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const here: Placement = { x: 0, y: 0, turn: 0, scale: 1, mirrored: false };
const at = (path: Path, placement: Partial<Placement> = {}): Outline => ({
  path,
  placement: { ...here, ...placement },
});
const square = (x: number, y: number, side: number) => rectanglePath({ x, y, width: side, height: side });
const regionOf = ({ path, placement }: Outline): Region => flattenPath(placePath(path, placement), 0.001);
const areaOf = (outline: Outline) => regionAreaMm2(kernel.union(regionOf(outline), "evenodd"));
const boxOf = ({ path, placement }: Outline) => boxOfPath(placePath(path, placement));

describe("a margin plate", () => {
  const plate = rectanglePath({ x: 30, y: 40, width: 100, height: 50 });

  it("round a rectangle of 100 × 50 at 10 mm has quarter circles in its corners, as few curves", () => {
    const made = marginPlate([at(plate)], { marginMm: 10, corners: "round", openings: "filled" }, kernel);
    const area = 100 * 50 + 2 * 10 * 150 + Math.PI * 10 ** 2;
    expect(made?.areaMm2).toBeCloseTo(area, 0);
    expect(made).toMatchObject({ widthMm: 120, heightMm: 70 });
    const [shaped] = made?.plates ?? [];
    if (!shaped) throw new Error("No plate.");
    expect(Math.abs(areaOf(shaped) - area)).toBeLessThan(0.5);
    expect(shaped.placement).toEqual({ ...here, x: 80, y: 65 });
    expect(nodeCount(shaped.path)).toBeLessThanOrEqual(16);
    expect(shaped.path[0]?.segments.filter(({ kind }) => kind === "cubic").length).toBeGreaterThanOrEqual(4);
  });

  it("with sharp corners is the rectangle of 120 × 70", () => {
    const made = marginPlate([at(plate)], { marginMm: 10, corners: "sharp", openings: "filled" }, kernel);
    expect(made).toMatchObject({ widthMm: 120, heightMm: 70, areaMm2: 8400 });
    expect(nodeCount(made?.plates[0]?.path ?? [])).toBe(4);
  });

  it("cuts a sharp corner off under the angle it states, and not over it", () => {
    expect(sharpestCornerDegrees).toBeCloseTo(28.955, 3);
    const tip = (degrees: number) => {
      const half = 100 * Math.tan((degrees * Math.PI) / 360);
      const wedge = [
        polygonRing([
          { x: 0, y: 0 },
          { x: 100, y: half },
          { x: 100, y: -half },
        ]),
      ];
      const made = marginPlate([at(wedge)], { marginMm: 5, corners: "sharp", openings: "filled" }, kernel);
      return boxOf(made?.plates[0] ?? at([]))?.x ?? 0;
    };
    // Where both edges, 5 mm further out, meet: 5 / sin(half the angle) from the old tip.
    expect(tip(30)).toBeCloseTo(-5 / Math.sin((15 * Math.PI) / 180), 1);
    expect(tip(28)).toBeGreaterThan(-10);
  });

  it("fills or keeps the opening of a ring, which the margin makes narrower", () => {
    const ring = at([...circlePath({ x: 0, y: 0 }, 50), ...circlePath({ x: 0, y: 0 }, 30)]);
    const made = (openings: "filled" | "kept") =>
      marginPlate([ring], { marginMm: 8, corners: "round", openings }, kernel)?.areaMm2 ?? 0;
    expect(made("filled") / (Math.PI * 58 ** 2)).toBeCloseTo(1, 3);
    expect(made("kept") / (Math.PI * (58 ** 2 - 22 ** 2))).toBeCloseTo(1, 3);
    expect(marginPlate([ring], { marginMm: 31, corners: "round", openings: "kept" }, kernel)?.plates).toHaveLength(1);
  });

  it("joins what lies nearer than two margins, and makes two plates of what lies further apart", () => {
    const two = (gap: number) => [at(square(0, 0, 20)), at(square(20 + gap, 0, 20))];
    const plates = (gap: number) =>
      marginPlate(two(gap), { marginMm: 5, corners: "round", openings: "filled" }, kernel)?.plates;
    expect(plates(9.9)).toHaveLength(1);
    expect(plates(10.1)).toHaveLength(2);
    expect(marginPlate([], { marginMm: 5, corners: "round", openings: "filled" }, kernel)).toBeNull();
    expect(marginPlate([at([])], { marginMm: 5, corners: "round", openings: "filled" }, kernel)).toBeNull();
  });

  it("holds whatever lies nearer than its margin and nothing further off, wherever one looks", () => {
    const turned = fc.record({
      x: fc.double({ min: -40, max: 40, noNaN: true }),
      y: fc.double({ min: -40, max: 40, noNaN: true }),
      turn: fc.integer({ min: 0, max: 359 }),
      scale: fc.double({ min: 0.5, max: 2, noNaN: true }),
      mirrored: fc.boolean(),
    });
    const shapes: readonly Path[] = [
      ellipsePath({ x: 3, y: 0 }, 30, 12),
      roundedRectanglePath({ x: -20, y: -5, width: 40, height: 18 }, 4),
      [...circlePath({ x: 0, y: 0 }, 25), ...circlePath({ x: 5, y: 0 }, 12)],
    ];
    fc.assert(
      fc.property(
        fc.array(turned, { minLength: 1, maxLength: 3 }),
        fc.double({ min: 0.5, max: 15, noNaN: true }),
        (placements, marginMm) => {
          const outlines = placements.map((placement, index) => ({ path: shapes[index] ?? [], placement }));
          const made = marginPlate(outlines, { marginMm, corners: "round", openings: "kept" }, kernel);
          const plate = made?.plates.flatMap((one) => regionOf(one)) ?? [];
          const drawn = outlines.map(regionOf);
          for (let x = -110; x <= 110; x += 9.7)
            for (let y = -110; y <= 110; y += 9.3) {
              const away = Math.min(
                ...drawn.map((region) =>
                  regionContains(region, { x, y }) ? 0 : distanceToRegionEdgeMm(region, { x, y }),
                ),
              );
              if (Math.abs(away - marginMm) > 0.06) expect(regionContains(plate, { x, y })).toBe(away < marginMm);
            }
        },
      ),
      { numRuns: 15 },
    );
  });
});

describe("joining", () => {
  const named = (id: string, outline: Outline) => ({ ...outline, id });

  it("makes one outline of two squares that overlap, of what both cover", () => {
    const joined = joinOutlines([named("a", at(square(0, 0, 20))), named("b", at(square(15, 5, 20)))], kernel);
    expect(joined.map(({ ids }) => ids)).toEqual([["a", "b"]]);
    const shaped = joined[0]?.shaped ?? at([]);
    expect(areaOf(shaped)).toBeCloseTo(400 + 400 - 5 * 15, 3);
    expect(boxOf(shaped)).toEqual({ x: 0, y: 0, width: 35, height: 25 });
    expect(shaped.placement).toEqual({ ...here, x: 17.5, y: 12.5 });
  });

  it("takes placements as they are: turned, sized and mirrored", () => {
    const flag: Path = [
      polygonRing([
        { x: 0, y: 0 },
        { x: 10, y: 0 },
        { x: 0, y: 10 },
      ]),
    ];
    // Mirrored the flag lies left of its origin, turned by 90° above it, twice as large.
    const turned = at(flag, { x: 100, y: 50, turn: 90, scale: 2, mirrored: true });
    const other = at(rectanglePath({ x: 90, y: 40, width: 11, height: 5 }));
    const [joined] = joinOutlines([named("a", turned), named("b", other)], kernel);
    const corners = regionOf(turned)
      .flat()
      .map(({ x, y }) => [Math.round(x), Math.round(y)]);
    expect(corners).toEqual([
      [100, 50],
      [100, 30],
      [80, 50],
    ]);
    expect(joined?.ids).toEqual(["a", "b"]);
    expect(boxOf(joined?.shaped ?? at([]))).toEqual({ x: 80, y: 30, width: 21, height: 20 });
  });

  it("joins each group for itself, by edges too, and leaves alone what touches nothing or only in a corner", () => {
    const all = [
      named("a", at(square(0, 0, 10))),
      named("far", at(square(0, 100, 10))),
      named("b", at(square(5, 5, 10))),
      named("c", at(square(50, 0, 10))),
      named("d", at(square(60, 0, 10))),
      named("corner", at(square(70, 10, 10))),
    ];
    expect(joinOutlines(all, kernel).map(({ ids }) => ids)).toEqual([
      ["a", "b"],
      ["c", "d"],
    ]);
    expect(joinOutlines(all.slice(0, 2), kernel)).toEqual([]);
  });

  it("brings the parts of one piece together with what each of them touches", () => {
    const dots = [...square(0, 0, 10), ...square(40, 0, 10)];
    const joined = joinOutlines(
      [named("left", at(square(-5, 0, 10))), named("dots", at(dots)), named("right", at(square(45, 0, 10)))],
      kernel,
    );
    expect(joined.map(({ ids }) => ids)).toEqual([["left", "dots", "right"]]);
    expect(areaOf(joined[0]?.shaped ?? at([]))).toBeCloseTo(300, 3);
  });
});

describe("cutting away", () => {
  const bar = { id: "bar", ...at(rectanglePath({ x: 0, y: 0, width: 100, height: 20 })) };

  it("takes a shape out with room all round", () => {
    // A square of 10 with 1.5 mm of room: 13 × 13, less what the round corners leave.
    const [cut] = cutAway([bar], { by: [at(square(40, 5, 10))], roomMm: 1.5 }, kernel);
    const taken = 13 * 13 - (4 - Math.PI) * 1.5 ** 2;
    // Round corners are drawn to 0.01 mm along their 9.4 mm.
    expect(Math.abs((cut?.takenMm2 ?? 0) - taken)).toBeLessThan(0.1);
    expect(cut?.left).toHaveLength(1);
    expect(Math.abs(areaOf(cut?.left[0] ?? at([])) - (2000 - taken))).toBeLessThan(0.1);
  });

  it("keeps the curves of a ring that it does not touch", () => {
    const disc = { id: "disc", ...at(circlePath({ x: 0, y: 0 }, 132), { x: 300, y: 150 }) };
    const [cut] = cutAway([disc], { by: [at(circlePath({ x: 310, y: 160 }, 20))], roomMm: 0.3 }, kernel);
    const [left] = cut?.left ?? [];
    expect(left?.path).toHaveLength(2);
    expect(left?.path.map((ring) => pathToText([ring], 6))).toContain(pathToText(disc.path, 6));
    expect(left?.placement).toEqual(disc.placement);
  });

  it("leaves two pieces where the cut goes through, each about its own middle", () => {
    const [cut] = cutAway(
      [bar],
      { by: [at(rectanglePath({ x: 40, y: -5, width: 10, height: 30 }))], roomMm: 2 },
      kernel,
    );
    const boxes = cut?.left.map(boxOf).toSorted((a, b) => (a?.x ?? 0) - (b?.x ?? 0));
    expect(boxes).toEqual([
      { x: 0, y: 0, width: 38, height: 20 },
      { x: 52, y: 0, width: 48, height: 20 },
    ]);
    expect(cut?.takenMm2).toBeCloseTo(14 * 20, 3);
  });

  it("keeps a piece of several parts one piece, and gives nothing of one that is wholly covered", () => {
    const dots = { id: "dots", ...at([...square(0, 0, 10), ...square(40, 0, 10)]) };
    const [cut] = cutAway([dots], { by: [at(square(5, 0, 10))], roomMm: 0 }, kernel);
    expect(cut?.left).toHaveLength(1);
    expect(areaOf(cut?.left[0] ?? at([]))).toBeCloseTo(150, 3);
    expect(cutAway([dots], { by: [at(square(-1, -1, 99))], roomMm: 0 }, kernel)).toEqual([
      { id: "dots", left: [], takenMm2: 200 },
    ]);
  });

  it("does not name what only touches the shape", () => {
    expect(cutAway([bar], { by: [at(square(100, 0, 10))], roomMm: 0 }, kernel)).toEqual([]);
    expect(cutAway([bar], { by: [], roomMm: 3 }, kernel)).toEqual([]);
    expect(cutAway([bar], { by: [at(square(100, 0, 10))], roomMm: 0.5 }, kernel)[0]?.takenMm2).toBeCloseTo(
      0.5 * 10 + 0.5 * 0.5 + 0.25 * Math.PI * 0.5 ** 2 - 0.25,
      1,
    );
  });
});

describe("loose bits", () => {
  const crumbs: Path = [
    ...square(0, 0, 30),
    ...square(50, 0, 3),
    ...rectanglePath({ x: 60, y: 0, width: 20, height: 1 }),
  ];
  const piece = { id: "p", ...at(crumbs, { x: 10, y: 20, turn: 90, scale: 2 }) };

  it("are told by their area as they lie on the board, and the rest keeps its own curves about its own middle", () => {
    const [found] = looseBits([piece], { areaMm2: 40, widthMm: 0 }, kernel);
    expect(found?.bits.map(({ areaMm2 }) => Math.round(areaMm2))).toEqual([36]);
    expect(found?.left?.placement).toMatchObject({ turn: 90, scale: 2, mirrored: false });
    expect(areaOf(found?.left ?? at([]))).toBeCloseTo(3600 + 80, 3);
    const box = boxOfPath(found?.left?.path ?? []);
    expect({ x: (box?.x ?? 0) + (box?.width ?? 0) / 2, y: (box?.y ?? 0) + (box?.height ?? 0) / 2 }).toEqual({
      x: 0,
      y: 0,
    });
    // The same place on the board as before: the square's corner at the piece's origin.
    expect(boxOf(found?.left ?? at([]))).toEqual({ x: -50, y: 20, width: 60, height: 160 });
  });

  it("are told by the shorter side of their smallest box", () => {
    const [found] = looseBits([piece], { areaMm2: 0, widthMm: 2.1 }, kernel);
    expect(found?.bits.map(({ lengthMm, widthMm }) => [Math.round(lengthMm), Math.round(widthMm)])).toEqual([[40, 2]]);
  });

  it("may be all of a piece, and are none where nothing is small", () => {
    expect(looseBits([piece], { areaMm2: 1e6, widthMm: 0 }, kernel)).toMatchObject([{ id: "p", left: null }]);
    expect(looseBits([piece], { areaMm2: 30, widthMm: 0 }, kernel)).toEqual([]);
    expect(looseBits([{ id: "e", ...at([]) }], { areaMm2: 30, widthMm: 0 }, kernel)).toEqual([]);
  });

  it("are found where rings cross, too: of two squares that overlap only what one of them covers is there", () => {
    const crossed = { id: "x", ...at([...square(0, 0, 20), ...square(1, 1, 20)]) };
    // Two corners of 1 × 20 and 1 × 19 meet in points: four strips of which each is slimmer than 2 mm.
    const [found] = looseBits([crossed], { areaMm2: 0, widthMm: 30 }, kernel);
    expect(found?.left).toBeNull();
    expect(found?.bits.reduce((sum, { areaMm2 }) => sum + areaMm2, 0)).toBeCloseTo(2 * (400 - 361), 2);
  });
});

describe("splitting to the bed", () => {
  const bed = { widthMm: 600, heightMm: 400 };
  const panel = at(rectanglePath({ x: -500, y: -150, width: 1000, height: 300 }), { x: 700, y: 300 });
  const even = { seams: "across", count: null, shiftMm: 0 } as const;

  it("takes as few parts as go on the bed, from the left, and says where the seam falls", () => {
    const split = splitToBed(panel, bed, even, kernel);
    expect(split?.parts.map(({ shaped }) => boxOf(shaped))).toEqual([
      { x: 200, y: 150, width: 500, height: 300 },
      { x: 700, y: 150, width: 500, height: 300 },
    ]);
    expect(split?.parts.every(({ fits }) => fits)).toBe(true);
    expect(split?.seams).toEqual([
      [
        { x: 700, y: 150 },
        { x: 700, y: 450 },
      ],
    ]);
  });

  it("has upright seams in a disc, which is as long either way", () => {
    const disc = at(circlePath({ x: 0, y: 0 }, 400), { x: 500, y: 500, turn: 33 });
    const [seam] = splitToBed(disc, { widthMm: 900, heightMm: 500 }, even, kernel)?.seams ?? [];
    expect(seam?.map(({ x }) => Math.round(x))).toEqual([500, 500]);
  });

  it("moves the seam, and says which part is too large then", () => {
    const split = splitToBed(panel, bed, { ...even, shiftMm: 150 }, kernel);
    expect(split?.seams[0]?.[0].x).toBe(850);
    expect(split?.parts.map(({ fits }) => fits)).toEqual([false, true]);
    expect(splitToBed(panel, bed, { ...even, shiftMm: 600 }, kernel)).toBeNull();
  });

  it("splits in rows, too, where parts side by side are still too large", () => {
    const wall = at(rectanglePath({ x: 0, y: 0, width: 1100, height: 1100 }));
    const split = splitToBed(wall, bed, { ...even, seams: "upright" }, kernel);
    // Thirds by halves go on 600 × 400, 367 × 550; no five parts do.
    expect(split?.parts).toHaveLength(6);
    const corners = split?.parts.map(({ shaped }) => [boxOf(shaped)?.x ?? -1, boxOf(shaped)?.y ?? -1].map(Math.round));
    expect(corners).toEqual([
      [0, 0],
      [367, 0],
      [733, 0],
      [0, 550],
      [367, 550],
      [733, 550],
    ]);
  });

  it("makes level seams, and as many parts as asked for", () => {
    const split = splitToBed(panel, bed, { seams: "level", count: 3, shiftMm: 0 }, kernel);
    expect(split?.seams.slice(0, 2).map(([{ y }]) => y)).toEqual([250, 350]);
    expect(splitToBed(panel, bed, { ...even, count: 4 }, kernel)?.parts).toHaveLength(4);
  });

  it("gives nothing where no 24 parts go on the bed, unless so many are asked for, and nothing for nothing", () => {
    const small = { widthMm: 30, heightMm: 20 };
    expect(splitToBed(panel, small, even, kernel)).toBeNull();
    expect(splitToBed(panel, small, { ...even, count: 5 }, kernel)?.parts.map(({ fits }) => fits)).toEqual(
      Array(5).fill(false),
    );
    expect(splitToBed(at([]), bed, even, kernel)).toBeNull();
  });

  it("says of a piece that it goes on the bed as it is", () => {
    expect(splitToBed(panel, { widthMm: 300, heightMm: 1000 }, even, kernel)?.fitsWhole).toBe(true);
    expect(splitToBed(panel, { widthMm: 299, heightMm: 1000 }, even, kernel)?.fitsWhole).toBe(false);
  });

  it("keeps all of a turned, mirrored piece with curves and openings, in parts that go on the bed in some turn", () => {
    fc.assert(
      fc.property(
        fc.record({
          turn: fc.integer({ min: 0, max: 359 }),
          scale: fc.double({ min: 0.6, max: 2, noNaN: true }),
          mirrored: fc.boolean(),
          seams: fc.constantFrom("across" as const, "upright" as const, "level" as const),
        }),
        ({ seams, ...placement }) => {
          const ring: Path = [
            ...ellipsePath({ x: 0, y: 0 }, 600, 220),
            ...ellipsePath({ x: 40, y: 10 }, 420, 120),
            ...circlePath({ x: 100, y: 0 }, 60),
          ];
          const outline = at(ring, { x: 900, y: 700, ...placement });
          const split = splitToBed(outline, bed, { seams, count: null, shiftMm: 0 }, kernel);
          const parts = split?.parts ?? [];
          expect(parts.every(({ fits }) => fits)).toBe(true);
          const sum = parts.reduce((all, { shaped }) => all + areaOf(shaped), 0);
          expect(Math.abs(sum - areaOf(outline))).toBeLessThan(1);
          const together = kernel.union(
            parts.flatMap(({ shaped }) => regionOf(shaped)),
            "nonzero",
          );
          expect(Math.abs(regionAreaMm2(together) - areaOf(outline))).toBeLessThan(1);
        },
      ),
      { numRuns: 12 },
    );
  });
});
