import { describe, expect, it } from "vitest";
import { z } from "zod";
import { allowableLateralN, screwLateral } from "#shared/hardware/lateral.ts";
import { nearestDrillMm, pilotHoleMm } from "#shared/hardware/pilot-hole.ts";
import { allowableWithdrawalN, isWithdrawalSize, screwWithdrawalN } from "#shared/hardware/withdrawal.ts";
import { seasonalMovementMm } from "#shared/materials/seasonal-movement.ts";
import { woodMovementOf, woodMovements } from "#shared/materials/wood-movement.ts";
import { rootDiameterMm } from "#shared/materials/wood-screw-threads.ts";
import { inchesToMm } from "#shared/units/length.ts";
import { checkReference } from "../support/check-reference.ts";
import { referenceCsv, referenceJson, resultOf } from "../support/reference-data.ts";

const worked = z
  .object({
    dimensional_change: z.array(
      z.object({
        case: z.string(),
        C: z.number(),
        D_mm: z.number(),
        M0: z.number(),
        M1: z.number(),
        delta_mm: z.number(),
      }),
    ),
    screw_withdrawal_ultimate: z.object({
      cases: z.array(
        z.object({
          gauge: z.number(),
          D_in: z.number(),
          species: z.string(),
          G: z.number(),
          L_in: z.number(),
          p_N: z.number(),
        }),
      ),
    }),
    screw_withdrawal_allowable_NDS: z.object({
      cases: z.array(z.object({ G: z.number(), D_in: z.number(), W_lb_per_in: z.number() })),
    }),
    screw_lateral_pre1991: z.object({
      K_screws: z.array(z.object({ class: z.enum(["hardwood", "softwood"]), G: z.string(), SI: z.number() })),
      cases: z.array(z.object({ K: z.number(), D_mm: z.number(), p_N: z.number() })),
    }),
  })
  .parse(referenceJson("wood-worked.json"));

describe("movement of wood", () => {
  const source = "Wood Handbook GTR-190, eq. 13-2 and p. 13-17";
  // The first case is the handbook's own (233.7 mm at the end), the others are its formula, calculated.
  it.each(worked.dimensional_change)("$case: $delta_mm mm", ({ case: what, C, D_mm, M0, M1, delta_mm }) => {
    const change = { dimension: D_mm, perPoint: C, from: M0, to: M1, grainAngle: 90 };
    checkReference({ what, source, expected: delta_mm, got: resultOf(seasonalMovementMm(change)), within: 5e-5 });
  });

  it("the handbook's board of 232 mm ends at 233.7 mm, as printed", () => {
    const { tangential = Number.NaN } = woodMovementOf("white fir") ?? {};
    const moved = resultOf(
      seasonalMovementMm({ dimension: 232, perPoint: tangential, from: 8, to: 11, grainAngle: 90 }),
    );
    checkReference({ what: "white fir board, 8 to 11 %", source, expected: 233.7, got: 232 + moved, within: 0.05 });
  });

  // Table 13-5; species without coefficients in the handbook are in no row of ours.
  const rows = referenceCsv("fpl-shrinkage.csv").filter((row) => row.C_T !== "");
  it("the table has all 18 species that the handbook gives coefficients for", () => {
    expect(woodMovements.map(({ species }) => species)).toEqual(rows.map((row) => row.species));
    expect(rows).toHaveLength(18);
  });

  it.each(rows)("$species moves $C_R and $C_T", ({ species = "", C_R, C_T }) => {
    const wood = woodMovementOf(species);
    const table = "Wood Handbook GTR-190, table 13-5";
    checkReference({
      what: `C radial, ${species}`,
      source: table,
      expected: Number(C_R),
      got: wood?.radial ?? NaN,
      within: 0,
    });
    checkReference({
      what: `C tangential, ${species}`,
      source: table,
      expected: Number(C_T),
      got: wood?.tangential ?? NaN,
      within: 0,
    });
  });

  // Table 4-3: C = (S/3000)/(1 − S/150), which the handbook's pairs of values follow to their last digit.
  it.each(rows.filter((row) => row.tangential_percent !== ""))("$species agrees with its shrinkage", (row) => {
    const identity = (percent: number) => percent / 3000 / (1 - percent / 150);
    const wood = woodMovementOf(row.species ?? "");
    expect(wood?.tangential).toBeCloseTo(identity(Number(row.tangential_percent)), 5);
    expect(wood?.radial).toBeCloseTo(identity(Number(row.radial_percent)), 5);
  });
});

