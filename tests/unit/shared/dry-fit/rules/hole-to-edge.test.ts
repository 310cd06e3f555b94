import { describe, expect, it } from "vitest";
import { holeToEdge } from "#shared/dry-fit/rules/hole-to-edge.ts";
import type { Hardware, Hole } from "#shared/mockup/document.ts";
import { buildHardware, buildLayer, buildSign, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

/** A panel from x = 200 to 400 and y = 150 to 250. */
const panel = (holes: Hole[], thickness = 3) =>
  buildSign([buildLayer("B", [plate("panel", 200, 100, [300, 200])], { hold: standoffHold(holes), thickness })]);

it.each([
  { x: 215.9, value: 15.9 },
  { x: 216, value: null },
  { x: 300, value: null },
])("a hole of 8 mm with its centre at $x, 16 mm from the edge or not", async ({ x, value }) => {
  const findings = await findingsOf(holeToEdge, panel([hole("h", x, 200)]));
  expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
  for (const finding of findings) {
    expect(finding).toMatchObject({ rule: 7, severity: "stop", holeId: "h", pieceIds: ["panel"], limit: 16 });
  }
});

it.each([
  { apart: 10.9, value: 2.9 },
  { apart: 11, value: null },
])("two holes of 8 mm $apart mm apart leave a web of the sheet's 3 mm or not", async ({ apart, value }) => {
  const findings = await findingsOf(holeToEdge, panel([hole("h1", 300, 200), hole("h2", 300 + apart, 200)]));
  expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value, value]);
});

it("the web to an edge counts where the sheet is thicker than a hole and a half", async () => {
  const findings = await findingsOf(holeToEdge, panel([hole("h", 216, 200)], 12.5));
  expect(findings).toMatchObject([{ value: 12, limit: 12.5 }]);
});

it("a hole beside the piece holds nothing", async () => {
  const findings = await findingsOf(holeToEdge, panel([hole("h", 100, 200)]));
  expect(findings).toMatchObject([{ severity: "stop", holeId: "h", value: null, pieceIds: [] }]);
  expect(findings[0]?.text).toContain("lies in no piece of the layer");
});

describe("standoffs that do not pass the panel", () => {
  const held = (hardware: Hardware, x: number) =>
    buildSign([
      buildLayer("B", [plate("panel", 200, 100, [300, 200])], { hold: standoffHold([hole("h", x, 200)], hardware) }),
    ]);

  it.each([
    { x: 205, value: null },
    { x: 204.9, value: 4.9 },
  ])("a stud with a foot of 10 mm at $x looks out or not", async ({ x, value }) => {
    const findings = await findingsOf(holeToEdge, held(buildHardware("blindStud"), x));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
  });

  it.each([
    { x: 192, count: 0 },
    { x: 191.9, count: 1 },
  ])("an edge grip with its middle at $x reaches the edge at 200 or not", async ({ x, count }) => {
    const findings = await findingsOf(holeToEdge, held(buildHardware("edgeGrip"), x));
    expect(findings).toHaveLength(count);
    for (const { text } of findings) expect(text).toMatch(/^A standoff of B, Layer B lies in no piece/);
  });
});
