import { describe, expect, it } from "vitest";
import { bondMismatch } from "#shared/dry-fit/rules/bond-mismatch.ts";
import { standardAdhesives, standardStock } from "#shared/materials/standard-stock.ts";
import type { Adhesive, Hold, MockupDocument } from "#shared/mockup/document.ts";
import { buildLayer, buildPiece, buildSign, disc, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

function adhesive(family: Adhesive["family"]): Adhesive {
  const found = standardAdhesives.find((one) => one.family === family);
  if (!found) throw new Error(`There is no ${family}.`);
  return found;
}
const bond = (family: Adhesive["family"], tack: Adhesive | null = null): Hold => ({
  kind: "bond",
  adhesive: adhesive(family),
  tack,
});
const rigid = bond("cyanoacrylate");
const inPocket: Hold = {
  kind: "pocket",
  depth: 2,
  clearance: 0,
  adhesive: adhesive("cyanoacrylate"),
  cut: "engraved",
  bitRadius: 0,
};
/** A plate of that size on a pine board whose grain runs along x. */
const signOf = (width: number, height: number, hold: Hold = rigid, rest: Partial<MockupDocument> = {}) =>
  buildSign([buildLayer("B", [plate("p", width, height, [300, 200])], { hold })], rest);

// Inside, per mm of half the bond: along the grain 7e-5 · 20 = 0.0014; across it 0.00212 · 4 more, 0.00988. A rigid bond
// takes 0.1 mm: 20.24 mm across, 142.9 mm along.
describe("on pine", () => {
  it.each([
    { width: 20, height: 20.2, value: null },
    { width: 20, height: 20.4, value: 0.1 },
    { width: 20, height: 40, value: 0.2 },
    { width: 142, height: 10, value: null },
    { width: 144, height: 10, value: 0.1 },
  ])("a rigid bond of $width by $height mm parts by more than it takes: $value", async ({ width, height, value }) => {
    const findings = await findingsOf(bondMismatch, signOf(width, height));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 17, severity: "caution", layerKey: "B", limit: 0.1, unit: "mm" });
      expect(finding.where).toEqual({ x: 300, y: 200 });
    }
  });

  it("what counts is the way the grain runs, however the piece is turned", async () => {
    const backer = { ...signOf(20, 20).backer, grainTurn: 90 };
    expect(await findingsOf(bondMismatch, signOf(20, 100, rigid, { backer }))).toEqual([]);
    expect(await findingsOf(bondMismatch, signOf(100, 20, rigid, { backer }))).toMatchObject([{ value: 0.49 }]);
    const turned = buildPiece("t", plate("x", 100, 18, [0, 0]).path, {
      placement: { x: 300, y: 200, turn: 90, scale: 1, mirrored: false },
    });
    expect(await findingsOf(bondMismatch, buildSign([buildLayer("B", [turned], { hold: rigid })]))).toMatchObject([
      { value: 0.49 },
    ]);
  });

  it("a disc has its diameter across the grain whatever the grain's turn", async () => {
    const sign = buildSign([buildLayer("B", [disc("d", 11, [300, 200])], { hold: rigid })]);
    for (const grainTurn of [0, 37, 90, 143]) {
      const findings = await findingsOf(bondMismatch, { ...sign, backer: { ...sign.backer, grainTurn } });
      expect(findings).toMatchObject([{ value: 0.11 }]);
    }
  });

  it("outside warmth does more: 7e-5 · 40 + 0.00848 is 0.01128", async () => {
    expect(await findingsOf(bondMismatch, signOf(20, 20, rigid, {}), { context: { place: "outside" } })).toMatchObject([
      { value: 0.11 },
    ]);
  });

  it("a gap-filling adhesive takes a millimetre, or what the shop sets", async () => {
    expect(await findingsOf(bondMismatch, signOf(20, 202, bond("epoxy")))).toEqual([]);
    expect(await findingsOf(bondMismatch, signOf(20, 204, bond("epoxy")))).toMatchObject([{ value: 1.01, limit: 1 }]);
    const limits = { gapFillingBondMm: 0.5 };
    expect(await findingsOf(bondMismatch, signOf(20, 102, bond("epoxy")), { limits })).toMatchObject([{ limit: 0.5 }]);
  });

  it("a joint in two steps takes no more than the stiffer of both", async () => {
    const both = bond("epoxy", adhesive("cyanoacrylate"));
    const [finding] = await findingsOf(bondMismatch, signOf(20, 40, both));
    expect(finding).toMatchObject({ value: 0.2, limit: 0.1 });
    expect(finding?.text).toContain("Thick cyanoacrylate of B, Layer B takes 0.1 mm");
  });

  it("only what lies on the wood is bonded to it", async () => {
    const over = buildSign([buildLayer("B", [plate("p", 10, 60, [300, 385])], { hold: rigid })]);
    expect(await findingsOf(bondMismatch, over)).toMatchObject([{ value: 0.22 }]);
  });

  it("a pocket's adhesive is asked the same", async () => {
    expect(await findingsOf(bondMismatch, signOf(20, 40, inPocket))).toMatchObject([{ value: 0.2 }]);
  });
});

