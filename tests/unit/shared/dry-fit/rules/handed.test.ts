import { describe, expect, it } from "vitest";
import { handed } from "#shared/dry-fit/rules/handed.ts";
import type { Path } from "#shared/geometry/path.ts";
import { standardAcrylics } from "#shared/materials/standard-stock.ts";
import type { Layer } from "#shared/mockup/document.ts";
import { buildLayer, buildPiece, buildSign, disc, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const polygon = (...points: [number, number][]): Path => {
  const [[x, y] = [0, 0], ...rest] = points;
  return [{ start: { x, y }, segments: rest.map(([toX, toY]) => ({ kind: "line", to: { x: toX, y: toY } })) }];
};
/** An L of two unequal arms is no mirror image of itself. */
const el = (id: string, x: number) =>
  buildPiece(id, polygon([0, 0], [8, 0], [8, 32], [24, 32], [24, 40], [0, 40]), { at: [x, 180], name: id });
const signOf = (marked: Layer["marked"], ...pieces: Layer["pieces"]) =>
  buildSign([buildLayer("B", pieces, { marked })]);
const frost = standardAcrylics.find(({ acrylic }) => acrylic.name === "Frost")?.acrylic;

it.each([
  { marked: "not stated", severity: "caution", says: "Nothing says on which face" },
  { marked: "back", severity: "remark", says: "The film is marked on the back" },
  { marked: "front", severity: "remark", says: "The film is marked on the front" },
] as const)("handed pieces, film $marked: $severity", async ({ marked, severity, says }) => {
  const findings = await findingsOf(handed, signOf(marked, el("L1", 100), disc("dot", 10, [200, 200]), el("L2", 300)));
  expect(findings).toMatchObject([{ rule: 29, severity, layerKey: "B", pieceIds: ["L1", "L2"], value: 2, limit: 0 }]);
  expect(findings[0]?.text).toContain("2 of 3 pieces of B, Layer B (L1, L2) fit with one face up only.");
  expect(findings[0]?.text).toContain(says);
});

it("what is its own mirror image asks for nothing", async () => {
  const sign = signOf("not stated", disc("d", 10, [100, 200]), plate("p", 30, 20, [200, 200]));
  expect(await findingsOf(handed, sign)).toEqual([]);
});

// A rectangle of 40 by 20 with one corner drawn out by that much; both of its mirror images miss it by as much.
it.each([
  { out: 0.1, count: 0 },
  { out: 0.5, count: 1 },
])("a corner that is $out mm off makes $count handed, at 0.15 mm", async ({ out, count }) => {
  const piece = buildPiece("p", polygon([-20, -10], [20 + out, -10], [20, 10], [-20, 10]), { at: [200, 200] });
  expect(await findingsOf(handed, signOf("not stated", piece))).toHaveLength(count);
});

describe("a sheet whose faces differ", () => {
  it("must be marked whatever its pieces' shape", async () => {
    if (!frost) throw new Error("There is no frosted sheet.");
    const sign = buildSign([buildLayer("B", [disc("d", 10, [100, 200])], { stock: frost })]);
    const findings = await findingsOf(handed, sign);
    expect(findings).toMatchObject([{ severity: "caution", pieceIds: ["d"], value: 1 }]);
    expect(findings[0]?.text).toContain("The two faces of Frost look different");
    expect((await triedMends(handed, sign)).labels).toEqual([["Mark the film on the back"]]);
  });
});

describe("a panel's holes", () => {
  const panel = (...at: [number, number][]) =>
    buildSign([
      buildLayer("B", [plate("panel", 200, 100, [300, 200])], {
        hold: standoffHold(at.map(([x, y], index) => hole(`h${index}`, x, y))),
      }),
    ]);

  it("make it handed when they are no mirror image of themselves", async () => {
    expect(await findingsOf(handed, panel([220, 170], [380, 230], [380, 180]))).toMatchObject([{ value: 1 }]);
  });

  it("leave it as it is when they are", async () => {
    expect(await findingsOf(handed, panel([220, 170], [380, 170], [220, 230], [380, 230]))).toEqual([]);
  });
});

it("marking the back mends it, on several layers one by one", async () => {
  const sign = buildSign([
    buildLayer("B", [el("a", 100)]),
    buildLayer("C", [el("b", 200), el("c", 300)]),
    buildLayer("D", [disc("d", 10, [400, 200])]),
  ]);
  const { labels, mended } = await triedMends(handed, sign);
  expect(labels).toEqual([["Mark the film on the back"], ["Mark the film on the back"]]);
  expect(mended[1]?.layers.map(({ marked }) => marked)).toEqual(["not stated", "back", "not stated"]);
});

it("a remark has nothing to mend, a piece of nothing no face", async () => {
  expect((await triedMends(handed, signOf("back", el("a", 100)))).labels).toEqual([[]]);
  expect(await findingsOf(handed, signOf("not stated", buildPiece("none", [], { at: [100, 200] })))).toEqual([]);
});
