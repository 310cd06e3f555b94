import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import type { Figures } from "#shared/stack/figures.ts";
import {
  bondHold,
  buildCapStud,
  buildLayer,
  buildPiece,
  buildSign,
  disc,
  hole,
  plate,
  pocketHold,
  standoffHold,
} from "../../../support/build-sign.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const pieceOf = (figures: Figures, id: string) => {
  const piece = figures.pieces.find(({ pieceId }) => pieceId === id);
  if (!piece) throw new Error(`No figures of ${id}.`);
  return piece;
};

// Pine of G 0.35 at 8 %: 378 kg/m³ (Wood Handbook, GTR-282); acrylic 1190 kg/m³ (ASTM D792).
const pineKgM3 = 378;
const boardG = 600 * 400 * 18 * pineKgM3 * 1e-6;

describe("an empty board", () => {
  it("has its own thickness and mass, and nothing more", () => {
    const figures = computeFigures(
      buildSign([], { hanging: { kind: "cleat", gap: 6, pose: "upright", carriesKg: null, points: [] } }),
      kernel,
    );
    expect(figures).toMatchObject({
      backerTop: { nominal: 18, least: 18, most: 18 },
      depth: { nominal: 18, least: 18, most: 18 },
      offWall: { nominal: 24, least: 24, most: 24 },
      layers: [],
      pieces: [],
      hardwareCount: 0,
    });
    expect(figures.backerMassG).toBeCloseTo(boardG, 6);
    expect(figures.massG).toBeCloseTo(1632.96, 6);
  });

  it("gives an empty layer the heights of a piece that would lie on it", () => {
    const { layers } = computeFigures(buildSign([buildLayer("B", [], { hold: standoffHold([]) })]), kernel);
    expect(layers[0]).toMatchObject({ pieces: 0, massG: 0, bottom: { nominal: 30 }, top: { nominal: 33 } });
  });
});

