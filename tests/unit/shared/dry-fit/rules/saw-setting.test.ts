import { describe, expect, it } from "vitest";
import { sawSetting } from "#shared/dry-fit/rules/saw-setting.ts";
import { polygonRing } from "#shared/geometry/shapes.ts";
import { boardSchema, type Slats } from "#shared/mockup/document.ts";
import { buildSign } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { buildFrame, buildSlatSign } from "../../../../support/slat-sign.ts";

const chevron = (rest: Partial<Slats>) => buildSlatSign({ pattern: "spine", overhang: 25, ...rest });

// Off a square cut: 90 − angle at the spine.
describe("slats at a spine", () => {
  it.each([
    { angle: 45, value: null },
    { angle: 40, value: null },
    { angle: 39.9, value: 50.1 },
    { angle: 30, value: 60 },
  ])("at $angle degrees: $value", async ({ angle, value }) => {
    const findings = await findingsOf(sawSetting, chevron({ angle }));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 33, severity: "stop", limit: 50, unit: "°" });
      expect(finding.text).toContain(`the saw turns to 50°. Stand the slats at 40° to the spine or more`);
    }
  });

  it("keep to the shop's own saw", async () => {
    expect(await findingsOf(sawSetting, chevron({ angle: 30 }), { limits: { sawSettingMost: 60 } })).toEqual([]);
    expect(await findingsOf(sawSetting, chevron({ angle: 45 }), { limits: { sawSettingMost: 44.9 } })).toHaveLength(1);
  });

  it("say nothing when they can't be laid, nor does a plank", async () => {
    expect(await findingsOf(sawSetting, chevron({ angle: 30, gap: 90 }))).toEqual([]);
    expect(await findingsOf(sawSetting, buildSign([]))).toEqual([]);
  });
});

// Along the upper and lower edge the setting is the angle itself.
describe("slats that end at the board's edge", () => {
  it("ask for it only where nothing is trimmed", async () => {
    const [finding] = await findingsOf(sawSetting, chevron({ angle: 60, overhang: 0 }));
    expect(finding).toMatchObject({ severity: "stop", value: 60 });
    expect(finding?.text).toContain("Lay the slats past the edge and trim them flush");
    expect(await findingsOf(sawSetting, chevron({ angle: 60, overhang: 25 }))).toEqual([]);
  });
});

describe("a frame's mitres", () => {
  it("of a rectangle are 45 degrees", async () => {
    const framed = buildSign([], { frame: buildFrame() });
    expect(await findingsOf(sawSetting, framed)).toEqual([]);
    expect(await findingsOf(sawSetting, framed, { limits: { sawSettingMost: 44 } })).toMatchObject([{ value: 45 }]);
  });

  it("of a sharp corner are beyond the saw", async () => {
    // An equal triangle: 60 degrees in each corner, so 60 off a square cut.
    const path = [
      polygonRing([
        { x: 300, y: 0 },
        { x: 600, y: 519.6 },
        { x: 0, y: 519.6 },
      ]),
    ];
    const board = boardSchema.parse({ outline: { kind: "path", path }, width: 600, height: 519.6, measures: "body" });
    const [finding] = await findingsOf(sawSetting, buildSign([], { board, frame: buildFrame() }));
    expect(finding).toMatchObject({ rule: 33, severity: "stop", value: 60 });
    expect(finding?.text).toMatch(/^6 cuts of the frame must fit and ask for 60° off a square cut/);
  });
});
