import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { boxOfRegion } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path } from "#shared/geometry/path.ts";
import { circlePath, polygonRing, rectanglePath } from "#shared/geometry/shapes.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { NestingControl, NestingProgress, NestingRequest, SheetLayout } from "#shared/sheets/nesting.ts";
import { expectSoundLayout } from "../../../support/check-layout.ts";
import { annulus, buildPiece, buildRequest, buildSheet, concavePaths } from "../../../support/concave-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** A layout that can be cut: every one is checked without the nester's own means. */
function nested(request: NestingRequest, control: NestingControl = {}): SheetLayout {
  const outcome = nestSheets(request, control, kernel);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
  expectSoundLayout(request, outcome.value, kernel);
  return outcome.value;
}

const rectangle = (width: number, height: number): Path => rectanglePath({ x: 0, y: 0, width, height });
const outline = (...points: readonly (readonly [number, number])[]): Path => [
  polygonRing(points.map(([x, y]) => ({ x, y }))),
];
const straight = { kind: "steps", from: 0, every: 360 } as const;
const alongGrain = { kind: "steps", from: 0, every: 180 } as const;
const ell = outline([0, 0], [100, 0], [100, 30], [30, 30], [30, 60], [0, 60]);

describe("where pieces go", () => {
  it("a square of 70 goes into the opening of a ring that leaves no other room", () => {
    const pieces = [buildPiece("ring", annulus(100, 60)), buildPiece("square", rectangle(70, 70))];
    const layout = nested(buildRequest(pieces, [buildSheet(206, 206)]));
    expect(layout.sheets.map(({ placements }) => placements.length)).toEqual([2]);
    expect(layout.unplaced).toEqual([]);
  });

  it("a square of 85 does not go into that opening and takes a sheet of its own", () => {
    const pieces = [buildPiece("ring", annulus(100, 60)), buildPiece("square", rectangle(85, 85))];
    const layout = nested(buildRequest(pieces, [buildSheet(206, 206)]));
    expect(layout.sheets.map(({ placements }) => placements.length)).toEqual([1, 1]);
  });

  it.each([
    { gap: "a kerf of 4", rules: { kerfMm: 4 }, placed: 4 },
    { gap: "a kerf of 5", rules: { kerfMm: 5 }, placed: 2 },
    { gap: "a kerf of 2 and 3 to stand between", rules: { kerfMm: 2, spacingMm: 3 }, placed: 2 },
    { gap: "a margin of 11", rules: { kerfMm: 4, marginMm: 11 }, placed: 2 },
  ])("two rows of squares of 38 go on a sheet 100 high only when $gap lets them", ({ rules, placed }) => {
    const pieces = [buildPiece("square", rectangle(38, 38), { quantity: 4 })];
    const stock = [buildSheet(102, 100, { quantity: 1 })];
    const layout = nested(buildRequest(pieces, stock, { rules: { marginMm: 10, ...rules } }));
    expect(layout.sheets[0]?.placements).toHaveLength(placed);
    expect(layout.unplaced.map(({ copies }) => copies)).toEqual(placed === 4 ? [] : [4 - placed]);
  });

  it("a wedge that may be mirrored shares a sheet with its like where one way round leaves no room", () => {
    const wedge = outline([0, 0], [100, 50], [0, 100]);
    const request = (mayMirror: boolean) =>
      buildRequest(
        [buildPiece("wedge", wedge, { quantity: 2, mayMirror, turns: straight })],
        [buildSheet(115, 165, { quantity: 1 })],
        { rules: { marginMm: 2, kerfMm: 2 } },
      );
    expect(nested(request(false)).sheets[0]?.placements).toHaveLength(1);
    expect(nested(request(true)).sheets[0]?.placements.map(({ mirrored }) => mirrored)).toEqual(
      expect.arrayContaining([false, true]),
    );
  });

  it("no disc ends even a hundredth over the far margin, so that none must be taken out again", () => {
    const disc = (radius: number) => circlePath({ x: 9, y: -4 }, radius);
    const pieces = [
      buildPiece("ring", annulus(21, 14.7)),
      buildPiece("large", disc(25), { quantity: 2 }),
      buildPiece("small", disc(5), { turns: { kind: "steps", from: 0, every: 45 } }),
    ];
    expect(
      nested(buildRequest(pieces, [buildSheet(106, 106)], { rules: { marginMm: 5, kerfMm: 6 } })).unplaced,
    ).toEqual([]);
  });

  it.each([
    { radius: 50, sheets: 1 },
    { radius: 50.01, sheets: 0 },
  ])("$sheets discs of radius $radius go on a sheet that leaves 100", ({ radius, sheets }) => {
    const pieces = [buildPiece("disc", circlePath({ x: 0, y: 0 }, radius), { turns: straight })];
    expect(nested(buildRequest(pieces, [buildSheet(106, 106)])).sheets).toHaveLength(sheets);
  });

  it("openings in a sheet and its slanting edge stay free", () => {
    const offcut: Path = [
      ...outline([0, 0], [500, 0], [400, 300], [0, 300]),
      ...rectanglePath({ x: 100, y: 100, width: 80, height: 80 }),
    ];
    const pieces = concavePaths(9, 7).map((path, index) => buildPiece(String(index), path));
    const layout = nested(buildRequest(pieces, [buildSheet(1, 1, { path: offcut, quantity: 1, isOffcut: true })]));
    expect(layout.sheets[0]?.placements.length).toBeGreaterThanOrEqual(7);
  });
});

