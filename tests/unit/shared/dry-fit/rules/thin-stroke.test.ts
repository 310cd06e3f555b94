import { describe, expect, it } from "vitest";
import { thinStroke } from "#shared/dry-fit/rules/thin-stroke.ts";
import type { Hold } from "#shared/mockup/document.ts";
import { bondHold, buildLayer, buildSign, plate, pocketHold, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const bar = (width: number, hold: Hold, thickness = 3) =>
  buildSign([buildLayer("B", [plate("bar", 100, width, [300, 200])], { hold, thickness })]);

describe("a bar on standoffs, free all over, of a 3 mm sheet", () => {
  it.each([
    { width: 1.9, severity: "stop", limit: 2 },
    { width: 2.1, severity: "caution", limit: 3 },
    { width: 2.9, severity: "caution", limit: 3 },
    { width: 3, severity: null, limit: null },
    { width: 10, severity: null, limit: null },
  ])("and $width mm wide: $severity", async ({ width, severity, limit }) => {
    const findings = await findingsOf(thinStroke, bar(width, standoffHold([])));
    expect(findings.map((finding) => [finding.severity, finding.limit])).toEqual(severity ? [[severity, limit]] : []);
    for (const { value } of findings) expect(Math.abs((value ?? 0) - width)).toBeLessThanOrEqual(0.05);
  });
});

describe.each([
  { name: "bonded all over", hold: bondHold },
  { name: "in a pocket", hold: pocketHold(1) },
])("a bar $name", ({ hold }) => {
  it.each([
    { width: 1.4, severity: "caution" },
    { width: 1.5, severity: null },
    { width: 2, severity: null },
  ])("and $width mm wide: $severity", async ({ width, severity }) => {
    const findings = await findingsOf(thinStroke, bar(width, hold));
    expect(findings.map((finding) => finding.severity)).toEqual(severity ? [severity] : []);
  });
});

it("a bonded bar of 1.8 mm is fine on its support and a stop where it hangs over", async () => {
  const on = (x: number) =>
    buildSign([
      buildLayer("B", [plate("base", 100, 100, [150, 200])]),
      buildLayer("C", [plate("bar", 60, 1.8, [x, 200])]),
    ]);
  expect(await findingsOf(thinStroke, on(150))).toEqual([]);
  const [finding] = await findingsOf(thinStroke, on(185));
  expect(finding).toMatchObject({ rule: 3, severity: "stop", layerKey: "C", pieceIds: ["bar"], unit: "mm" });
  expect(finding?.text).toMatch(/is 1\.\d+ mm wide at its thinnest; 2 mm is the least\. It is free there/);
});

it("a tip that runs out to a point says so", async () => {
  const star = plate("tip", 10, 10, [300, 200], {
    path: [
      {
        start: { x: -20, y: -2 },
        segments: [
          { kind: "line", to: { x: 20, y: 0 } },
          { kind: "line", to: { x: -20, y: 2 } },
        ],
      },
    ],
  });
  const [finding] = await findingsOf(thinStroke, buildSign([buildLayer("B", [star], { hold: standoffHold([]) })]));
  expect(finding?.severity).toBe("stop");
  expect(finding?.text).toContain("runs out to a point");
});

it("a shop that allows 1 mm is heard", async () => {
  const limits = { freeStrokeMm: 1, bondedStrokeMm: 1 };
  expect(await findingsOf(thinStroke, bar(1.2, bondHold), { limits })).toEqual([]);
  expect(await findingsOf(thinStroke, bar(1.2, standoffHold([]), 1), { limits })).toEqual([]);
});
