import { describe, expect, it } from "vitest";
import { z } from "zod";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { deflectionOf } from "#shared/plates/deflection.ts";
import { pushDeflection } from "#shared/plates/push.ts";
import { acrylicSheet, ownWeight, rigidityNmm, type Sheet } from "#shared/plates/rigidity.ts";
import { type Support, sag } from "#shared/plates/sag.ts";
import { checkReference } from "../support/check-reference.ts";
import { cornerPlate } from "../support/corner-plate.ts";
import { referenceCsv, referenceJson, resultOf } from "../support/reference-data.ts";

const { table, worked } = z
  .object({
    table: z.array(
      z.object({ a_over_b: z.union([z.number(), z.literal("infinity")]), alpha: z.number(), k_w: z.number() }),
    ),
    worked: z.object({
      rows: z.array(
        z.object({
          t_mm: z.number(),
          q_Pa: z.number(),
          D_Nm: z.number(),
          a_mm: z.number(),
          sag_mm_four_edges_simple: z.number(),
          sag_mm_four_corners: z.number(),
          sag_mm_standoff_grid_600: z.number(),
          sag_mm_strip_between_two_supports: z.number(),
          droop_mm_overhang_100: z.number(),
          within_small_deflection: z.record(z.string(), z.boolean()),
        }),
      ),
    }),
  })
  .parse(referenceJson("plate-deflection.json"));

/** A sheet so stiff and thick that every figure stays within the theory. */
const stiff: Sheet = { modulus: 100_000, thickness: 100, poisson: 0.3 };
function figureMm(support: Support, load: number, sheet: Sheet = stiff): number {
  const deflection = resultOf(sag(sheet, support, load));
  return deflection.kind === "figure" ? deflection.mm : Number.NaN;
}

describe("a plate on its four edges", () => {
  it.each(table)("of sides $a_over_b to 1 sags $alpha q b⁴/(E t³)", ({ a_over_b, alpha, k_w }) => {
    const ratio = a_over_b === "infinity" ? 1000 : a_over_b;
    const b = 10;
    const mm = figureMm({ kind: "edges", width: ratio * b, height: b }, 1);
    const { modulus, thickness } = stiff;
    const got = (mm * modulus * thickness ** 3) / b ** 4;
    // The table's own rounding is off the series by 0.6 % at most.
    checkReference({
      what: `plate on edges, a/b ${a_over_b}: alpha`,
      source: "Roark, 7th ed., table 11.4, case 1a",
      expected: alpha,
      got,
      within: alpha * 0.0065,
    });
    checkReference({
      what: `plate on edges, a/b ${a_over_b}: k`,
      source: "Timoshenko, Lévy's series, calculated",
      expected: k_w,
      got: (mm * rigidityNmm(stiff)) / b ** 4,
      within: k_w * 1.5e-4,
    });
  });
});

describe.each(worked.rows)("acrylic of $t_mm mm under its own weight", (row) => {
  const sheet = { ...acrylicSheet, thickness: row.t_mm };
  const load = ownWeight(row.t_mm, 1190);
  const a = row.a_mm;

  it("has the load and the stiffness of the table", () => {
    checkReference({
      what: `own weight, ${row.t_mm} mm, Pa`,
      source: "density × g × t",
      expected: row.q_Pa,
      got: load * 1e6,
      within: 5e-5,
    });
    checkReference({
      what: `rigidity, ${row.t_mm} mm, N·m`,
      source: "Timoshenko, E t³/(12 (1 − ν²))",
      expected: row.D_Nm,
      got: rigidityNmm(sheet) / 1000,
      within: 6e-5,
    });
  });

  it.each([
    { name: "sag_mm_four_edges_simple", support: { kind: "edges", width: a, height: a }, within: 6e-5 },
    // We take 0.0255 for 0.025491 at this Poisson's ratio.
    { name: "sag_mm_four_corners", support: { kind: "four points", width: a, height: a }, within: 0.006 },
    { name: "sag_mm_standoff_grid_600", support: { kind: "grid", spacing: a }, within: 6e-5 },
    { name: "sag_mm_strip_between_two_supports", support: { kind: "strip", reach: a }, within: 6e-5 },
    { name: "droop_mm_overhang_100", support: { kind: "overhang", reach: 100 }, within: 6e-6 },
  ] as const)("$name is the calculated one, or flagged", ({ name, support, within }) => {
    const deflection = resultOf(sag(sheet, support, load));
    expect(deflection.kind).toBe(row.within_small_deflection[name] ? "figure" : "beyond the theory");
    if (deflection.kind === "figure") {
      checkReference({
        what: `${row.t_mm} mm, ${name.replaceAll("_", " ")}`,
        source: "Roark and Timoshenko, calculated",
        expected: row[name],
        got: deflection.mm,
        within,
      });
    }
  });
});

