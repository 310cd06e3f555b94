import { describe, expect, it } from "vitest";
import { stockOnHand } from "#shared/dry-fit/rules/stock-on-hand.ts";
import { standardAcrylics, standardStandoffs, standardStock } from "#shared/materials/standard-stock.ts";
import type { SheetsOnHand, Stock } from "#shared/materials/stock.ts";
import type { Acrylic, MockupDocument } from "#shared/mockup/document.ts";
import { buildCapStud, buildLayer, buildSign, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

function sheet(name: string, rest: Partial<Acrylic> = {}): Acrylic {
  const found = standardAcrylics.find(({ acrylic }) => acrylic.name === name);
  if (!found) throw new Error(`There is no ${name}.`);
  return { ...found.acrylic, ...rest };
}
const signOf = (stock: Acrylic, thickness = 3, quantity = 1) =>
  buildSign([buildLayer("B", [plate("p", 200, 100, [300, 200])], { stock, thickness })], { quantity });
const withStock = (stock: Partial<Stock>) => ({ context: { stock: { ...standardStock, ...stock } } });

it("what is in stock in its thickness is found, by name or by its id", async () => {
  expect(await findingsOf(stockOnHand, signOf(sheet("Midnight"), 4.5))).toEqual([]);
  const stockId = "0d9a1b54-7f3e-4f1c-8a61-2f1f4a0c9b11";
  const renamed = [{ acrylic: sheet("Midnight", { stockId, name: "Dusk" }), thicknessesMm: [3], sheets: [] }];
  const options = withStock({ acrylics: renamed });
  expect(await findingsOf(stockOnHand, signOf(sheet("Midnight", { stockId })), options)).toEqual([]);
  expect(await findingsOf(stockOnHand, signOf(sheet("Midnight")), options)).toHaveLength(1);
});

describe("a thickness", () => {
  it.each([
    { thickness: 3.04, count: 0 },
    { thickness: 3.06, count: 1 },
    { thickness: 5, count: 1 },
  ])("of $thickness mm, where 3, 4.5 and 6 are there: $count", async ({ thickness, count }) => {
    const findings = await findingsOf(stockOnHand, signOf(sheet("Midnight"), thickness));
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 22, severity: "caution", layerKey: "B", pieceIds: ["p"], unit: "mm" });
      expect(finding.text).toContain("it is there in 3 mm, 4.5 mm, 6 mm.");
    }
  });

  it("is mended with the nearest of the sheet, or another sheet of that thickness", async () => {
    const { labels } = await triedMends(stockOnHand, signOf(sheet("Rose"), 6));
    expect(labels[0]?.[0]).toBe("Take it in 4.5 mm");
    expect(labels[0]?.[1]).toMatch(/^Take \w+ in 6 mm$/);
  });
});

describe("a sheet that is not in the list", () => {
  it("is one caution a layer, with what comes nearest", async () => {
    const findings = await findingsOf(stockOnHand, signOf(sheet("Rust", { name: "Ember", colour: "#B4533C" })));
    expect(findings).toMatchObject([{ severity: "caution", layerKey: "B", value: null }]);
    expect(findings[0]?.text).toContain("Ember of B, Layer B is not in the stock list. Rust in 3 mm comes nearest");
    // The sheet's lettering has no Greek: a delta would be an empty box on the client's proof.
    expect(findings[0]?.text).not.toMatch(/\p{Script=Greek}/u);
  });

  it.each([
    { stock: sheet("Rust", { name: "Ember", colour: "#B4533C" }), thickness: 3, labels: [["Take Rust in 3 mm"]] },
    { stock: sheet("Rust", { name: "Ember", colour: "#B4533C" }), thickness: 8, labels: [["Take Rust in 6 mm"]] },
    { stock: sheet("Clear", { name: "Glass", colour: "#101010" }), thickness: 10, labels: [["Take Clear in 10 mm"]] },
  ])("is mended with the nearest that looks alike: $labels", async ({ stock, thickness, labels }) => {
    expect((await triedMends(stockOnHand, signOf(stock, thickness))).labels).toEqual(labels);
  });

  it("has no mend where nothing looks alike", async () => {
    const acrylics = standardAcrylics.filter(({ acrylic }) => acrylic.look === "opaque");
    const { labels } = await triedMends(stockOnHand, signOf(sheet("Frost")), withStock({ acrylics }));
    expect(labels).toEqual([[]]);
  });
});

