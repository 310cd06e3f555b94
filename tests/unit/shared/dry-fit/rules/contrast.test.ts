import { expect, it } from "vitest";
import { contrast } from "#shared/dry-fit/rules/contrast.ts";
import { standardAcrylics } from "#shared/materials/standard-stock.ts";
import type { Coat, MockupDocument } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const acrylic = (colour: string, look: "opaque" | "clear" | "mirror" = "opaque") => {
  const [first] = standardAcrylics;
  if (!first) throw new Error("There is no acrylic.");
  return { ...first.acrylic, name: `Sheet ${colour}`, colour, look };
};
const onPanel = (letter: string, panel: string, look: "opaque" | "clear" | "mirror" = "opaque") =>
  buildSign([
    buildLayer("B", [plate("p", 200, 100, [300, 200])], { stock: acrylic(panel) }),
    buildLayer("C", [plate("l", 20, 30, [300, 200], { reads: "H" })], { stock: acrylic(letter, look) }),
  ]);

// Ratios by WCAG's formula: #949494 on white is 3.03, #999999 2.85 (calculated).
it.each([
  { letter: "#949494", panel: "#FFFFFF", count: 0 },
  { letter: "#999999", panel: "#FFFFFF", count: 1 },
  { letter: "#000000", panel: "#FFFFFF", count: 0 },
])("$letter on $panel: $count", async ({ letter, panel, count }) => {
  const findings = await findingsOf(contrast, onPanel(letter, panel));
  expect(findings).toHaveLength(count);
  for (const finding of findings) {
    expect(finding).toMatchObject({
      rule: 25,
      severity: "caution",
      layerKey: "C",
      pieceIds: ["l"],
      limit: 3,
      unit: "to 1",
    });
    expect(finding.value).toBeCloseTo(2.85, 2);
  }
});

it("a layer that bears its stock's name is named once", async () => {
  const named = (name: string) =>
    buildSign([
      buildLayer("B", [plate("p", 200, 100, [300, 200])], { stock: acrylic("#FFFFFF") }),
      buildLayer("C", [plate("l", 20, 30, [300, 200], { reads: "H" })], { stock: acrylic("#999999"), name }),
    ]);
  const [other] = await findingsOf(contrast, named("Motto"));
  expect(other?.text).toMatch(/^The letters of C, Motto, Sheet #999999, hardly stand out/);
  const [same] = await findingsOf(contrast, named("Sheet #999999 2"));
  expect(same?.text).toMatch(/^The letters of C, Sheet #999999 2 hardly stand out/);
});

it("dark on dark may have the ratio and still lack the points", async () => {
  // LRV of #000000 is 0; of #747474 17.6 (CIE 15, calculated): ratio 4.5, points 18.
  const [finding] = await findingsOf(contrast, onPanel("#747474", "#000000"));
  expect(finding).toMatchObject({ unit: "points", limit: 30 });
  expect(finding?.value).toBeCloseTo(17.46, 0);
});

it("a stain on the board changes what its letters stand on", async () => {
  const bare = buildSign([
    buildLayer("B", [plate("l", 20, 30, [300, 200], { reads: "H" })], { stock: acrylic("#3A2A18") }),
  ]);
  expect(await findingsOf(contrast, bare)).toEqual([]);
  const coats: Coat[] = [{ kind: "stain", name: "Bog oak", colour: "#2A1E12", strength: 0.95, dryingHours: 6 }];
  const dark: MockupDocument = { ...bare, backer: { ...bare.backer, finish: coats } };
  const [finding] = await findingsOf(contrast, dark);
  expect(finding?.text).toContain("Eastern white pine with its finish");
});

it("no figure is given for what shows something else", async () => {
  expect(await findingsOf(contrast, onPanel("#C9CED2", "#FFFFFF", "mirror"))).toMatchObject([
    { severity: "remark", value: null },
  ]);
  expect(await findingsOf(contrast, onPanel("#EEF3F3", "#FFFFFF", "clear"))).toMatchObject([{ severity: "remark" }]);
});

it("what is no lettering may be tone on tone", async () => {
  const sign = buildSign([
    buildLayer("B", [plate("p", 200, 100, [300, 200])], { stock: acrylic("#FFFFFF") }),
    buildLayer("C", [plate("l", 20, 30, [300, 200])], { stock: acrylic("#FEFEFE") }),
  ]);
  expect(await findingsOf(contrast, sign)).toEqual([]);
});