describe("grain", () => {
  it("pieces along the grain lie at 0° or 180° on a sheet whose grain runs along it", () => {
    const pieces = [buildPiece("ell", ell, { quantity: 6, turns: alongGrain })];
    const layout = nested(buildRequest(pieces, [buildSheet(400, 300)], { effort: 0.05 }));
    const turns = layout.sheets.flatMap(({ placements }) => placements.map(({ turn }) => turn));
    expect(turns).toHaveLength(6);
    expect(turns.every((turn) => turn === 0 || turn === 180)).toBe(true);
  });

  it("on a sheet whose grain runs across it they are turned by 90° more", () => {
    const pieces = [buildPiece("plank", rectangle(200, 40), { quantity: 2, turns: alongGrain })];
    const layout = nested(buildRequest(pieces, [buildSheet(300, 260, { grainTurn: 90 })]));
    expect(layout.sheets[0]?.placements.map(({ turn }) => turn)).toEqual([90, 90]);
  });

  it("so are shapes that are no rectangles", () => {
    const pieces = [buildPiece("ell", ell, { quantity: 2, turns: alongGrain })];
    const layout = nested(buildRequest(pieces, [buildSheet(300, 260, { grainTurn: 90 })]));
    const turns = layout.sheets.flatMap(({ placements }) => placements.map(({ turn }) => turn));
    expect(turns).toHaveLength(2);
    expect(turns.every((turn) => turn === 90 || turn === 270)).toBe(true);
  });

  it("a plank that is too long along the grain is not turned across it", () => {
    const pieces = [buildPiece("plank", rectangle(280, 40), { turns: alongGrain })];
    const layout = nested(buildRequest(pieces, [buildSheet(400, 260, { grainTurn: 90 })]));
    expect(layout.unplaced.map(({ reason }) => reason)).toEqual(["larger than every sheet"]);
  });

  it("a piece that may be turned freely lies aslant where it fits only so", () => {
    const pieces = [buildPiece("bar", rectangle(480, 20))];
    const layout = nested(buildRequest(pieces, [buildSheet(380, 380)], { rules: { marginMm: 0 } }));
    expect(layout.sheets).toHaveLength(1);
    expect(layout.sheets[0]?.placements[0]?.turn).toBe(45);
  });
});