// A plate of 200 by 100 mm covers 70 % of what it takes: 0.0286 m² each.
describe("sheets on hand", () => {
  const counted = (sheets: SheetsOnHand[]) =>
    withStock({ acrylics: [{ acrylic: sheet("Midnight"), thicknessesMm: [3, 4.5], sheets }] });
  const one = (quantity: number | null, thicknessMm = 3): SheetsOnHand => ({
    thicknessMm,
    widthMm: 400,
    heightMm: 300,
    quantity,
  });

  it.each([
    { quantity: 4, count: 0 },
    { quantity: 5, count: 1 },
  ])("one sheet of 0.12 m² for $quantity signs: $count", async ({ quantity, count }) => {
    const findings = await findingsOf(stockOnHand, signOf(sheet("Midnight"), 3, quantity), counted([one(1)]));
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding).toMatchObject({ severity: "caution", layerKey: "B", value: 0.14, limit: 0.12, unit: "m²" });
      expect(finding.text).toContain(
        "5 signs take about 0.14 m² of Midnight, 3 mm, for B, waste included; 0.12 m² are on hand in 1 sheet.",
      );
    }
  });

  it("are told in square feet where lengths are in inches: 0.12 m² are 1.3 ft²", async () => {
    const { stock } = counted([one(1)]).context;
    const [finding] = await findingsOf(stockOnHand, signOf(sheet("Midnight"), 3, 5), {
      context: { stock, unit: "in" },
    });
    expect(finding?.text).toContain("about 1.5 ft² of Midnight, 0.118″");
    expect(finding?.text).toContain("1.3 ft² are on hand");
  });

  it("say nothing until all of that thickness are counted", async () => {
    const sign = signOf(sheet("Midnight"), 3, 100);
    expect(await findingsOf(stockOnHand, sign, counted([]))).toEqual([]);
    expect(await findingsOf(stockOnHand, sign, counted([one(1), one(null)]))).toEqual([]);
    expect(await findingsOf(stockOnHand, sign, counted([one(0, 4.5)]))).toEqual([]);
  });

  it("serve all layers that are cut from them", async () => {
    const layers = ["B", "C", "D"].map((key, index) =>
      buildLayer(key, [plate(`p${key}`, 200, 100, [300, 60 + 120 * index])], { stock: sheet("Midnight") }),
    );
    const findings = await findingsOf(stockOnHand, buildSign(layers, { quantity: 2 }), counted([one(1)]));
    expect(findings).toMatchObject([{ layerKey: null, value: 0.17, limit: 0.12 }]);
    expect(findings[0]?.text).toContain("for B, C, D,");
  });
});

describe("hardware", () => {
  const barrel = buildCapStud();
  const held = (quantity: number) =>
    buildSign(
      [
        buildLayer("B", [plate("p", 200, 100, [300, 200])], {
          hold: standoffHold([hole("h1", 220, 200), hole("h2", 380, 200)], barrel),
        }),
      ],
      { quantity },
    );
  const onHand = (quantity: number | null, name = barrel.name) =>
    withStock({ hardware: [{ hardware: { ...barrel, name }, quantity }] });

  it.each([
    { onHand: 6, count: 0 },
    { onHand: 5, count: 1 },
    { onHand: null, count: 0 },
  ])("6 for three signs, $onHand on hand: $count", async ({ onHand: there, count }) => {
    const findings = await findingsOf(stockOnHand, held(3), onHand(there));
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding).toMatchObject({ value: 6, limit: 5, where: { x: 220, y: 200 } });
  });

  it("that is not in the list is missing; an empty list says nothing; no press mends it", async () => {
    const findings = await findingsOf(stockOnHand, held(1), onHand(9, "Another"));
    expect(findings).toMatchObject([{ value: 2, limit: 0 }]);
    expect((await triedMends(stockOnHand, held(1), onHand(9, "Another"))).labels).toEqual([[]]);
    expect(await findingsOf(stockOnHand, held(1), withStock({ hardware: [] }))).toEqual([]);
    expect(standardStandoffs).toContainEqual(barrel);
  });
});

// A board is planed to its thickness from a thicker one.
it.each([
  { thickness: 20, count: 0 },
  { thickness: 25, count: 0 },
  { thickness: 26, count: 1 },
])("pine of $thickness mm, where 25 is the thickest: $count", async ({ thickness, count }) => {
  const sign = buildSign([]);
  const findings = await findingsOf(stockOnHand, { ...sign, backer: { ...sign.backer, thickness } });
  expect(findings.map(({ value, limit }) => [value, limit])).toEqual(count === 0 ? [] : [[26, 25]]);
});

it("slats and frame are asked for too, a frame by its thinner side", async () => {
  const sign = buildSign([]);
  const oak = standardStock.woods.find(({ wood }) => wood.name === "Red oak")?.wood;
  if (!oak) throw new Error("There is no red oak.");
  const slats: MockupDocument["backer"]["slats"] = {
    stock: { ...oak, name: "Bog oak" },
    thickness: 9,
    pattern: "single",
    angle: 90,
    slatWidth: 40,
    gap: 0,
    spineWidth: 10,
    spineOffset: 0,
    start: { kind: "corner" },
    direction: "up",
    overhang: 0,
  };
  const frame = (width: number, depth: number) => ({ stock: oak, width, depth, mitred: true });
  const withSlats = { ...sign, backer: { ...sign.backer, slats }, frame: frame(60, 25) };
  expect((await findingsOf(stockOnHand, withSlats)).map(({ text }) => text)).toEqual([
    "Bog oak of the slats is not in the stock list.",
  ]);
  expect(await findingsOf(stockOnHand, { ...sign, frame: frame(26, 60) })).toMatchObject([{ value: 26, limit: 25 }]);
});

it("wood that is not in the list is missing", async () => {
  const sign = buildSign([]);
  const backer = { ...sign.backer, stock: { ...sign.backer.stock, name: "Bog oak" } };
  const findings = await findingsOf(stockOnHand, { ...sign, backer });
  expect(findings).toMatchObject([
    { rule: 22, severity: "caution", text: "Bog oak of the backer is not in the stock list." },
  ]);
});