// Red oak moves 0.00369 a point: a slat of 12 mm by 6 · (0.0014 + 0.01476), 0.097; one of 13 mm by 0.105. The substrate's
// grain runs along the piece.
it.each([
  { slatWidth: 12, values: [] },
  { slatWidth: 13, values: [0.11] },
])("a piece on slats of $slatWidth mm parts from each of them: $values", async ({ slatWidth, values }) => {
  const plain = signOf(60, 10);
  const oak = standardStock.woods.find(({ wood }) => wood.name === "Red oak")?.wood;
  if (!oak) throw new Error("There is no red oak.");
  const slats: MockupDocument["backer"]["slats"] = {
    stock: oak,
    thickness: 9,
    pattern: "single",
    angle: 90,
    slatWidth,
    gap: 0,
    spineWidth: 10,
    spineOffset: 0,
    start: { kind: "corner" },
    direction: "up",
    overhang: 0,
  };
  const findings = await findingsOf(bondMismatch, { ...plain, backer: { ...plain.backer, slats } });
  expect(findings.map(({ value }) => value)).toEqual(values);
  for (const { text } of findings) expect(text).toContain("the Red oak under it");
});

it("acrylic on acrylic moves as one", async () => {
  const sign = buildSign([
    buildLayer("B", [plate("base", 500, 300, [300, 200])], { hold: bond("neutral silicone") }),
    buildLayer("C", [plate("p", 400, 200, [300, 200])]),
  ]);
  expect((await findingsOf(bondMismatch, sign)).map(({ layerKey }) => layerKey)).toEqual(["B"]);
});

it("pieces of one layer are one finding, by the one that parts farthest", async () => {
  const pieces = [plate("a", 10, 30, [100, 200]), plate("b", 10, 60, [200, 200]), plate("c", 10, 10, [300, 200])];
  const findings = await findingsOf(bondMismatch, buildSign([buildLayer("B", pieces, { hold: rigid })]));
  expect(findings).toMatchObject([{ pieceIds: ["a", "b"], value: 0.3, where: { x: 200, y: 200 } }]);
  expect(findings[0]?.text).toMatch(
    /^2 pieces of B, Layer B and the Eastern white pine under them part by up to 0.3 mm/,
  );
});

describe("mends", () => {
  it.each([
    { hold: rigid, height: 40, label: "Take Slow epoxy" },
    { hold: bond("cyanoacrylate", adhesive("cyanoacrylate")), height: 150, label: "Take Slow epoxy, without a tack" },
    { hold: inPocket, height: 80, label: "Take Slow epoxy" },
  ])("takes the first on hand that bonds both and gives enough", async ({ hold, height, label }) => {
    expect((await triedMends(bondMismatch, signOf(20, height, hold))).labels).toEqual([[label]]);
  });

  it("takes the shop's own, and none when nothing on hand gives enough", async () => {
    const adhesives = [adhesive("solvent cement"), adhesive("high-bond tape"), adhesive("epoxy")];
    const options = { context: { stock: { ...standardStock, adhesives } } };
    expect((await triedMends(bondMismatch, signOf(20, 40), options)).labels).toEqual([["Take High-bond tape"]]);
    expect((await triedMends(bondMismatch, signOf(20, 210))).labels).toEqual([[]]);
  });
});