describe("which sheets are taken", () => {
  const squares = (quantity: number) => [buildPiece("square", rectangle(90, 90), { quantity })];
  const large = buildSheet(1000, 500, { id: "large" });
  const small = buildSheet(300, 200, { id: "small" });
  const offcut = buildSheet(420, 310, { id: "offcut", quantity: 1, isOffcut: true });

  // Larger than the small sheet, but counted half.
  const scrap = buildSheet(320, 310, { id: "scrap", quantity: 1, isOffcut: true });

  it.each([
    { copies: 2, stock: [large, small], taken: ["small"] },
    { copies: 30, stock: [large, small], taken: ["large"] },
    { copies: 6, stock: [large, offcut], taken: ["offcut"] },
    { copies: 2, stock: [small, offcut], taken: ["small"] },
    { copies: 2, stock: [small, scrap], taken: ["scrap"] },
    { copies: 60, stock: [large, offcut], taken: ["large", "offcut"] },
  ])("$copies squares go on $taken", ({ copies, stock, taken }) => {
    const layout = nested(buildRequest(squares(copies), stock, { rules: { marginMm: 5 } }));
    expect(layout.unplaced).toEqual([]);
    expect([...new Set(layout.sheets.map(({ stockId }) => stockId))].sort()).toEqual(taken);
  });

  it("says how many sheets of each kind it takes, and parts of one sheet are one", () => {
    const bed = { widthMm: 610, heightMm: 420, larger: "split" } as const;
    const both = [
      buildSheet(1220, 800, { id: "whole", quantity: 1 }),
      buildSheet(420, 310, { id: "half", quantity: null }),
    ];
    const layout = nested(buildRequest(squares(110), both, { rules: { bed, marginMm: 5 } }));
    expect(layout.unplaced).toEqual([]);
    // 6 · 4 on each upper part, 6 · 3 on each lower one; 12 on each of the others.
    expect(layout.needed).toEqual([
      { stockId: "whole", sheets: 1 },
      { stockId: "half", sheets: 3 },
    ]);
  });

  it("no more sheets are taken than there are, and the rest is listed with the reason", () => {
    const layout = nested(buildRequest(squares(7), [buildSheet(300, 200, { quantity: 1 })]));
    expect(layout.sheets.map(({ placements }) => placements.length)).toEqual([6]);
    expect(layout.unplaced).toEqual([
      { pieceId: "square", copies: 1, reason: "no sheet left", words: "No sheet is left for 1 of 7 Piece square." },
    ]);
  });

  it("a piece larger than every sheet is named with its size and the room there is; the others are laid", () => {
    const pieces = [buildPiece("base", rectangle(900, 400), { name: "Base" }), buildPiece("small", rectangle(50, 50))];
    const layout = nested(buildRequest(pieces, [buildSheet(600, 500)]));
    expect(layout.unplaced.map(({ words }) => words)).toEqual([
      "Base goes on no sheet: it is 900 × 400 mm, and the largest sheet leaves 594 × 494 mm inside its margin.",
    ]);
    expect(layout.sheets[0]?.placements.map(({ pieceId }) => pieceId)).toEqual(["small"]);
  });

  it("pieces fill as much of what they lose as their area says, of a sheet and of the length used", () => {
    const layout = nested(buildRequest(squares(2), [large], { rules: { marginMm: 5, kerfMm: 5 } }));
    // Two of 90 above each other: 2 · 90² of 1000 · 500, and of the first 95 mm.
    expect(layout.sheets[0]?.use).toBeCloseTo(0.0324, 10);
    expect(layout.consumedMm2).toBeCloseTo(95 * 500, 6);
    expect(layout.use).toBeCloseTo(16200 / 47500, 10);
  });
});