it("standoffs in a square grid for 1 mm of sag stand 450, 581 and 637 mm apart for 3, 5 and 6 mm", () => {
  const pitches = [3, 5, 6].map((thickness) => {
    const sheet = { ...acrylicSheet, thickness };
    const [near, far] = [450, 800].map((spacing) => {
      const got = resultOf(sag({ ...sheet }, { kind: "grid", spacing }, ownWeight(thickness, 1190)));
      return got.kind === "figure" ? got.mm : null;
    });
    // Sag goes with the fourth power of the spacing.
    return near === null || near === undefined ? far : 450 * (1 / near) ** 0.25;
  });
  for (const [index, expected] of [450, 581, 637].entries()) {
    checkReference({
      what: `grid pitch for 1 mm, ${[3, 5, 6][index]} mm`,
      source: "Timoshenko, grid of points, calculated",
      expected,
      got: pitches[index] ?? NaN,
      within: 0.5,
    });
  }
});

// Source: calculated here by the Ritz method (W. Ritz 1909; Timoshenko, Woinowsky-Krieger, chapter 10), which shares no
// code with the factors: polynomials over the plate, held at its corners.
describe("a plate on four corner points, by the Ritz method", () => {
  it.each([
    { poisson: 0.3, factor: 0.0255 },
    { poisson: 0.37, factor: 0.0255 },
  ])("sags $factor q a⁴/D at ν $poisson under an even load", ({ poisson, factor }) => {
    const got = cornerPlate({ ratio: 1, poisson, load: "even" });
    checkReference({
      what: `four points, even load, ν ${poisson}`,
      source: "Ritz method",
      expected: got,
      got: factor,
      within: 2e-5,
    });
    const mm = figureMm({ kind: "four points", width: 100, height: 100 }, 0.01, { ...stiff, poisson });
    expect((mm * rigidityNmm({ ...stiff, poisson })) / (0.01 * 100 ** 4)).toBeCloseTo(factor, 9);
  });

  it("gives way 0.0391 P a²/D at ν 0.3 when it is pushed in the middle, and no more at 0.37", () => {
    const sheet = { ...stiff, poisson: 0.3 };
    const push = resultOf(pushDeflection(sheet, { width: 100, height: 100 }, 100));
    const got = push.kind === "figure" ? (push.mm * rigidityNmm(sheet)) / (100 * 100 ** 2) : Number.NaN;
    const expected = cornerPlate({ ratio: 1, poisson: 0.3, load: "middle" });
    checkReference({ what: "four points, push in the middle", source: "Ritz method", expected, got, within: 2e-4 });
    expect(cornerPlate({ ratio: 1, poisson: 0.37, load: "middle" })).toBeLessThanOrEqual(0.0391);
  });

  it.each([1.25, 1.5, 2, 3])("gives way no more than stated at a/b %f, even load and push", (ratio) => {
    expect(cornerPlate({ ratio, poisson: 0.37, load: "even" })).toBeLessThanOrEqual(0.0255);
    expect(cornerPlate({ ratio, poisson: 0.37, load: "middle" })).toBeLessThanOrEqual(Math.max(0.0391, 0.0242 * ratio));
  });
});

// ISO 527 and ASTM D696 as in the data pages of the table: 2.8 to 3.3 GPa, 70e-6 per K.
it("acrylic is as stiff and grows as much as the table of sheets says", () => {
  const row = referenceCsv("sheet-materials.csv").find(({ material }) => material === "acrylic (PMMA) cast sheet");
  const [least = 0, most = 0] = (row?.E_GPa ?? "").split("-").map(Number);
  expect(acrylicSheet.modulus / 1000).toBeGreaterThanOrEqual(least);
  expect(acrylicSheet.modulus / 1000).toBeLessThanOrEqual(most);
  const expected = Number.parseFloat(row?.["CTE_1e-6_per_K"] ?? "");
  const got = defaultLimits.expansionPerK * 1e6;
  checkReference({ what: "expansion of cast acrylic, 1e-6/K", source: "ASTM D696", expected, got, within: 1e-9 });
});

it("a push on a long strip is that on a beam: P a³/(48 E I)", () => {
  const sheet = { ...acrylicSheet, thickness: 100 };
  const push = resultOf(pushDeflection(sheet, { width: 2000, height: 100 }, 50));
  const inertia = (100 * 100 ** 3) / 12;
  const expected = (50 * 2000 ** 3) / (48 * acrylicSheet.modulus * inertia);
  checkReference({
    what: "push on a strip, 20 to 1, mm",
    source: "beam theory",
    expected,
    got: push.kind === "figure" ? push.mm : NaN,
    within: expected * 0.005,
  });
});

it("a figure ends at half the sheet's thickness", () => {
  expect(deflectionOf(1.5, 3, false)).toEqual({ kind: "figure", mm: 1.5, upperEstimate: false });
  expect(deflectionOf(1.51, 3, false)).toEqual({ kind: "beyond the theory", overMm: 1.5 });
});