describe("heights", () => {
  it("a bonded piece stands on the highest thing under it", () => {
    const sign = buildSign([
      buildLayer("B", [plate("b", 200, 100, [300, 200])], { thickness: 6 }),
      buildLayer("C", [plate("c", 50, 50, [300, 200])]),
      buildLayer("D", [plate("d", 50, 50, [50, 50])]),
    ]);
    const figures = computeFigures(sign, kernel);
    expect(pieceOf(figures, "c")).toMatchObject({ restsOn: ["B", "A"], bottom: { nominal: 24 }, top: { nominal: 27 } });
    expect(pieceOf(figures, "d")).toMatchObject({ restsOn: ["A"], bottom: { nominal: 18 }, top: { nominal: 21 } });
    expect(figures.depth.nominal).toBe(27);
  });

  it("carry the bands of the sheets below: cast 6 mm ±1.0 and 3 mm ±0.7 (ISO 7823-1)", () => {
    const sign = buildSign([
      buildLayer("B", [plate("b", 200, 100, [300, 200])], { thickness: 6 }),
      buildLayer("C", [plate("c", 50, 50, [300, 200])]),
    ]);
    const { bottom, top } = pieceOf(computeFigures(sign, kernel), "c");
    expect(bottom.least).toBeCloseTo(23, 9);
    expect(bottom.most).toBeCloseTo(25, 9);
    expect(top.least).toBeCloseTo(25.3, 9);
    expect(top.most).toBeCloseTo(28.7, 9);
  });

  it("a piece in a pocket lies that much lower, with the depth's own ±0.2", () => {
    const sign = buildSign([buildLayer("B", [plate("b", 100, 100, [300, 200])], { hold: pocketHold(2) })]);
    const { bottom, top } = pieceOf(computeFigures(sign, kernel), "b");
    expect(bottom).toEqual({ nominal: 16, least: 15.8, most: 16.2 });
    expect(top.nominal).toBe(19);
  });

  it("a panel on standoffs stands its barrels' length over what they stand on, not over what else is under it", () => {
    const sign = buildSign([
      buildLayer("B", [plate("low", 40, 40, [300, 200])], { thickness: 6 }),
      buildLayer("C", [plate("panel", 300, 200, [300, 200])], {
        hold: standoffHold([hole("h1", 180, 130, { fixed: true }), hole("h2", 420, 270)]),
      }),
    ]);
    const figures = computeFigures(sign, kernel);
    expect(pieceOf(figures, "panel")).toMatchObject({ restsOn: ["A"], bottom: { nominal: 30 }, top: { nominal: 33 } });
    expect(figures.hardwareCount).toBe(2);
  });

  it("a panel without holes is shown over the highest thing under it", () => {
    const sign = buildSign([
      buildLayer("B", [plate("low", 40, 40, [300, 200])], { thickness: 6 }),
      buildLayer("C", [plate("panel", 300, 200, [300, 200])], { hold: standoffHold([]) }),
    ]);
    expect(pieceOf(computeFigures(sign, kernel), "panel").bottom.nominal).toBe(36);
  });

  it("barrels that stand on a plate lift the panel over the plate", () => {
    const sign = buildSign([
      buildLayer("B", [plate("low", 300, 200, [300, 200])], { thickness: 6 }),
      buildLayer("C", [plate("panel", 200, 100, [300, 200])], { hold: standoffHold([hole("h1", 300, 200)]) }),
    ]);
    expect(pieceOf(computeFigures(sign, kernel), "panel")).toMatchObject({
      restsOn: ["B", "A"],
      bottom: { nominal: 36 },
    });
  });

  it("caps stand over the panel and count for the depth", () => {
    const sign = buildSign([
      buildLayer("B", [plate("panel", 200, 100, [300, 200])], {
        hold: standoffHold([hole("h1", 300, 200)], buildCapStud({ capThickness: 4 })),
      }),
    ]);
    expect(computeFigures(sign, kernel).depth.nominal).toBe(18 + 12 + 3 + 4);
  });

  it("neighbours that share an edge, or overlap by a hair, don't stand on each other", () => {
    const sign = buildSign([
      buildLayer("B", [plate("b", 100, 100, [200, 200])]),
      buildLayer("C", [plate("beside", 100, 100, [300, 200]), plate("hair", 100, 100, [200, 299.95])]),
    ]);
    const figures = computeFigures(sign, kernel);
    expect(pieceOf(figures, "beside").restsOn).toEqual(["A"]);
    expect(pieceOf(figures, "hair").restsOn).toEqual(["A"]);
  });

  it("a piece that overlaps by a millimetre stands on what it overlaps", () => {
    const sign = buildSign([
      buildLayer("B", [plate("b", 100, 100, [200, 200])]),
      buildLayer("C", [plate("over", 100, 100, [299, 200])]),
    ]);
    expect(pieceOf(computeFigures(sign, kernel), "over").restsOn).toEqual(["B", "A"]);
  });

  it("a disc in the hole of a ring lies on what the ring lies on", () => {
    const ring = buildPiece("ring", [...circlePath({ x: 0, y: 0 }, 50), ...circlePath({ x: 0, y: 0 }, 30)], {
      at: [300, 200],
    });
    const sign = buildSign([buildLayer("B", [ring]), buildLayer("C", [disc("inside", 29, [300, 200])])]);
    expect(pieceOf(computeFigures(sign, kernel), "inside").restsOn).toEqual(["A"]);
  });

  it("a piece beside the board stands on nothing, in the plane of the board's face", () => {
    const sign = buildSign([buildLayer("B", [plate("b", 100, 100, [700, 200])])]);
    expect(pieceOf(computeFigures(sign, kernel), "b")).toMatchObject({ restsOn: [], bottom: { nominal: 18 } });
  });
});

