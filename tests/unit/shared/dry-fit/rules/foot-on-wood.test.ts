import { expect, it } from "vitest";
import { footOnWood } from "#shared/dry-fit/rules/foot-on-wood.ts";
import { buildLayer, buildSign, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

/** A panel over the board's right edge, which is at x 600. */
const panel = (x: number) =>
  buildSign([buildLayer("B", [plate("panel", 200, 100, [600, 200])], { hold: standoffHold([hole("h", x, 200)]) })]);

// A foot of 15: the part of a disc up to a chord 3.75 mm from its middle is 80.45 %.
it.each([
  { x: 592.5, value: null },
  { x: 596.25, value: null },
  { x: 596.4, value: 79.2 },
  { x: 600, value: 50 },
  { x: 620, value: 0 },
])("a barrel with its middle at $x: $value", async ({ x, value }) => {
  const findings = await findingsOf(footOnWood, panel(x));
  expect(findings).toHaveLength(value === null ? 0 : 1);
  for (const finding of findings) {
    expect(finding).toMatchObject({ rule: 14, severity: "caution", holeId: "h", limit: 80, unit: "%" });
    expect(finding.value ?? Number.NaN).toBeCloseTo(value ?? Number.NaN, 0);
  }
});

it("is counted on what the panel stands on, which may be two pieces side by side", async () => {
  const on = (gap: number) =>
    buildSign([
      buildLayer("B", [plate("left", 100, 100, [250 - gap / 2, 200]), plate("right", 100, 100, [350 + gap / 2, 200])]),
      buildLayer("C", [plate("panel", 150, 60, [300, 200])], { hold: standoffHold([hole("h", 300, 200)]) }),
    ]);
  expect(await findingsOf(footOnWood, on(0.1))).toEqual([]);
  const [finding] = await findingsOf(footOnWood, on(4));
  expect(finding?.text).toMatch(
    /^66.\d % of a barrel's foot of C, Layer C stands on what is under it; 80 % is the least/,
  );
});

it("keeps to the shop's share", async () => {
  expect(await findingsOf(footOnWood, panel(596.4), { limits: { footShare: 0.75 } })).toEqual([]);
});
