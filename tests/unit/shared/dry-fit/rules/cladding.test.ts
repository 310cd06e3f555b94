import { describe, expect, it } from "vitest";
import { cladding } from "#shared/dry-fit/rules/cladding.ts";
import type { Wood } from "#shared/mockup/document.ts";
import { buildSign } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { buildSlatSign, oak } from "../../../../support/slat-sign.ts";

/** Slats across, on a substrate that does not move unless it is said to. */
const sign = (substrate: Partial<Wood> = { movementPerPoint: 0 }, slats: object = {}, grainTurn = 0) => {
  const one = buildSlatSign({ stock: { ...oak, movementPerPoint: 0.003, moisturePercent: 8 }, ...slats });
  return { ...one, backer: { ...one.backer, grainTurn, stock: { ...one.backer.stock, ...substrate } } };
};

// D · C · ΔM · sin²β over the height of 400, from 8 to 12 %: 400 · 0.003 · 4 = 4.8 mm.
describe("slats on one side", () => {
  it("are told with what they want to move more than the substrate", async () => {
    const [finding, second] = await findingsOf(cladding, sign());
    expect(second).toBeUndefined();
    expect(finding).toMatchObject({ rule: 35, severity: "remark", value: 4.8, unit: "mm" });
    // A slat of 40 across its grain: 0.48.
    expect(finding?.text).toContain("From 8 % to 12 % moisture a slat moves 0.48 mm across its width");
    expect(finding?.text).toContain("over the height slats and substrate want to part by 4.8 mm");
    expect(finding?.text).toContain("the back hollow");
  });

  it("are told less where the substrate moves with them", async () => {
    // Its grain along the slats: 400 · (0.003 − 0.002) · 4.
    expect(await findingsOf(cladding, sign({ movementPerPoint: 0.002 }))).toMatchObject([{ value: 1.6 }]);
    // Its grain square to them: over the width it alone moves, 600 · 0.002 · 4.
    expect(await findingsOf(cladding, sign({ movementPerPoint: 0.002 }, {}, 90))).toMatchObject([{ value: 4.8 }]);
    expect(await findingsOf(cladding, sign({ movementPerPoint: 0.003 }))).toEqual([]);
  });

  it("keep to the handbook's 6 to 14 %", async () => {
    const damp = { stock: { ...oak, movementPerPoint: 0.003, moisturePercent: 13 } };
    // Four points down from 13, since up are only 14.
    const [finding] = await findingsOf(cladding, sign({ movementPerPoint: 0 }, damp));
    expect(finding?.value).toBe(4.8);
    expect(finding?.text).toContain("From 13 % to 9 % moisture");
    expect(finding?.text).toContain("the front hollow");
  });

  it("keep to how far the shop lets moisture go", async () => {
    expect(await findingsOf(cladding, sign(), { limits: { moisturePoints: 2 } })).toMatchObject([{ value: 2.4 }]);
    expect(await findingsOf(cladding, sign(), { limits: { moisturePoints: 0 } })).toEqual([]);
  });

  it("are no matter on a plank", async () => {
    expect(await findingsOf(cladding, buildSign([]))).toEqual([]);
  });
});
