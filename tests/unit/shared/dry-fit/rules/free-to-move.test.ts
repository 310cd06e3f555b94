import { describe, expect, it } from "vitest";
import { freeToMove } from "#shared/dry-fit/rules/free-to-move.ts";
import type { Hardware, Hole } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  hole,
  plate,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const panel = (holes: Hole[], hardware: Hardware = buildCapStud()) =>
  buildSign([
    buildLayer("B", [plate("panel", 300, 100, [300, 200])], { thickness: 4.5, hold: standoffHold(holes, hardware) }),
  ]);
const row = (...fixed: string[]) =>
  ["a", "b", "c"].map((id, index) => hole(id, 200 + 100 * index, 200, { fixed: fixed.includes(id) }));

describe("holes with play", () => {
  it.each([
    { holes: row("b"), values: [] },
    { holes: row("a"), values: [] },
    { holes: row(), values: [0] },
    { holes: row("a", "c"), values: [2] },
    { holes: [hole("only", 300, 200)], values: [] },
    { holes: [], values: [] },
  ])("fixed ones among $holes.length: $values", async ({ holes, values }) => {
    const findings = await findingsOf(freeToMove, panel(holes));
    expect(findings.map(({ value }) => value)).toEqual(values);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 16, severity: "caution", layerKey: "B", holeId: null, limit: 1 });
      expect(finding.where).toEqual({ x: 300, y: 200 });
    }
  });

  it("go for a screw through a spacer too", async () => {
    expect(await findingsOf(freeToMove, panel(row(), buildHardware("throughScrew")))).toHaveLength(1);
  });
});

// Along the grain only the acrylic moves: 20 · 7e-5 of the length.
describe("glued studs", () => {
  const studs = (far: number) =>
    panel([hole("a", 300 - far, 200), hole("b", 300 + far, 200)], buildHardware("blindStud"));
  it.each([
    { far: 100, count: 0 },
    { far: 140, limit: 0.196, count: 0 },
    { far: 140, limit: 0.195, count: 1 },
  ])("$far mm from their middle: $count", async ({ far, count, limit }) => {
    const limits = limit === undefined ? {} : { studGiveMm: limit };
    const findings = await findingsOf(freeToMove, studs(far), { limits });
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding).toMatchObject({ holeId: "a", value: 0.2 });
  });

  it("across the grain the wood moves them", async () => {
    const sign = panel([hole("a", 300, 155), hole("b", 300, 245)], buildHardware("blindStud"));
    // 45 · (0.0014 + 4 · 0.00212) = 0.445; with the sun on it 0.508.
    expect(await findingsOf(freeToMove, sign)).toEqual([]);
    expect(await findingsOf(freeToMove, sign, { context: { place: "outside" } })).toMatchObject([{ value: 0.51 }]);
  });
});

describe("edge grips", () => {
  // The holders' middles 3 mm outside: 5 mm over the edge, which draws back 53 · 0.00988 = 0.52 mm.
  const grips = (out: number) =>
    panel([hole("top", 300, 150 - out), hole("low", 300, 250 + out)], buildHardware("edgeGrip"));
  it.each([
    { out: 3, least: 4.47, count: 0 },
    { out: 3, least: 4.49, count: 1 },
    // Over the edge by less than the limit on any day: rule 8 says so.
    { out: 3, least: 5.1, count: 0 },
  ])("set $out mm outside with $least mm to keep: $count", async ({ out, least, count }) => {
    const findings = await findingsOf(freeToMove, grips(out), { limits: { edgeGripMm: least } });
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding.value ?? Number.NaN).toBe(4.48);
  });
});
