import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument, Slats } from "#shared/mockup/document.ts";
import { backerThicknessMm, faceRegion, faceStock, frameOf, slatsOf } from "#shared/stack/backer.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { buildLayer, plate } from "../../../support/build-sign.ts";
import { buildFrame, buildSlatSign } from "../../../support/slat-sign.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const frame = buildFrame();
/** Oak slats on pine with one plate bonded to them. */
const sign = (rest: Partial<Slats> = {}, more: Partial<MockupDocument> = {}): MockupDocument =>
  buildSlatSign(rest, [buildLayer("B", [plate("p", 100, 60, [300, 200])])], more);

describe("a backer of slats", () => {
  it("has its face where substrate and slats end, less what sanding takes", () => {
    // 12 + 9 − 0.3.
    expect(backerThicknessMm(sign().backer)).toBeCloseTo(20.7, 9);
    expect(faceStock(sign().backer).name).toBe("Red oak");
    const figures = computeFigures(sign(), kernel);
    expect(figures.backerTop.nominal).toBeCloseTo(20.7, 9);
    expect(figures.pieces[0]).toMatchObject({ restsOn: ["A"] });
    expect(figures.pieces[0]?.bottom.nominal).toBeCloseTo(20.7, 9);
  });

  it("weighs its substrate and what is left of its slats", () => {
    // Wood at 8 %: 1080 · G12 kg/m³. 600 × 400 × 12 of pine, 600 × 400 × 8.7 of oak.
    const grams = 0.24 * 0.012 * 1080 * 0.35 * 1000 + 0.24 * 0.0087 * 1080 * 0.63 * 1000;
    expect(computeFigures(sign(), kernel).backerMassG).toBeCloseTo(grams, 3);
  });

  it("bears nothing over its gaps", () => {
    // Slats of 40 and gaps of 10, from the lower edge up: eight slats in 400 mm.
    const open = sign({ gap: 10 });
    expect(regionAreaMm2(faceRegion(open, kernel))).toBeCloseTo(600 * 40 * 8, 3);
    const narrow = { ...open, layers: [buildLayer("B", [plate("p", 100, 8, [300, 5])])] };
    expect(computeFigures(narrow, kernel).pieces[0]?.restsOn).toEqual([]);
  });

  it("that can't be laid says which measure is wrong and counts as a full face", () => {
    const wrong = sign({ gap: 60 });
    expect(slatsOf(wrong, kernel)).toMatchObject({ ok: false, reason: { field: "gap" } });
    expect(regionAreaMm2(faceRegion(wrong, kernel))).toBeCloseTo(240_000, 6);
    expect(computeFigures(wrong, kernel).backerMassG).toBeCloseTo(computeFigures(sign(), kernel).backerMassG, 6);
  });
});

describe("a frame", () => {
  it("weighs its mitred pieces, and its depth counts when it stands highest", () => {
    // 640 × 440 less 600 × 400 mm, 30 deep.
    const framed = sign({}, { frame, layers: [] });
    const round = 0.64 * 0.44 - 0.24;
    const bare = computeFigures(sign({}, { layers: [] }), kernel);
    const figures = computeFigures(framed, kernel);
    expect(figures.backerMassG - bare.backerMassG).toBeCloseTo(round * 0.03 * 1080 * 0.63 * 1000, 3);
    expect(figures.depth.nominal).toBe(30);
    expect(bare.depth.nominal).toBeCloseTo(20.7, 9);
  });

  it("goes round straight edges only", () => {
    const round = sign({}, { frame, board: { ...sign().board, outline: { kind: "ellipse" } } });
    expect(frameOf(round, kernel)?.ok).toBe(false);
    expect(frameOf(sign(), kernel)).toBeNull();
  });
});
