import { describe, expect, it } from "vitest";
import { mixedSupport } from "#shared/dry-fit/rules/mixed-support.ts";
import { buildCapStud, buildLayer, buildSign, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const base = buildLayer("B", [plate("base", 100, 100, [150, 200])], { thickness: 6 });

describe("pieces of one layer", () => {
  it("that all stand on the board are fine, though a plate lies between them", async () => {
    const sign = buildSign([base, buildLayer("C", [plate("l", 20, 20, [50, 200]), plate("r", 20, 20, [300, 200])])]);
    expect(await findingsOf(mixedSupport, sign)).toEqual([]);
  });

  it("that stand on the plate and on the board are to be split, the fewer named", async () => {
    const pieces = [plate("on", 20, 20, [150, 200]), plate("l", 20, 20, [50, 200]), plate("r", 20, 20, [300, 200])];
    const [finding, ...others] = await findingsOf(mixedSupport, buildSign([base, buildLayer("C", pieces)]));
    expect(others).toEqual([]);
    expect(finding).toMatchObject({
      rule: 2,
      severity: "stop",
      layerKey: "C",
      pieceIds: ["on"],
      value: 6,
      where: { x: 150, y: 200 },
      text: "Pieces of C, Layer C would stand on different levels: 2 on A at 18 mm, 1 on B at 24 mm. One layer has one height: split it.",
    });
  });

  it("that stand on different layers of one height are fine", async () => {
    const twin = buildLayer("C", [plate("twin", 100, 100, [350, 200])], { thickness: 6 });
    const pieces = [plate("l", 20, 20, [150, 200]), plate("r", 20, 20, [350, 200])];
    expect(await findingsOf(mixedSupport, buildSign([base, twin, buildLayer("D", pieces)]))).toEqual([]);
  });

  it("differ by a tenth of a millimetre already", async () => {
    const twin = buildLayer("C", [plate("twin", 100, 100, [350, 200])], { thickness: 6.1 });
    const pieces = [plate("l", 20, 20, [150, 200]), plate("r", 20, 20, [350, 200])];
    expect(await findingsOf(mixedSupport, buildSign([base, twin, buildLayer("D", pieces)]))).toMatchObject([
      { value: 0.1 },
    ]);
  });
});

describe("a panel on standoffs", () => {
  const panel = (holes: Parameters<typeof standoffHold>[0], offset = 12) =>
    buildLayer("C", [plate("panel", 300, 80, [200, 200])], {
      hold: standoffHold(holes, buildCapStud({ barrelLength: offset, boreDepth: offset - 2.5 })),
    });

  it("whose barrels all stand on the board is fine over a plate that is low enough", async () => {
    const sign = buildSign([base, panel([hole("h1", 70, 200), hole("h2", 330, 200)])]);
    expect(await findingsOf(mixedSupport, sign)).toEqual([]);
  });

  it("with one barrel on a plate does not lie on them all", async () => {
    const findings = await findingsOf(
      mixedSupport,
      buildSign([base, panel([hole("h1", 150, 200), hole("h2", 330, 200)])]),
    );
    expect(findings).toMatchObject([{ holeId: "h1", severity: "stop", value: 6, where: { x: 150, y: 200 } }]);
  });

  it.each([
    { offset: 6, count: 0 },
    { offset: 5, count: 1 },
  ])("with barrels of $offset mm over a plate of 6 mm runs into it: $count", async ({ offset, count }) => {
    const findings = await findingsOf(
      mixedSupport,
      buildSign([base, panel([hole("h1", 70, 200), hole("h2", 330, 200)], offset)]),
    );
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding).toMatchObject({ severity: "stop", value: 1, pieceIds: ["panel", "base"] });
    }
  });
});

it("an empty layer has nothing that could differ", async () => {
  expect(await findingsOf(mixedSupport, buildSign([buildLayer("B", [], { hold: standoffHold([]) })]))).toEqual([]);
});

describe("mends", () => {
  const on = (id: string, x: number) => plate(id, 20, 20, [x, 200]);

  it("takes the fewer into a layer of their own", async () => {
    const sign = buildSign([base, buildLayer("C", [on("on", 150), on("l", 50), on("r", 300)])]);
    const { labels, mended } = await triedMends(mixedSupport, sign);
    expect(labels).toEqual([["Split the layer"]]);
    expect(mended[0]?.layers.map(({ key, pieces }) => [key, pieces.map(({ id }) => id)])).toEqual([
      ["B", ["base"]],
      ["C", ["l", "r"]],
      ["D", ["on"]],
    ]);
  });

  it("makes a layer for each level", async () => {
    const thick = buildLayer("C", [plate("thick", 100, 100, [400, 200])], { thickness: 10 });
    const sign = buildSign([base, thick, buildLayer("D", [on("a", 50), on("b", 150), on("c", 400), on("d", 280)])]);
    const { labels, mended } = await triedMends(mixedSupport, sign);
    expect(labels).toEqual([["Split the layer in 3"]]);
    expect(mended[0]?.layers.map(({ pieces }) => pieces.length)).toEqual([1, 1, 2, 1, 1]);
    for (const after of mended) expect(await findingsOf(mixedSupport, after)).toEqual([]);
  });

  it("leaves barrels on two levels to the maker", async () => {
    const panel = buildLayer("C", [plate("panel", 300, 80, [200, 200])], {
      hold: standoffHold([hole("h1", 150, 200), hole("h2", 330, 200)]),
    });
    expect((await triedMends(mixedSupport, buildSign([base, panel]))).labels).toEqual([[]]);
  });
});
