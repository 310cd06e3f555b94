import { expect, it } from "vitest";
import { locate } from "#shared/dry-fit/rules/locate.ts";
import { buildLayer, buildSign, plate, pocketHold, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const pieces = () => [plate("p1", 20, 20, [100, 200]), plate("p2", 20, 20, [140, 200])];

it("bonded pieces with nothing to find their place by are one finding a layer", async () => {
  const findings = await findingsOf(locate, buildSign([buildLayer("B", pieces(), { locate: "none" })]));
  expect(findings).toMatchObject([
    { rule: 20, severity: "caution", layerKey: "B", pieceIds: ["p1", "p2"], value: 2, where: { x: 100, y: 200 } },
  ]);
});

it.each(["template", "scored line", "pocket", "hole pattern"] as const)("with a %s they are found", async (by) => {
  expect(await findingsOf(locate, buildSign([buildLayer("B", pieces(), { locate: by })]))).toEqual([]);
});

it("a pocket, a standoff and an empty layer ask for nothing", async () => {
  const sign = (hold: ReturnType<typeof pocketHold>) =>
    buildSign([buildLayer("B", pieces(), { locate: "none", hold })]);
  expect(await findingsOf(locate, sign(pocketHold(1)))).toEqual([]);
  expect(await findingsOf(locate, sign(standoffHold([])))).toEqual([]);
  expect(await findingsOf(locate, buildSign([buildLayer("B", [], { locate: "none" })]))).toEqual([]);
});
