import { describe, expect, it } from "vitest";
import { penumbraMm, shadowDirection, shadowOffsetMm } from "#shared/drawing/light.ts";
import reference from "../fixtures/reference/shadow-penumbra.json" with { type: "json" };
import { checkReference } from "../support/check-reference.ts";

/** Source, as the file says: geometrical optics, similar triangles. Cases are for light that meets the wall head-on. */
const discs = reference.cases.flatMap(({ s_mm, d_mm, g_mm, penumbra_mm }) =>
  s_mm === undefined || d_mm === undefined ? [] : [{ s_mm, d_mm, g_mm, penumbra_mm }],
);

describe("the half-shadow of a disc source, p = s g / d", () => {
  it("has five cases in the file", () => {
    expect(discs).toHaveLength(5);
  });

  it.each(discs)(
    "source $s_mm at $d_mm, edge $g_mm before the wall: $penumbra_mm mm",
    ({ s_mm, d_mm, g_mm, penumbra_mm }) => {
      const light = { azimuth: 30, elevation: 90, angularSize: s_mm / d_mm };
      const got = penumbraMm(g_mm, light).along;
      const what = `half-shadow of ${s_mm} mm at ${d_mm}, ${g_mm} mm off`;
      checkReference({ what, source: "similar triangles", expected: penumbra_mm, got, within: 5e-7 });
      expect(penumbraMm(g_mm, light).across).toBeCloseTo(penumbra_mm, 6);
    },
  );

  it("of the sun, 0.533 degrees wide, 10 mm before the wall: 0.093 mm", () => {
    const light = { azimuth: 0, elevation: 90, angularSize: (0.533 * Math.PI) / 180 };
    expect(penumbraMm(10, light).along).toBeCloseTo(0.093, 3);
  });
});

describe("the offset of a shadow, g tan θ with θ from head-on", () => {
  it.each(reference.offset)(
    "θ $theta_deg°, edge $g_mm before the wall: $offset_mm mm",
    ({ theta_deg, g_mm, offset_mm }) => {
      const got = shadowOffsetMm(g_mm, { azimuth: 0, elevation: 90 - theta_deg, angularSize: 0 });
      const what = `shadow at ${theta_deg}°, ${g_mm} mm off`;
      checkReference({ what, source: "similar triangles", expected: offset_mm, got, within: 5e-5 });
    },
  );
});

/** Calculated: the rays from both rims of a small source, at ε ± σ/2, meet the wall h / tan ε apart by h σ / sin² ε. */
describe("slanting light", () => {
  it.each([
    { elevation: 30, size: 0.01 },
    { elevation: 45, size: 0.02 },
    { elevation: 70, size: 0.02 },
  ])("at $elevation° spreads as its two outer rays do", ({ elevation, size }) => {
    const radians = (elevation * Math.PI) / 180;
    const rays = 20 / Math.tan(radians - size / 2) - 20 / Math.tan(radians + size / 2);
    expect(penumbraMm(20, { azimuth: 0, elevation, angularSize: size }).along).toBeCloseTo(rays, 2);
  });

  it.each([
    { azimuth: 0, x: 0, y: 1 },
    { azimuth: 90, x: -1, y: 0 },
    { azimuth: 180, x: 0, y: -1 },
    { azimuth: 270, x: 1, y: 0 },
  ])("from $azimuth° falls towards ($x, $y)", ({ azimuth, x, y }) => {
    const fall = shadowDirection({ azimuth, elevation: 45, angularSize: 0 });
    expect(fall.x).toBeCloseTo(x, 12);
    expect(fall.y).toBeCloseTo(y, 12);
  });
});
