import { describe, expect, it } from "vitest";
import { holeWindow } from "#shared/dry-fit/rules/hole-window.ts";
import type { Hardware, Hole } from "#shared/mockup/document.ts";
import { buildHardware, buildLayer, buildSign, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const panel = (holes: Hole[]) =>
  buildSign([buildLayer("B", [plate("panel", 500, 300, [300, 200])], { hold: standoffHold(holes) })]);

// Cap and barrel 15, stud 5, cover 1, placing error 0.5: 6.0 to 9.0 mm where nothing moves.
describe("the fixed hole", () => {
  it.each([
    { diameter: 5.9, limit: 6 },
    { diameter: 6, limit: null },
    { diameter: 9, limit: null },
    { diameter: 9.1, limit: 9 },
  ])("of $diameter mm breaks the limit $limit", async ({ diameter, limit }) => {
    const findings = await findingsOf(holeWindow, panel([hole("h", 300, 200, { diameter, fixed: true })]));
    expect(findings.map((finding) => finding.limit)).toEqual(limit === null ? [] : [limit]);
    for (const finding of findings) {
      expect(finding).toMatchObject({
        rule: 6,
        severity: "stop",
        holeId: "h",
        value: diameter,
        where: { x: 300, y: 200 },
      });
    }
  });
});

// 100 mm up: acrylic 100 · 7e-5 · 20 = 0.14, pine across the grain 100 · 0.00212 · 4 = 0.848: lower = 6 + 2 · 0.988
// = 7.976.
describe("a hole 100 mm across the grain from the fixed one", () => {
  const pair = (diameter: number) =>
    panel([hole("f", 300, 250, { diameter: 8, fixed: true }), hole("h", 300, 150, { diameter })]);

  it.each([
    { diameter: 7.97, count: 1 },
    { diameter: 7.98, count: 0 },
  ])("of $diameter mm: $count", async ({ diameter, count }) => {
    const findings = await findingsOf(holeWindow, pair(diameter));
    expect(findings).toHaveLength(count);
    for (const { limit } of findings) expect(limit).toBeCloseTo(7.976, 9);
  });

  it("needs more outside, and there is none left under the cap", async () => {
    // 100 · 7e-5 · 40 = 0.28 instead of 0.14: lower 8.256.
    expect(await findingsOf(holeWindow, pair(8.1), { context: { place: "outside" } })).toMatchObject([{ holeId: "h" }]);
    const limits = { moisturePoints: 7 };
    const [finding] = await findingsOf(holeWindow, pair(8.9), { limits });
    // 6 + 2 · (0.14 + 1.484) = 9.248 over 9.
    expect(finding).toMatchObject({ value: 9.25, limit: 9 });
    expect(finding?.text).toContain("No hole of B, Layer B can be right here");
  });
});

it("along the grain only the acrylic moves: 200 mm, 0.28 mm, 6.56 mm", async () => {
  const pair = (diameter: number) =>
    panel([hole("f", 200, 200, { diameter: 8, fixed: true }), hole("h", 400, 200, { diameter })]);
  expect(await findingsOf(holeWindow, pair(6.55))).toHaveLength(1);
  expect(await findingsOf(holeWindow, pair(6.56))).toHaveLength(0);
});

it("tells inches in thousandths", async () => {
  const [finding] = await findingsOf(holeWindow, panel([hole("h", 300, 200, { diameter: 10, fixed: true })]), {
    context: { unit: "in" },
  });
  expect(finding?.text).toBe(
    "A hole of B, Layer B is 0.394″ wide; over 0.354″ it can show round the 0.591″ cap, for ever.",
  );
});

describe("other kinds of hardware", () => {
  const held = (hardware: Hardware, diameter: number) =>
    buildSign([
      buildLayer("B", [plate("panel", 500, 300, [300, 200])], {
        hold: standoffHold([hole("h", 300, 200, { diameter, fixed: true })], hardware),
      }),
    ]);
  const screw = buildHardware("throughScrew");
  const bare = buildHardware("throughScrew", { cap: null });

  // No. 6 is 3.505 thick, its head 7.087: 4.505 to (12 + 3.505)/2 − 1 = 6.753, under the head (7.087 + 3.505)/2 − 1 = 4.296.
  it.each([
    { hardware: screw, diameter: 4.5, words: "the 3.51 mm screw needs at least 4.51 mm" },
    { hardware: screw, diameter: 4.51, words: null },
    { hardware: screw, diameter: 6.75, words: null },
    { hardware: screw, diameter: 6.76, words: "over 6.75 mm it can show round the 12 mm spacer" },
    { hardware: bare, diameter: 4.4, words: "from 4.3 mm on the hole shows round the 7.09 mm head" },
  ])("a hole of $diameter mm under $hardware.name: $words", async ({ hardware, diameter, words }) => {
    const findings = await findingsOf(holeWindow, held(hardware, diameter));
    expect(findings).toHaveLength(words === null ? 0 : 1);
    for (const { text } of findings) expect(text).toContain(words);
  });

  it.each(["blindStud", "edgeGrip"] as const)("%s has no hole, whatever its diameter says", async (kind) => {
    expect(await findingsOf(holeWindow, held(buildHardware(kind), 50))).toEqual([]);
  });
});
