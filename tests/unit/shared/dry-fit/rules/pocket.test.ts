import { describe, expect, it } from "vitest";
import { pocket } from "#shared/dry-fit/rules/pocket.ts";
import { standardAcrylics } from "#shared/materials/standard-stock.ts";
import type { Hold } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, disc, plate, pocketHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

/** Let into the pine board of 18 mm, unless overridden. */
const inWood = (hold: Hold, thickness = 18) => {
  const sign = buildSign([buildLayer("B", [plate("p", 30, 20, [300, 200])], { hold })]);
  return { ...sign, backer: { ...sign.backer, thickness } };
};
const inAcrylic = (hold: Hold, thickness: number, process: "cast" | "extruded" = "cast") => {
  const [first] = standardAcrylics;
  if (!first) throw new Error("There is no acrylic.");
  const stock = { ...first.acrylic, process };
  return buildSign([
    buildLayer("B", [plate("base", 100, 80, [300, 200])], { thickness, stock }),
    buildLayer("C", [plate("p", 30, 20, [300, 200])], { hold }),
  ]);
};

// Common practice: a third must be left under a cut that is 0.2 too deep, in the thinnest sheet. Of 18 mm of planed wood
// 11.8 may go. Cast 6 mm (ISO 7823-1) may measure 5: 5 − 0.2 − 2 = 2.8. Extruded 6 mm (ISO 7823-2) 5.7: 3.5.
describe("the floor", () => {
  it.each([
    { what: "wood of 18", sign: inWood(pocketHold(11.8)), floor: null },
    { what: "wood of 18, a tenth deeper", sign: inWood(pocketHold(11.9)), floor: 5.9 },
    { what: "cast 6", sign: inAcrylic(pocketHold(2.8), 6), floor: null },
    { what: "cast 6, a tenth deeper", sign: inAcrylic(pocketHold(2.9), 6), floor: 1.9 },
    { what: "extruded 6", sign: inAcrylic(pocketHold(3.5), 6, "extruded"), floor: null },
    { what: "extruded 6, a tenth deeper", sign: inAcrylic(pocketHold(3.6), 6, "extruded"), floor: 1.9 },
    { what: "cast 3 cut through", sign: inAcrylic(pocketHold(3), 3), floor: -0.9 },
  ])("under a pocket in $what: $floor", async ({ sign, floor }) => {
    const findings = await findingsOf(pocket, sign);
    expect(findings.map(({ value }) => value)).toEqual(floor === null ? [] : [floor]);
    for (const finding of findings) {
      expect(finding).toMatchObject({
        rule: 19,
        severity: "stop",
        pieceIds: ["p"],
        unit: "mm",
        where: { x: 300, y: 200 },
      });
    }
  });

  it.each([
    { sign: inWood(pocketHold(15)), labels: [["Cut the pocket 11.8 mm deep"]], depth: 11.8 },
    { sign: inAcrylic(pocketHold(4, 0.1), 6), labels: [["Cut the pocket 2.8 mm deep"]], depth: 2.8 },
    { sign: inAcrylic(pocketHold(3), 3), labels: [["Cut the pocket 1.1 mm deep"]], depth: 1.1 },
  ])("$labels leaves it", async ({ sign, labels, depth }) => {
    const tried = await triedMends(pocket, sign);
    expect(tried.labels).toEqual(labels);
    expect(tried.mended[0]?.layers.at(-1)?.hold).toMatchObject({ depth });
  });

  it("of what is too thin for any pocket is the maker's to decide", async () => {
    expect((await triedMends(pocket, inAcrylic(pocketHold(1), 1.5))).labels).toEqual([[]]);
  });

  it("says when the cut can come through, and takes the shop's own share", async () => {
    const [finding] = await findingsOf(pocket, inAcrylic(pocketHold(3), 3));
    expect(finding?.text).toContain("can come through B, Layer B");
    expect(await findingsOf(pocket, inWood(pocketHold(11.8)), { limits: { pocketFloorShare: 0.5 } })).toHaveLength(1);
  });
});

