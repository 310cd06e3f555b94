import { expect, it } from "vitest";
import { bed } from "#shared/dry-fit/rules/bed.ts";
import { buildLayer, buildSign, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const sign = (width: number, height: number) => buildSign([buildLayer("B", [plate("p", width, height, [300, 200])])]);

it.each([
  { width: 900, height: 600, over: null },
  { width: 600, height: 900, over: null },
  { width: 900.2, height: 600, over: 0.2 },
  { width: 1000, height: 700, over: 100 },
])("a piece of $width by $height goes over the bed of 900 by 600 by $over mm", async ({ width, height, over }) => {
  const findings = await findingsOf(bed, sign(width, height));
  expect(findings.map(({ value }) => value)).toEqual(over === null ? [] : [over]);
  for (const finding of findings) expect(finding).toMatchObject({ rule: 21, severity: "stop", pieceIds: ["p"] });
});

it("knows the shop's own bed", async () => {
  const [finding] = await findingsOf(bed, sign(500, 350), { limits: { bedWidthMm: 400, bedHeightMm: 300 } });
  expect(finding).toMatchObject({ value: 100 });
  expect(finding?.text).toContain("the bed takes 400 × 300 mm. Split it.");
});
