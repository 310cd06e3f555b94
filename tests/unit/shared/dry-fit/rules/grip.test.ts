import { describe, expect, it } from "vitest";
import { grip } from "#shared/dry-fit/rules/grip.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { CapStud, Hardware } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { dryFitOf, findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const panel = (hardware: Partial<CapStud>, thickness = 5, offset?: number) =>
  buildSign([
    buildLayer("B", [plate("panel", 200, 100, [300, 200])], {
      hold: standoffHold([hole("h", 300, 200)], buildCapStud(hardware), offset),
      thickness,
    }),
  ]);

// Cast 5 mm measures 4.1 to 5.9 (ISO 7823-1). Barrel 12: bore 9.5, stud 5 mm thick.
describe("the stud", () => {
  it.each([
    { studLength: 10.8, value: 4.9, limit: 5 },
    { studLength: 10.9, value: null, limit: null },
    { studLength: 13.6, value: null, limit: null },
    { studLength: 13.7, value: 9.6, limit: 9.5 },
    { studLength: 3, value: -2.9, limit: 5 },
  ])("of $studLength mm through 5 mm: $value against $limit", async ({ studLength, value, limit }) => {
    const findings = await findingsOf(grip, panel({ studLength }));
    expect(findings.map((finding) => [finding.value, finding.limit])).toEqual(value === null ? [] : [[value, limit]]);
    for (const finding of findings) expect(finding).toMatchObject({ rule: 8, severity: "stop", layerKey: "B" });
  });

  it("meets the head that stands on a plain floor earlier", async () => {
    // Room 9.5 − 2.06 = 7.44; 11.6 − 4.1 = 7.5.
    expect(await findingsOf(grip, panel({ studLength: 11.6, countersunk: true }))).toEqual([]);
    const [finding] = await findingsOf(grip, panel({ studLength: 11.6, countersunk: false }));
    expect(finding?.value).toBe(7.5);
    expect(finding?.text).toContain("The cap never tightens.");
  });
});

describe("the offset", () => {
  it.each([
    { offset: 12, count: 0 },
    { offset: 12.04, count: 0 },
    { offset: 12.1, count: 1 },
  ])("of $offset mm on a barrel of 12: $count", async ({ offset, count }) => {
    expect(await findingsOf(grip, panel({ studLength: 12 }, 5, offset))).toHaveLength(count);
  });

  it("that fits another barrel gets that one offered, of the same diameter", async () => {
    const [finding] = await findingsOf(grip, panel({ studLength: 12 }, 5, 18));
    expect(finding).toMatchObject({ severity: "stop", value: 18, limit: 12, where: { x: 300, y: 200 } });
    expect(finding?.text).toBe(
      "B, Layer B is drawn 18 mm off, but its barrel holds it at 12 mm, and that is where the panel comes to lie. The nearest barrel on hand is 19 mm.",
    );
    const [without] = await findingsOf(grip, panel({ studLength: 12 }, 5, 18), {
      context: { stock: { ...standardStock, hardware: [] } },
    });
    expect(without?.text).not.toContain("on hand");
  });

  it("means nothing while the barrel's own measures don't add up", async () => {
    const [finding, ...others] = await findingsOf(grip, panel({ boreDepth: 8, studLength: 11 }));
    expect(others).toEqual([]);
    expect(finding).toMatchObject({ value: 10.5, limit: 12 });
  });
});

describe("a piece without a standoff", () => {
  it("is held by nothing, and all such pieces of a layer are one finding", async () => {
    const sign = buildSign([
      buildLayer("B", [plate("held", 60, 60, [300, 200]), disc("a", 20, [100, 100]), disc("b", 20, [200, 100])], {
        hold: standoffHold([hole("h", 300, 200)], buildCapStud({ studLength: 12 })),
        thickness: 5,
      }),
    ]);
    const findings = await findingsOf(grip, sign);
    expect(findings).toMatchObject([{ severity: "stop", pieceIds: ["a", "b"], value: 2 }]);
    expect(findings[0]?.text).toContain("2 pieces of B, Layer B have no standoff: nothing holds them.");
    const { labels, mended } = await triedMends(grip, sign);
    expect(labels).toEqual([["Make them a layer, bonded with Thick cyanoacrylate"]]);
    expect(mended[0]?.layers.map(({ pieces, hold }) => [pieces.length, hold.kind])).toEqual([
      [1, "standoff"],
      [2, "bond"],
    ]);
    expect(await findingsOf(grip, mended[0] ?? sign)).toEqual([]);
    expect((await dryFitOf(mended[0] ?? sign)).filter(({ severity }) => severity === "stop")).toEqual([]);
  });

  it("is found before any hole is set, without a word on the grip", async () => {
    const sign = buildSign([buildLayer("B", [plate("p", 60, 60, [300, 200])], { hold: standoffHold([]) })]);
    expect(await findingsOf(grip, sign)).toMatchObject([{ pieceIds: ["p"], value: 1 }]);
  });
});

