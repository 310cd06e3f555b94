import { expect, it } from "vitest";
import { outsideBoard } from "#shared/dry-fit/rules/outside-board.ts";
import { buildLayer, buildSign, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const at = (x: number, y: number) => buildSign([buildLayer("B", [plate("p", 100, 50, [x, y], { name: "Banner" })])]);

it.each([
  { x: 50, y: 25, over: null },
  { x: 49.96, y: 25, over: null },
  { x: 49.9, y: 200, over: 0.1 },
  { x: 555, y: 200, over: 5 },
  { x: 300, y: 20, over: 5 },
  { x: 300, y: 385, over: 10 },
])("a piece of 100 by 50 about $x, $y stands $over mm over the edge", async ({ x, y, over }) => {
  const findings = await findingsOf(outsideBoard, at(x, y));
  expect(findings.map(({ value }) => value)).toEqual(over === null ? [] : [over]);
  for (const finding of findings) expect(finding).toMatchObject({ rule: 27, severity: "caution", pieceIds: ["p"] });
});

it("names every edge and points at the worst", async () => {
  const [finding] = await findingsOf(outsideBoard, at(45, 380));
  expect(finding?.text).toBe(
    "Banner (B) stands over the board's left and lower edge by 5 mm. If that is meant, set this aside.",
  );
  expect(finding?.where).toEqual({ x: -5, y: 380 });
});

it("a piece without an outline stands over nothing", async () => {
  const sign = buildSign([buildLayer("B", [plate("p", 100, 50, [900, 900], { path: [] })])]);
  expect(await findingsOf(outsideBoard, sign)).toEqual([]);
});