describe("areas and masses", () => {
  it("a plate of 200 by 100 by 3 mm weighs 71.4 g", () => {
    const figures = computeFigures(buildSign([buildLayer("B", [plate("b", 200, 100, [300, 200])])]), kernel);
    const piece = pieceOf(figures, "b");
    expect(piece.areaMm2).toBeCloseTo(20_000, 6);
    expect(piece.perimeterMm).toBeCloseTo(600, 6);
    expect(piece.box).toEqual({ x: 200, y: 150, width: 200, height: 100 });
    expect(piece.centroid.x).toBeCloseTo(300, 6);
    expect(piece.massG).toBeCloseTo(71.4, 6);
    expect(figures.layers[0]?.massG).toBeCloseTo(71.4, 6);
    expect(figures.massG).toBeCloseTo(boardG + 71.4, 6);
  });

  it("a ring of 10 and 6 mm has 64 π mm², to the flattening of 0.02 mm", () => {
    const ring = buildPiece("ring", [...circlePath({ x: 0, y: 0 }, 10), ...circlePath({ x: 0, y: 0 }, 6)], {
      at: [300, 200],
    });
    const { areaMm2 } = pieceOf(computeFigures(buildSign([buildLayer("B", [ring])]), kernel), "ring");
    expect(Math.abs(areaMm2 / (64 * Math.PI) - 1)).toBeLessThan(0.004);
  });

  it("scale, turn and mirror change area by the square of the scale only", () => {
    const placement = { x: 300, y: 200, turn: 33, scale: 1.5, mirrored: true };
    const sign = buildSign([buildLayer("B", [plate("b", 100, 60, [0, 0], { placement })])]);
    expect(pieceOf(computeFigures(sign, kernel), "b").areaMm2).toBeCloseTo(13_500, 0);
  });

  it("holes of the hardware are drilled out of the mass but not of the outline", () => {
    const sign = buildSign([
      buildLayer("B", [plate("b", 200, 100, [300, 200])], {
        hold: standoffHold([hole("h1", 250, 200, { diameter: 10 }), hole("h2", 350, 200, { diameter: 10 })]),
      }),
    ]);
    const piece = pieceOf(computeFigures(sign, kernel), "b");
    expect(piece.areaMm2).toBeCloseTo(20_000, 6);
    expect(piece.massG).toBeCloseTo((20_000 - 2 * 25 * Math.PI) * 3 * 1190e-6, 2);
  });

  it("a pocket in the board lightens the board, one in a plate the plate", () => {
    const inBoard = buildSign([buildLayer("B", [plate("b", 100, 50, [300, 200])], { hold: pocketHold(2) })]);
    expect(computeFigures(inBoard, kernel).backerMassG).toBeCloseTo(boardG - 100 * 50 * 2 * pineKgM3 * 1e-6, 6);
    const inPlate = buildSign([
      buildLayer("B", [plate("b", 200, 100, [300, 200])]),
      buildLayer("C", [plate("c", 100, 50, [300, 200])], { hold: pocketHold(2) }),
    ]);
    const figures = computeFigures(inPlate, kernel);
    expect(figures.backerMassG).toBeCloseTo(boardG, 6);
    expect(pieceOf(figures, "b").massG).toBeCloseTo((20_000 * 3 - 5000 * 2) * 1190e-6, 6);
    expect(pieceOf(figures, "c").massG).toBeCloseTo(5000 * 3 * 1190e-6, 6);
  });

  it("a pocket's clearance takes more than the piece that goes in", () => {
    const sign = buildSign([buildLayer("B", [plate("b", 100, 50, [300, 200])], { hold: pocketHold(2, 1) })]);
    // 102 × 52 with corners of radius 1: 102 · 52 − (4 − π).
    const cut = (5304 - (4 - Math.PI)) * 2 * pineKgM3 * 1e-6;
    expect(computeFigures(sign, kernel).backerMassG).toBeCloseTo(boardG - cut, 3);
  });

  it("a piece let in flush takes nothing out of itself", () => {
    const sign = buildSign([buildLayer("B", [plate("b", 100, 50, [300, 200])], { hold: pocketHold(3) })]);
    const piece = pieceOf(computeFigures(sign, kernel), "b");
    expect(piece.top.nominal).toBe(18);
    expect(piece.massG).toBeCloseTo(5000 * 3 * 1190e-6, 6);
  });

  it("a pocket deeper than the board takes out the board's thickness", () => {
    const sign = buildSign([buildLayer("B", [plate("b", 100, 50, [300, 200])], { hold: pocketHold(40) })]);
    expect(computeFigures(sign, kernel).backerMassG).toBeCloseTo((600 * 400 - 5000) * 18 * pineKgM3 * 1e-6, 6);
  });

  it("a pocket deeper than the board never makes a mass negative", () => {
    const sign = buildSign([buildLayer("B", [plate("b", 700, 500, [300, 200])], { hold: pocketHold(40) })]);
    const figures = computeFigures(sign, kernel);
    expect(figures.backerMassG).toBe(0);
    expect(pieceOf(figures, "b").bottom.nominal).toBe(-22);
  });
});

describe("odd input", () => {
  it("a piece without an outline, or flat as a line, has no area, no mass and a place", () => {
    const line = buildPiece(
      "line",
      [
        {
          start: { x: 0, y: 0 },
          segments: [
            { kind: "line", to: { x: 10, y: 0 } },
            { kind: "line", to: { x: 0, y: 0 } },
          ],
        },
      ],
      { at: [30, 40] },
    );
    const figures = computeFigures(
      buildSign([buildLayer("B", [buildPiece("none", [], { at: [30, 40] }), line])]),
      kernel,
    );
    for (const id of ["none", "line"]) {
      expect(pieceOf(figures, id)).toMatchObject({
        areaMm2: 0,
        massG: 0,
        perimeterMm: 0,
        restsOn: [],
        box: { x: 30, y: 40, width: 0, height: 0 },
        centroid: { x: 30, y: 40 },
      });
    }
  });

  it("every figure of the largest sign there may be is finite", () => {
    const sign = buildSign(
      [buildLayer("B", [plate("b", 10_000, 10_000, [5000, 5000])], { thickness: 100, hold: bondHold })],
      { board: { outline: { kind: "rectangle" }, width: 10_000, height: 10_000, measures: "body" } },
    );
    const figures = computeFigures(sign, kernel);
    expect(figures.pieces[0]?.areaMm2).toBeCloseTo(1e8, 0);
    expect(figures.massG).toBeCloseTo(1e8 * 18 * pineKgM3 * 1e-6 + 1e8 * 100 * 1190e-6, 0);
  });
});