describe("a cap that lies on a piece bonded to the panel", () => {
  const clad = (studLength: number) =>
    buildSign([...panel({ studLength }).layers, buildLayer("C", [plate("badge", 60, 60, [300, 200])])]);

  it("leaves less of its stud in the barrel: 5.9 and 3.7 mm at their thickest", async () => {
    expect(await findingsOf(grip, clad(14.6))).toEqual([]);
    expect(await findingsOf(grip, clad(14.5))).toMatchObject([{ value: 4.9, limit: 5, holeId: "h" }]);
  });
});

it("asks for as many stud diameters as the shop does, and a pan head in a countersunk floor stands in the way", async () => {
  expect(await findingsOf(grip, panel({ studLength: 13 }), { limits: { gripDiameters: 1.4 } })).toEqual([]);
  expect(await findingsOf(grip, panel({ studLength: 13 }), { limits: { gripDiameters: 1.5 } })).toHaveLength(1);
  const screw = { ...buildCapStud().screw, head: "pan" as const };
  expect(await findingsOf(grip, panel({ studLength: 13, screw }))).toMatchObject([{ limit: expect.closeTo(7.44, 2) }]);
});

const heldBy = (hardware: Hardware, thickness: number, holes = [hole("h", 300, 200)], offset?: number) =>
  buildSign([
    buildLayer("B", [plate("panel", 200, 100, [300, 200])], {
      thickness,
      hold: standoffHold(holes, hardware, offset),
    }),
  ]);

describe("a glued stud", () => {
  it.each([
    // 4 mm thick: 8 mm of it in the wood.
    { studLength: 20, count: 0 },
    { studLength: 19.9, count: 1 },
  ])("of $studLength mm over a spacer of 12: $count", async ({ studLength, count }) => {
    const findings = await findingsOf(grip, heldBy(buildHardware("blindStud", { studLength }), 3));
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding).toMatchObject({ value: 7.9, limit: 8 });
      expect(finding.text).toContain("comes 7.9 mm into the wood");
    }
  });

  it("without a spacer is as far off as the maker says", async () => {
    const glued = buildHardware("blindStud", { barrelLength: 0, studLength: 20 });
    expect(await findingsOf(grip, heldBy(glued, 3, [hole("h", 300, 200)], 9))).toEqual([]);
    expect(await findingsOf(grip, heldBy(buildHardware("blindStud"), 3, [hole("h", 300, 200)], 9))).toMatchObject([
      { value: 9, limit: 12 },
    ]);
  });
});

it("a screw through panel and spacer holds it the washer's thickness higher", async () => {
  const hardware = buildHardware("throughScrew");
  expect(await findingsOf(grip, heldBy(hardware, 3, [hole("h", 300, 200)], 12.5))).toEqual([]);
  expect(await findingsOf(grip, heldBy(hardware, 3, [hole("h", 300, 200)], 12))).toMatchObject([{ limit: 12.5 }]);
});

// Cast 4.5 mm measures 3.65 to 5.35. The panel's left edge is at x 200, a holder reaches 8 mm.
describe("an edge grip", () => {
  const at = (x: number, slotWidth = 5.5) => heldBy(buildHardware("edgeGrip", { slotWidth }), 4.5, [hole("h", x, 200)]);

  it.each([
    { slotWidth: 5.34, value: 5.34, limit: 5.35 },
    { slotWidth: 5.35, value: null, limit: null },
    { slotWidth: 6.15, value: null, limit: null },
    { slotWidth: 6.17, value: 2.52, limit: 2.5 },
  ])("with a slot of $slotWidth: $value", async ({ slotWidth, value, limit }) => {
    const findings = await findingsOf(grip, at(197, slotWidth));
    expect(findings.map(({ value: got, limit: bound }) => [got, Number(bound?.toFixed(2))])).toEqual(
      value === null ? [] : [[value, limit]],
    );
  });

  it.each([
    { x: 197, value: null },
    { x: 195, value: null },
    { x: 194.9, value: 2.9 },
    { x: 197.5, value: null },
    { x: 197.6, value: 5.6 },
    { x: 300, value: 58 },
  ])("with its middle at $x: $value over the edge", async ({ x, value }) => {
    const findings = await findingsOf(grip, at(x));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
  });
});