describe("screws in withdrawal", () => {
  it.each(worked.screw_withdrawal_ultimate.cases)("No. $gauge in $species, $L_in in deep: $p_N N", (row) => {
    const screw = { gravity: row.G, diameter: inchesToMm(row.D_in), threadInWood: inchesToMm(row.L_in) };
    checkReference({
      what: `withdrawal of No. ${row.gauge}, ${row.species}`,
      source: "Wood Handbook GTR-190, eq. 8-10",
      expected: row.p_N,
      got: resultOf(screwWithdrawalN(screw)),
      // 108.25 is 108.2477 rounded.
      within: row.p_N * 3e-5,
    });
  });

  // 2850 G² D lb per inch: 109 lb printed for G 0.45 and No. 10. The handbook's formula over 5.5 comes within half a percent.
  it.each(worked.screw_withdrawal_allowable_NDS.cases)(
    "G $G, $D_in in: $W_lb_per_in lb an inch may be put on",
    (row) => {
      const screw = { gravity: row.G, diameter: inchesToMm(row.D_in), threadInWood: 25.4 };
      const expected = row.W_lb_per_in * 4.4482216152605;
      checkReference({
        what: "allowable withdrawal of No. 10, G 0.45, 1 in",
        source: "National Design Specification, 2850 G² D",
        expected,
        got: resultOf(allowableWithdrawalN(screw)),
        within: expected * 0.005,
      });
    },
  );

  // Wood Handbook, chapter 8, size limits of the formula; from memory.
  it.each([
    { gauge: 6, length: inchesToMm(0.5), known: true },
    { gauge: 7, length: inchesToMm(0.5), known: false },
    { gauge: 11, length: inchesToMm(0.75), known: true },
    { gauge: 12, length: inchesToMm(0.75), known: false },
    { gauge: 2, length: inchesToMm(1), known: false },
    { gauge: 12, length: inchesToMm(3), known: true },
    { gauge: 6, length: 12, known: true },
    { gauge: 6, length: 16, known: true },
    { gauge: 8, length: 16, known: false },
    { gauge: 6, length: 10, known: false },
    { gauge: 12, length: 80, known: false },
    { gauge: 6, length: Number.NaN, known: false },
  ])("No. $gauge of $length mm is a size of the formula: $known", ({ gauge, length, known }) => {
    expect(isWithdrawalSize(gauge, length)).toBe(known);
  });
});

describe("screws across", () => {
  const source = "Wood Handbook before 1991, table 8-4 (from memory)";
  it.each(worked.screw_lateral_pre1991.K_screws)("$class of G $G has K $SI", ({ class: hardness, G, SI }) => {
    const [from = 0, to = 0] = G.split("-").map(Number);
    for (const gravity of [from, to]) {
      const got = resultOf(screwLateral({ gravity, hardness, diameter: 1, penetration: 7 })).loadN;
      checkReference({ what: `K of ${hardness}, G ${gravity}`, source, expected: SI, got, within: 0 });
    }
  });

  it.each(worked.screw_lateral_pre1991.cases)("K $K and $D_mm mm carry $p_N N", ({ K, D_mm, p_N }) => {
    const wood =
      K > 40 ? { gravity: 0.63, hardness: "hardwood" as const } : { gravity: 0.35, hardness: "softwood" as const };
    const got = resultOf(screwLateral({ ...wood, diameter: D_mm, penetration: 7 * D_mm })).loadN;
    checkReference({ what: `lateral load of No. 8, G ${wood.gravity}`, source, expected: p_N, got, within: 0.005 });
    expect(resultOf(allowableLateralN({ ...wood, diameter: D_mm, penetration: 7 * D_mm }))).toBeCloseTo(p_N / 2, 2);
  });
});

describe("pilot holes", () => {
  const rows = referenceCsv("wood-screws-asme.csv").filter((row) => row.root_NDS_in !== "");
  // 70 and 90 % of the root diameter: Wood Handbook, chapter 8; root diameters from memory.
  it.each(rows)(
    "No. $gauge asks for $lead_70pct_in and $lead_90pct_in in",
    ({ gauge, lead_70pct_in, lead_90pct_in }) => {
      const root = rootDiameterMm(Number(gauge)) ?? NaN;
      const source = "Wood Handbook, chapter 8; NDS, table L3";
      const soft = resultOf(pilotHoleMm(root, "softwood"));
      const hard = resultOf(pilotHoleMm(root, "hardwood"));
      checkReference({
        what: `pilot hole No. ${gauge}, softwood, in`,
        source,
        expected: Number(lead_70pct_in),
        got: soft / 25.4,
        within: 5.1e-5,
      });
      checkReference({
        what: `pilot hole No. ${gauge}, hardwood, in`,
        source,
        expected: Number(lead_90pct_in),
        got: hard / 25.4,
        within: 5.1e-5,
      });
    },
  );

  // Shop charts are common practice and differ by up to 1/32 in among each other.
  it.each(rows.filter((row) => row.shop_pilot_softwood_in !== ""))(
    "a drill for No. $gauge lies within 1/64 in of the shop's chart",
    (row) => {
      const inches = (fraction = "") => Number(fraction.split("/")[0]) / Number(fraction.split("/")[1]);
      const drill = (hardness: "softwood" | "hardwood") =>
        resultOf(nearestDrillMm(resultOf(pilotHoleMm(rootDiameterMm(Number(row.gauge)) ?? NaN, hardness)), "in")) /
        25.4;
      expect(Math.abs(drill("softwood") - inches(row.shop_pilot_softwood_in))).toBeLessThanOrEqual(1 / 64 + 1e-12);
      expect(Math.abs(drill("hardwood") - inches(row.shop_pilot_hardwood_in))).toBeLessThanOrEqual(1 / 64 + 1e-12);
    },
  );
});
