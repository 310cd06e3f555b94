import { describe, expect, it } from "vitest";
import { grip } from "#shared/dry-fit/rules/grip.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { CapStud } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

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
  });

  it("is found before any hole is set, without a word on the grip", async () => {
    const sign = buildSign([buildLayer("B", [plate("p", 60, 60, [300, 200])], { hold: standoffHold([]) })]);
    expect(await findingsOf(grip, sign)).toMatchObject([{ pieceIds: ["p"], value: 1 }]);
  });
});
