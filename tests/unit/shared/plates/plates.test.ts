import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bendsTooFar, deflectionLimitMm } from "#shared/plates/deflection.ts";
import { pushDeflection, usualPushN } from "#shared/plates/push.ts";
import { acrylicSheet, lastingShare, ownWeight } from "#shared/plates/rigidity.ts";
import { type Support, sag } from "#shared/plates/sag.ts";
import { resultOf } from "../../../support/reference-data.ts";

const sheet = { ...acrylicSheet, thickness: 5 };
const four: Support = { kind: "four points", width: 300, height: 200 };

describe("sag", () => {
  it("of four points goes by the longer spacing and is an upper estimate unless they make a square", () => {
    const at = (width: number, height: number) => resultOf(sag(sheet, { kind: "four points", width, height }, 5e-5));
    expect(at(300, 200)).toMatchObject({ kind: "figure", upperEstimate: true });
    expect(at(300, 300)).toMatchObject({ kind: "figure", upperEstimate: false });
    expect(at(200, 300)).toEqual(at(300, 200));
    const square = at(300, 300);
    expect(at(300, 200)).toEqual({ ...square, upperEstimate: true });
  });

  it("doubles under a lasting load, when acrylic has half its modulus", () => {
    const load = ownWeight(5, 1190);
    const short = resultOf(sag(sheet, four, load));
    const lasting = resultOf(sag({ ...sheet, modulus: sheet.modulus * lastingShare }, four, load));
    if (short.kind !== "figure" || lasting.kind !== "figure") throw new Error("It should be a figure.");
    expect(lasting.mm / short.mm).toBeCloseTo(2, 9);
  });

  it("grows with load and spacing, and falls with thickness", () => {
    const mm = fc.double({ min: 50, max: 300, noNaN: true });
    const more = fc.double({ min: 1.01, max: 3, noNaN: true });
    const kinds = fc.constantFrom("four points", "grid", "edges", "strip", "overhang");
    const support = (kind: string, span: number): Support => {
      if (kind === "grid") return { kind, spacing: span };
      if (kind === "strip" || kind === "overhang") return { kind, reach: span };
      return { kind: kind === "edges" ? "edges" : "four points", width: span, height: span * 0.7 };
    };
    const figure = (kind: string, span: number, load: number, thickness: number) => {
      const got = resultOf(sag({ ...acrylicSheet, thickness }, support(kind, span), load));
      return got.kind === "figure" ? got.mm : Number.POSITIVE_INFINITY;
    };
    fc.assert(
      fc.property(kinds, mm, more, (kind, span, factor) => {
        const base = figure(kind, span, 1e-5, 10);
        expect(figure(kind, span, 1e-5 * factor, 10)).toBeCloseTo(base * factor, 9);
        expect(figure(kind, span * factor, 1e-5, 10)).toBeGreaterThan(base);
        expect(figure(kind, span, 1e-5, 10 * factor)).toBeLessThan(base);
      }),
    );
  });

  it("under its own weight is less for a thicker sheet: the load grows with t, the stiffness with t³", () => {
    const own = (thickness: number) => {
      const got = resultOf(
        sag({ ...acrylicSheet, thickness }, { kind: "grid", spacing: 300 }, ownWeight(thickness, 1190)),
      );
      return got.kind === "figure" ? got.mm : Number.NaN;
    };
    expect(own(3) / own(6)).toBeCloseTo(4, 9);
  });
});

describe("a push", () => {
  it("is the same whichever way the panel lies, and a figure only within half the thickness", () => {
    const push = (width: number, height: number, force: number) =>
      resultOf(pushDeflection(sheet, { width, height }, force));
    expect(push(300, 200, 20)).toEqual(push(200, 300, 20));
    expect(push(300, 200, 20).kind).toBe("figure");
    expect(push(600, 400, usualPushN)).toEqual({ kind: "beyond the theory", overMm: 2.5 });
    expect(push(300, 200, 0)).toMatchObject({ mm: 0 });
  });
});

describe("the limit", () => {
  it.each([
    { spacing: 100, limit: 1 },
    { spacing: 300, limit: 1 },
    { spacing: 600, limit: 2 },
  ])("over $spacing mm is $limit mm", ({ spacing, limit }) => {
    expect(resultOf(deflectionLimitMm(spacing))).toBeCloseTo(limit, 9);
  });

  it("is passed just beyond it, and always beyond the theory", () => {
    const figure = (mm: number) => ({ kind: "figure" as const, mm, upperEstimate: false });
    expect(bendsTooFar(figure(1), 1)).toBe(false);
    expect(bendsTooFar(figure(1.01), 1)).toBe(true);
    expect(bendsTooFar({ kind: "beyond the theory", overMm: 1.5 }, 2)).toBe(true);
  });
});

it.each([
  { change: { thickness: 0 }, field: "thickness" },
  { change: { modulus: Number.NaN }, field: "modulus" },
  { change: { poisson: 0.6 }, field: "poisson" },
])("a sheet of $change is refused", ({ change, field }) => {
  expect(sag({ ...sheet, ...change }, four, 5e-5)).toMatchObject({ ok: false, reason: { field } });
  expect(pushDeflection({ ...sheet, ...change }, four, 10)).toMatchObject({ ok: false, reason: { field } });
});