describe("laws", () => {
  const size = fc.integer({ min: 1, max: 200 });
  const place = fc.integer({ min: -50, max: 450 });
  const shape = fc.record({ width: size, height: size, x: place, y: place, turn: fc.integer({ min: -180, max: 180 }) });
  const hold = fc.constantFrom(bondHold, pocketHold(1.5, 0.1), standoffHold([]));
  const layers = fc.array(
    fc.record({ shapes: fc.array(shape, { maxLength: 3 }), thickness: fc.constantFrom(3, 4.5, 6), hold }),
    {
      maxLength: 4,
    },
  );
  type Drawn = typeof layers extends fc.Arbitrary<infer T> ? T : never;
  const signOf = (drawn: Drawn, dx = 0, dy = 0): MockupDocument =>
    buildSign(
      drawn.map(({ shapes, thickness, hold: held }, level) =>
        buildLayer(
          String.fromCharCode(66 + level),
          shapes.map(({ width, height, x, y, turn }, index) =>
            buildPiece(`p${level}-${index}`, rectanglePath({ x: -width / 2, y: -height / 2, width, height }), {
              placement: { x: x + dx, y: y + dy, turn, scale: 1, mirrored: false },
            }),
          ),
          { thickness, hold: held },
        ),
      ),
      { board: { outline: { kind: "rectangle" }, width: 2000, height: 2000, measures: "body" } },
    );

  it("bands are in order, masses are not negative, and the whole is the sum of its parts", () => {
    fc.assert(
      fc.property(layers, (drawn) => {
        const figures = computeFigures(signOf(drawn), kernel);
        const bands = [figures.depth, figures.offWall, ...figures.pieces.flatMap(({ bottom, top }) => [bottom, top])];
        for (const { least, nominal, most } of bands) {
          expect(least).toBeLessThanOrEqual(nominal);
          expect(nominal).toBeLessThanOrEqual(most);
        }
        for (const { massG } of figures.pieces) expect(massG).toBeGreaterThanOrEqual(0);
        const parts = figures.pieces.reduce((sum, piece) => sum + piece.massG, figures.backerMassG);
        expect(figures.massG).toBeCloseTo(parts, 6);
      }),
      { numRuns: 60 },
    );
  });

  it("moving everything on the board together changes no height, no area and no mass", () => {
    const shift = fc.integer({ min: 0, max: 1000 });
    fc.assert(
      fc.property(layers, shift, shift, (drawn, dx, dy) => {
        // All of it well inside the board, before and after.
        const before = computeFigures(signOf(drawn, 300, 300), kernel);
        const after = computeFigures(signOf(drawn, 300 + dx, 300 + dy), kernel);
        expect(after.depth).toEqual(before.depth);
        expect(after.massG).toBeCloseTo(before.massG, 2);
        for (const [index, piece] of before.pieces.entries()) {
          expect(after.pieces[index]?.bottom).toEqual(piece.bottom);
          expect(after.pieces[index]?.restsOn).toEqual(piece.restsOn);
          expect(Math.abs((after.pieces[index]?.areaMm2 ?? 0) - piece.areaMm2)).toBeLessThan(0.5);
        }
      }),
      { numRuns: 40 },
    );
  });

  it("no bonded piece stands lower than the board, nor lower than anything its key list names first", () => {
    fc.assert(
      fc.property(layers, (drawn) => {
        const figures = computeFigures(
          signOf(
            drawn.map((layer) => ({ ...layer, hold: bondHold })),
            300,
            300,
          ),
          kernel,
        );
        for (const piece of figures.pieces) {
          const tops = figures.pieces
            .filter(({ layerKey }) => layerKey === piece.restsOn[0])
            .map(({ top }) => top.nominal);
          const carried = piece.restsOn[0] === "A" ? [18] : tops;
          expect(carried).toContain(piece.bottom.nominal);
        }
      }),
      { numRuns: 40 },
    );
  });
});