// Common practice: 0.05 to 0.25 a side.
describe("the gap", () => {
  const noKerf = { pieceKerfMm: 0, pocketKerfMm: 0 };
  it.each([
    { clearance: 0.04, limits: noKerf, value: 0.04, limit: 0.05 },
    { clearance: 0.05, limits: noKerf, value: null, limit: 0 },
    { clearance: 0.25, limits: noKerf, value: null, limit: 0 },
    { clearance: 0.26, limits: noKerf, value: 0.26, limit: 0.25 },
    { clearance: 0, limits: {}, value: null, limit: 0 },
    { clearance: 0.2, limits: {}, value: 0.28, limit: 0.25 },
    { clearance: 0.1, limits: { pieceKerfMm: 0.2, pocketKerfMm: 0.15 }, value: 0.28, limit: 0.25 },
  ])("of $clearance mm drawn with kerfs of $limits: $value", async ({ clearance, limits, value, limit }) => {
    const findings = await findingsOf(pocket, inWood(pocketHold(3, clearance)), { limits });
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) expect(finding).toMatchObject({ severity: "stop", limit, unit: "mm" });
  });

  it.each([
    { clearance: 0, limits: noKerf, labels: [["Draw 0.15 mm of clearance"]] },
    { clearance: 1, limits: {}, labels: [["Draw 0.08 mm of clearance"]] },
    { clearance: 0.5, limits: { pieceKerfMm: 0.4 }, labels: [["Draw 0 mm of clearance"]] },
    { clearance: 0.5, limits: { pieceKerfMm: 0.6 }, labels: [[]] },
  ])("$clearance mm with kerfs of $limits: $labels", async ({ clearance, limits, labels }) => {
    expect((await triedMends(pocket, inWood(pocketHold(3, clearance)), { limits })).labels).toEqual(labels);
  });

  it("and the floor are two findings with a mend each", async () => {
    const { labels } = await triedMends(pocket, inWood(pocketHold(15, 1)));
    expect(labels).toEqual([["Cut the pocket 11.8 mm deep"], ["Draw 0.08 mm of clearance"]]);
  });
});

describe("a routed pocket", () => {
  const routed = (bitRadius: number, clearance = 0.1): Hold => {
    const hold = pocketHold(3, clearance);
    return hold.kind === "pocket" ? { ...hold, cut: "routed", bitRadius } : hold;
  };

  it("does not take square corners", async () => {
    const findings = await findingsOf(pocket, inWood(routed(1.5)));
    expect(findings).toMatchObject([{ severity: "stop", pieceIds: ["p"], value: 4, limit: 0 }]);
    expect(findings[0]?.text).toContain("a bit of radius 1.5 mm");
    expect((await triedMends(pocket, inWood(routed(1.5)))).labels).toEqual([[]]);
  });

  it("takes a disc, and whatever a beam cuts", async () => {
    const round = buildSign([buildLayer("B", [disc("d", 15, [300, 200])], { hold: routed(3) })]);
    expect(await findingsOf(pocket, round)).toEqual([]);
    expect(await findingsOf(pocket, inWood(routed(0)))).toEqual([]);
  });

  // The gap makes up for a corner of radius r when (√2 − 1) r is no more than √2 times the gap: 0.1 allows 0.34.
  it.each([
    { bitRadius: 0.3, count: 0 },
    { bitRadius: 0.8, count: 1 },
  ])("with a bit of radius $bitRadius and a gap of 0.175: $count", async ({ bitRadius, count }) => {
    expect(await findingsOf(pocket, inWood(routed(bitRadius)))).toHaveLength(count);
  });
});

it("a bonded layer and a pocket over nothing have none to check", async () => {
  expect(await findingsOf(pocket, buildSign([buildLayer("B", [plate("p", 30, 20, [300, 200])])]))).toEqual([]);
  const nothing = buildSign([buildLayer("B", [plate("p", 30, 20, [900, 200])], { hold: pocketHold(17, 3) })]);
  expect(await findingsOf(pocket, nothing)).toEqual([]);
});