describe("sheets larger than the bed", () => {
  const bed = { widthMm: 610, heightMm: 420 } as const;
  const pieces = [buildPiece("ell", ell, { quantity: 40 })];

  it("are cut up a kerf wide for it, and every part stays on the bed", () => {
    const layout = nested(
      buildRequest(pieces, [buildSheet(1220, 800)], { rules: { bed: { ...bed, larger: "split" } } }),
    );
    expect(layout.remarks).toEqual([
      "Sheet (1220 × 800 mm) is larger than the bed (610 × 420 mm): it is cut into 4 parts first.",
    ]);
    expect(layout.sheets.map(({ part, parts }) => `${part}/${parts}`)).toEqual(["1/4", "2/4", "3/4", "4/4"]);
    for (const { region } of layout.sheets) {
      const box = boxOfRegion(region);
      expect(Math.max(box?.width ?? 999, 0)).toBeLessThanOrEqual(610);
      expect(Math.max(box?.height ?? 999, 0)).toBeLessThanOrEqual(420);
    }
    const second = boxOfRegion(layout.sheets[1]?.region ?? []);
    expect(second?.x).toBe(613);
  });

  it("are not used where they are not to be cut, and it says so", () => {
    const rules = { bed: { ...bed, larger: "refuse" } } as const;
    const layout = nested(
      buildRequest(pieces, [buildSheet(1220, 800), buildSheet(420, 600, { id: "fits" })], { rules }),
    );
    expect(new Set(layout.sheets.map(({ stockId }) => stockId))).toEqual(new Set(["fits"]));
    expect(layout.remarks).toEqual(["Sheet (1220 × 800 mm) is larger than the bed (610 × 420 mm) and is not used."]);
  });

  it("leave nothing to cut from when there are no others", () => {
    const rules = { bed: { ...bed, larger: "refuse" } } as const;
    const outcome = nestSheets(buildRequest(pieces, [buildSheet(1220, 800)], { rules }), {}, kernel);
    expect(outcome).toEqual({
      ok: false,
      problems: [
        {
          field: "stock",
          words:
            "No sheet in stock can be used. Sheet (1220 × 800 mm) is larger than the bed (610 × 420 mm) and is not used.",
        },
      ],
    });
  });
});

describe("the search", () => {
  const twenty = concavePaths(20, 4).map((path, index) => buildPiece(String(index), path));
  const request = buildRequest(twenty, [buildSheet(900, 300)], { effort: 0.15 });

  it("gives the same layout for the same request and seed", () => {
    expect(nested(request)).toEqual(nested(request));
  });

  it("goes another way with another seed", () => {
    expect(nested({ ...request, seed: 2 }).sheets).not.toEqual(nested(request).sheets);
  });

  it("loses less than the first layout", () => {
    expect(nested(request).consumedMm2).toBeLessThan(nested({ ...request, effort: 0 }).consumedMm2);
  });

  it("tells how far it is, with a best that only gets better", () => {
    const told: NestingProgress[] = [];
    nested(request, { onProgress: (progress) => told.push(progress) });
    expect(told.length).toBeGreaterThan(20);
    expect(told.map(({ done }) => done)).toEqual(told.map(({ done }) => done).toSorted((a, b) => a - b));
    expect(told.every(({ placedCopies, sheets }) => placedCopies === 20 && sheets === 1)).toBe(true);
    expect(told.at(-1)?.use).toBeGreaterThanOrEqual(told[0]?.use ?? 1);
  });

  it("gives the best so far at any time, fit to be cut", () => {
    const layouts: SheetLayout[] = [];
    const last = nested(request, {
      onProgress: ({ done, layout }) => {
        if (layouts.length < 3 && done > 0.3 * layouts.length) layouts.push(layout());
      },
    });
    expect(layouts).toHaveLength(3);
    for (const layout of layouts) {
      expectSoundLayout(request, layout, kernel);
      expect(layout.stopped).toBe(true);
    }
    expect(last.use).toBeGreaterThanOrEqual((layouts[0]?.use ?? 1) * 0.99);
  });

  it("ends when told to, with the best so far", () => {
    let asked = 0;
    const layout = nested({ ...request, effort: 100 }, { shouldStop: () => asked++ > 200 });
    expect(layout.stopped).toBe(true);
    expect(layout.sheets[0]?.placements).toHaveLength(20);
  });

  it("told to stop at once, it lists everything as not laid", () => {
    const layout = nested(request, { shouldStop: () => true });
    expect(layout.sheets).toEqual([]);
    expect(layout.unplaced.map(({ reason }) => reason)).toEqual(twenty.map(() => "stopped"));
  });

  it("lays 10,000 pieces of two kinds in bounded work", { timeout: 60_000 }, () => {
    const pieces = [
      buildPiece("ell", ell, { quantity: 5_000 }),
      buildPiece("plate", rectangle(60, 40), { quantity: 5_000 }),
    ];
    const outcome = nestSheets(buildRequest(pieces, [buildSheet(2440, 1220)]), {}, kernel);
    const sheets = outcome.ok ? outcome.value.sheets : [];
    expect(sheets.reduce((sum, { placements }) => sum + placements.length, 0)).toBe(10_000);
    expect(sheets.length).toBeLessThanOrEqual(17);
  });
});
