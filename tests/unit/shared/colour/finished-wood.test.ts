import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Coat, finishedWood, finishedWoodLrv } from "#shared/colour/finished-wood.ts";
import { labOf } from "#shared/colour/lab.ts";
import { lrvOfLightness, luminanceContrast } from "#shared/colour/lrv.ts";
import { resultOf } from "../../../support/reference-data.ts";

const pine = labOf("#E6CFA4");
const walnutStain: Coat = { kind: "stain", colour: { L: 30, a: 10, b: 15 }, strength: 0.5 };
const oil: Coat = { kind: "clear, oil or shellac" };
const water: Coat = { kind: "clear, water-borne" };

describe("wood under its coats", () => {
  it("stays as it is without any", () => {
    expect(resultOf(finishedWood(pine, []))).toEqual(pine);
  });

  it("goes as far towards a stain as it is strong", () => {
    const half = resultOf(finishedWood({ L: 80, a: 4, b: 25 }, [walnutStain]));
    expect(half).toEqual({ L: 55, a: 7, b: 20 });
    expect(resultOf(finishedWood(pine, [{ ...walnutStain, strength: 1 }])).L).toBeCloseTo(30, 9);
    expect(resultOf(finishedWood(pine, [{ ...walnutStain, strength: 0 }])).L).toBeCloseTo(pine.L, 9);
  });

  it("darkens once, under its first clear coat, more with oil than with water", () => {
    const lightness = (...coats: Coat[]) => resultOf(finishedWood({ L: 80, a: 4, b: 25 }, coats)).L;
    expect(lightness(oil)).toBe(72);
    expect(lightness(water)).toBe(77);
    expect(lightness(oil, water, oil)).toBe(72);
  });

  it("changes the contrast of letters on it", () => {
    const letters = resultOf(lrvOfLightness(labOf("#27314F").L));
    const points = (...coats: Coat[]) =>
      resultOf(luminanceContrast(resultOf(finishedWoodLrv(pine, coats)), letters)).points;
    expect(points()).toBeGreaterThan(points(oil));
    expect(points(oil)).toBeGreaterThan(points(walnutStain, oil));
    // A dark stain takes dark letters under the 30 points that are taken for adequate.
    expect(points()).toBeGreaterThan(30);
    expect(points({ ...walnutStain, strength: 0.9 }, oil)).toBeLessThan(30);
  });

  it.each([
    { wood: { ...pine, L: 101 }, coats: [], field: "wood L" },
    { wood: { ...pine, a: Number.NaN }, coats: [], field: "wood a" },
    { wood: pine, coats: [oil, { ...walnutStain, strength: 1.1 }], field: "stain 1 strength" },
    { wood: pine, coats: [walnutStain, { ...walnutStain, colour: { L: -1, a: 0, b: 0 } }], field: "stain 2 L" },
  ])("is refused for its $field", ({ wood, coats, field }) => {
    expect(finishedWoodLrv(wood, coats)).toMatchObject({ ok: false, reason: { field } });
  });
});

it("lightness and reflectance rise together, and contrast lies between nothing and all", () => {
  const lightness = fc.double({ min: 0, max: 100, noNaN: true });
  fc.assert(
    fc.property(lightness, lightness, (one, other) => {
      const [a, b] = [one, other].map((L) => resultOf(lrvOfLightness(L)));
      if (a === undefined || b === undefined) throw new Error("Two went in.");
      if (one < other) expect(a).toBeLessThanOrEqual(b);
      const { percent, points, michelson } = resultOf(luminanceContrast(Math.min(a, 100), Math.min(b, 100)));
      for (const value of [percent, points, michelson * 100]) {
        expect(value).toBeGreaterThanOrEqual(0);
        expect(value).toBeLessThanOrEqual(100 + 1e-9);
      }
      expect(percent).toBeGreaterThanOrEqual(points - 1e-9);
    }),
  );
  expect(resultOf(luminanceContrast(0, 0))).toEqual({ percent: 0, points: 0, michelson: 0 });
});
