import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { accessibleCheck } from "#shared/legibility/accessible-check.ts";
import { lettersForDistance, readingDistance, readingEase } from "#shared/legibility/reading-distance.ts";
import { strokeToHeight } from "#shared/legibility/stroke-to-height.ts";
import { visualCharacterHeightMm } from "#shared/legibility/visual-height.ts";
import { resultOf } from "../../../support/reference-data.ts";

describe("reading distance", () => {
  it.each([
    { height: 100, distance: 12_000, ease: "with ease" },
    { height: 100, distance: 12_001, ease: "at a pinch" },
    { height: 100, distance: 36_000, ease: "at a pinch" },
    { height: 100, distance: 36_001, ease: "not at all" },
  ])("$height mm from $distance mm read $ease", ({ height, distance, ease }) => {
    expect(resultOf(readingEase(height, distance))).toBe(ease);
  });

  it("and the height for it are each other's inverse", () => {
    fc.assert(
      fc.property(fc.double({ min: 100, max: 1_000_000, noNaN: true }), (distance) => {
        const letters = resultOf(lettersForDistance(distance));
        expect(resultOf(readingDistance(letters.easeMm)).easeMm).toBeCloseTo(distance, 4);
        expect(resultOf(readingDistance(letters.limitMm)).limitMm).toBeCloseTo(distance, 4);
        expect(resultOf(readingEase(letters.easeMm, distance))).toBe("with ease");
        expect(resultOf(readingEase(letters.limitMm, distance))).toBe("at a pinch");
      }),
    );
  });
});

describe("visual characters", () => {
  it("never get smaller with distance or a higher baseline", () => {
    const baseline = fc.double({ min: 1016, max: 20_000, noNaN: true });
    const distance = fc.double({ min: 1, max: 100_000, noNaN: true });
    fc.assert(
      fc.property(baseline, distance, fc.double({ min: 0, max: 10_000, noNaN: true }), (at, from, more) => {
        const height = resultOf(visualCharacterHeightMm(at, from));
        expect(resultOf(visualCharacterHeightMm(at, from + (more % (1_000_000 - from))))).toBeGreaterThanOrEqual(
          height,
        );
        expect(height).toBeGreaterThanOrEqual(15.875 - 1e-9);
      }),
    );
  });

  it.each([
    { baseline: 0, distance: 1000, field: "baseline" },
    { baseline: 1500, distance: 0, field: "distance" },
    { baseline: 1500, distance: Number.NaN, field: "distance" },
  ])("$baseline mm from $distance mm are refused for $field", ({ baseline, distance, field }) => {
    expect(visualCharacterHeightMm(baseline, distance)).toMatchObject({ ok: false, reason: { field } });
  });
});

describe("a stroke over its height", () => {
  it("is a share, whatever the size", () => {
    expect(resultOf(strokeToHeight(6, 40))).toBeCloseTo(0.15, 12);
    expect(strokeToHeight(6, 0)).toMatchObject({ ok: false, reason: { field: "height" } });
    expect(strokeToHeight(-1, 40)).toMatchObject({ ok: false, reason: { field: "stroke" } });
  });
});

describe("measured values beside the limits", () => {
  it("leave out what is no number, and keep the order of the clauses", () => {
    const results = accessibleCheck({ "visual stroke": 0.2, "raised depth": 0.8, "raised gap": Number.NaN });
    expect(results.map(({ limit, verdict }) => [limit.id, verdict])).toEqual([
      ["raised depth", "within"],
      ["visual stroke", "within"],
    ]);
  });

  it("say on which side a value lies", () => {
    expect(accessibleCheck({ "visual gap": 0.09 })[0]?.verdict).toBe("too small");
    expect(accessibleCheck({ "visual gap": 0.36 })[0]?.verdict).toBe("too large");
    expect(accessibleCheck({ "raised gap": 9 }, 2)[0]).toMatchObject({ verdict: "too large", limit: { most: 8 } });
    expect(accessibleCheck({ "raised gap": 9 })[0]).toMatchObject({ verdict: "within", limit: { most: null } });
    expect(accessibleCheck({ "raised gap": 9 }, Number.NaN)[0]).toMatchObject({ verdict: "within" });
  });
});
