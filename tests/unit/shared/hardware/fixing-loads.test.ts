import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fixingLoads, fixingRows, usedShare, weightN } from "#shared/hardware/fixing-loads.ts";
import { allowableLateralN, screwLateral } from "#shared/hardware/lateral.ts";
import { resultOf } from "../../../support/reference-data.ts";

describe("rows of fixings", () => {
  const at = (...places: [number, number][]) => places.map(([x, y]) => ({ x, y }));
  it.each([
    { name: "four corners", places: at([0, 0], [300, 0], [0, 200], [300, 200]), upper: 2, apart: 200 },
    { name: "one row", places: at([0, 50], [300, 50]), upper: 2, apart: 7.5 },
    { name: "one fixing", places: at([10, 20]), upper: 1, apart: 7.5 },
    { name: "an upper row half a barrel out of level", places: at([0, 0], [300, 7.5], [0, 200]), upper: 2, apart: 200 },
    { name: "a slanting upper row", places: at([0, 0], [300, 8], [0, 200]), upper: 1, apart: 200 },
    { name: "three rows", places: at([0, 0], [0, 100], [0, 200]), upper: 1, apart: 200 },
  ])("$name: $upper in the upper row, $apart apart", ({ places, upper, apart }) => {
    expect(fixingRows(places, 15)).toEqual({ fixings: places.length, upper, apart });
  });

  it("there are none without fixings", () => {
    expect(fixingRows([], 15)).toBeNull();
  });
});

describe("what a panel asks of its fixings", () => {
  // Statics: 2 kg is 19.6133 N; a quarter each, and 19.6133 × 21.5 / (200 × 2) along each of the upper two.
  it("is its weight shared out, and its lever on the upper row", () => {
    expect(weightN(2000)).toBeCloseTo(19.6133, 9);
    const loads = resultOf(
      fixingLoads({ weightN: 19.6133, centroidOff: 21.5, rows: { fixings: 4, upper: 2, apart: 200 } }),
    );
    expect(loads.shearN).toBeCloseTo(4.903325, 9);
    expect(loads.withdrawalN).toBeCloseTo(1.0542149, 6);
  });

  it("balances: all shears are the weight, the upper row's pull times its height is the weight's lever", () => {
    const some = fc.double({ min: 0.1, max: 1000, noNaN: true });
    const count = fc.integer({ min: 1, max: 20 });
    fc.assert(
      fc.property(some, some, some, count, count, (weight, centroidOff, apart, upper, lower) => {
        const rows = { fixings: upper + lower, upper, apart };
        const loads = resultOf(fixingLoads({ weightN: weight, centroidOff, rows }));
        expect(loads.shearN * rows.fixings).toBeCloseTo(weight, 6);
        expect((loads.withdrawalN * upper * apart) / (weight * centroidOff)).toBeCloseTo(1, 9);
      }),
    );
  });

  it.each([
    { field: "weightN", change: { weightN: -1 } },
    { field: "centroidOff", change: { centroidOff: Number.NaN } },
    { field: "upper", change: { rows: { fixings: 2, upper: 3, apart: 100 } } },
    { field: "apart", change: { rows: { fixings: 2, upper: 1, apart: 0 } } },
  ])("is refused for its $field", ({ field, change }) => {
    const panel = { weightN: 10, centroidOff: 20, rows: { fixings: 4, upper: 2, apart: 200 }, ...change };
    expect(fixingLoads(panel)).toMatchObject({ ok: false, reason: { field } });
  });

  it("takes up a share of what is allowed; nothing can be taken up where nothing is", () => {
    expect(resultOf(usedShare(50, 200))).toBe(0.25);
    expect(usedShare(50, 0)).toMatchObject({ ok: false, reason: { field: "allowableN" } });
  });
});

// From memory: National Design Specification before 1991, full load from 7 D, in proportion under it; under 4 D our estimate.
describe("a screw across that is not deep", () => {
  const pine = { gravity: 0.35, hardness: "softwood", diameter: 4 } as const;
  it.each([
    { penetration: 28, share: 1, tooShallow: false },
    { penetration: 40, share: 1, tooShallow: false },
    { penetration: 21, share: 0.75, tooShallow: false },
    { penetration: 16, share: 4 / 7, tooShallow: false },
    { penetration: 15.9, share: 15.9 / 28, tooShallow: true },
  ])("$penetration mm of a 4 mm screw carry $share of the load", ({ penetration, share, tooShallow }) => {
    const { loadN, tooShallow: got } = resultOf(screwLateral({ ...pine, penetration }));
    expect(loadN).toBeCloseTo(share * 23.17 * 16, 6);
    expect(got).toBe(tooShallow);
    expect(resultOf(allowableLateralN({ ...pine, penetration }))).toBeCloseTo(loadN / 2, 9);
  });

  it("wood that the table does not reach has no load", () => {
    expect(screwLateral({ ...pine, gravity: 0.28, penetration: 28 })).toMatchObject({
      ok: false,
      reason: { field: "gravity" },
    });
    expect(screwLateral({ ...pine, gravity: 0.55, penetration: 28 })).toMatchObject({ ok: false });
  });
});
