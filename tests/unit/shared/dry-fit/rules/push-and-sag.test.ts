import { describe, expect, it } from "vitest";
import { pushAndSag } from "#shared/dry-fit/rules/push-and-sag.ts";
import type { Hole, MockupDocument } from "#shared/mockup/document.ts";
import {
  buildHardware,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

type Pose = MockupDocument["hanging"]["pose"];
const corners = (half: number, tall = half) =>
  [
    [-1, -1],
    [1, -1],
    [1, 1],
    [-1, 1],
  ].map(([x = 0, y = 0], index) => hole(`h${index}`, 300 + x * half, 200 + y * tall));

const panel = (
  holes: Hole[],
  { thickness = 6, pose = "upright", size = 300 }: { thickness?: number; pose?: Pose; size?: number } = {},
) =>
  buildSign([buildLayer("B", [plate("panel", size, size, [300, 200])], { thickness, hold: standoffHold(holes) })], {
    hanging: { kind: "cleat", gap: 8, pose, carriesKg: null, points: [] },
  });

// D = 3200 · 216 / (12 (1 − 0.37²)) = 66 736 N·mm for 6 mm; a push of 100 N: 0.0391 · 100 a²/D.
describe("a push on four points", () => {
  it.each([
    // 130.6 apart: 0.9993 mm; 130.7: 1.0008 mm.
    { half: 65.3, value: null },
    { half: 65.35, value: 1 },
    { half: 100, value: 2.34 },
  ])("a square of twice $half mm: $value", async ({ half, value }) => {
    const findings = await findingsOf(pushAndSag, panel(corners(half)));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 15, severity: "caution", pieceIds: ["panel"], limit: 1 });
      expect(finding.where?.x).toBeCloseTo(300, 9);
      expect(finding.where?.y).toBeCloseTo(200, 9);
    }
  });

  it("is what the shop says", async () => {
    expect(await findingsOf(pushAndSag, panel(corners(100)), { limits: { pushN: 40 } })).toEqual([]);
    expect(await findingsOf(pushAndSag, panel(corners(100)), { limits: { bendMm: 2.4 } })).toEqual([]);
    expect(await findingsOf(pushAndSag, panel(corners(100)), { limits: { bendPart: 80 } })).toEqual([]);
  });

  it("says more than half the thickness, where the theory ends", async () => {
    const [finding] = await findingsOf(pushAndSag, panel(corners(100), { thickness: 3 }));
    expect(finding).toMatchObject({ value: 1.5, limit: 1 });
    expect(finding?.text).toBe(
      "B, Layer B gives way by more than 1.5 mm (half its thickness, where the theory ends) when it is pushed with 100 N between its standoffs; 1 mm is the limit. Thicker sheet or standoffs nearer each other make it stiffer.",
    );
  });

  it("is an upper estimate on a long rectangle", async () => {
    const [finding] = await findingsOf(pushAndSag, panel(corners(90, 45)));
    expect(finding?.text).toContain("by up to");
  });
});

describe("other patterns", () => {
  it("two standoffs make a strip as wide as the panel: P a³/(48 E I)", async () => {
    // 200 apart, 100 wide: 0.0242 · 2 · 100 · 200²/66 736 = 2.90 mm.
    const sign = buildSign([
      buildLayer("B", [plate("panel", 300, 100, [300, 200])], {
        thickness: 6,
        hold: standoffHold([hole("a", 200, 200), hole("b", 400, 200)]),
      }),
    ]);
    expect(await findingsOf(pushAndSag, sign)).toMatchObject([{ value: 2.9 }]);
  });

  it("one standoff and none say nothing", async () => {
    expect(await findingsOf(pushAndSag, panel([hole("h", 300, 200)]))).toEqual([]);
    expect(await findingsOf(pushAndSag, panel([]))).toEqual([]);
  });

  it("edge grips hold it too", async () => {
    const hardware = buildHardware("edgeGrip");
    const holes = [hole("a", 147, 200), hole("b", 453, 200)];
    const sign = buildSign([
      buildLayer("B", [plate("panel", 300, 300, [300, 200])], { thickness: 4.5, hold: standoffHold(holes, hardware) }),
    ]);
    expect(await findingsOf(pushAndSag, sign)).toHaveLength(1);
  });
});

// Own weight of 3 mm: 1190e-9 · 9.80665 · 3 = 3.501e-5 N/mm²; D at half E = 4171; 0.0255 q a⁴/D.
describe("sag of a lying panel", () => {
  it.each([
    { half: 110, pose: "lying", count: 0 },
    // 280 apart: 1.316 mm; 220: 0.50 mm.
    { half: 140, pose: "lying", count: 1 },
    { half: 140, pose: "tilted", count: 1 },
  ] as const)("a square of twice $half mm, $pose: $count", async ({ half, pose, count }) => {
    const findings = await findingsOf(pushAndSag, panel(corners(half), { thickness: 3, pose }));
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding.value ?? Number.NaN).toBeCloseTo(1.31, 1);
      expect(finding.text).toContain("under its own weight in the long run");
    }
  });

  it("counts what is bonded on it", async () => {
    const bare = panel(corners(125), { thickness: 3, pose: "lying" });
    expect(await findingsOf(pushAndSag, bare)).toEqual([]);
    const clad = {
      ...bare,
      layers: [...bare.layers, buildLayer("C", [disc("on", 120, [300, 200])], { thickness: 10 })],
    };
    expect(await findingsOf(pushAndSag, clad)).toHaveLength(1);
  });
});
