import { describe, expect, it } from "vitest";
import { bed } from "#shared/dry-fit/rules/bed.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { polygonRing } from "#shared/geometry/shapes.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { pieceRegion } from "#shared/stack/piece-region.ts";
import { buildLayer, buildPiece, buildSign, disc, plate } from "../../../../support/build-sign.ts";
import { findingsOf, inputOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

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

describe("a piece that is split", () => {
  const options = { limits: { bedWidthMm: 400, bedHeightMm: 300 } };
  const kernelOf = async () => (await inputOf(buildSign([]), {})).kernel;
  const areaOf = async (pieces: readonly Piece[]) => {
    const kernel = await kernelOf();
    return pieces.reduce((sum, piece) => sum + regionAreaMm2(pieceRegion(piece, kernel)), 0);
  };
  const piecesOf = (document: MockupDocument | undefined) => document?.layers.flatMap(({ pieces }) => pieces) ?? [];

  it("is two halves at the same place, with new ids, and both go on the bed", async () => {
    const placement = { x: 320, y: 210, turn: 30, scale: 1.25, mirrored: true };
    const panel = plate("p", 480, 200, [300, 200], { name: "Panel", reads: "OPEN", placement });
    const before = buildSign([buildLayer("B", [panel])]);
    const { labels, mended } = await triedMends(bed, before, options);
    expect(labels).toEqual([["Split it in two"]]);
    const halves = piecesOf(mended[0]);
    expect(halves.map(({ id, name, reads }) => [id, name, reads])).toEqual([
      ["p-1", "Panel, part 1 of 2", "OPEN"],
      ["p-2", "Panel, part 2 of 2", ""],
    ]);
    const { x, y, ...way } = placement;
    for (const half of halves) expect(half.placement).toMatchObject(way);
    // Each about its own middle: a quarter of the 600 mm either way along the turn of 30°.
    const middles = halves.map((half) => [half.placement.x, half.placement.y].map(Math.round));
    expect(middles).toEqual([
      [190, 135],
      [450, 285],
    ]);
    // 600 by 250 on the board, cut across its longer side.
    expect(await areaOf(halves)).toBeCloseTo(600 * 250, 1);
    for (const half of halves) expect(await areaOf([half])).toBeCloseTo(300 * 250, -1);
    expect(mended[0] && (await findingsOf(bed, mended[0], options))).toEqual([]);
    const kernel = await kernelOf();
    const whole = kernel.union(
      halves.flatMap((half) => pieceRegion(half, kernel)),
      "nonzero",
    );
    expect(kernel.difference(pieceRegion(panel, kernel), kernel.offset(whole, 0.01, "mitre"))).toEqual([]);
  });

  it("comes apart in as many parts as go on the bed, by one press", async () => {
    const long = buildSign([buildLayer("B", [plate("p", 1500, 200, [300, 200])])]);
    const { labels, mended } = await triedMends(bed, long, options);
    expect(labels).toEqual([["Split it, into 4 parts"]]);
    expect(piecesOf(mended[0]).map(({ id, placement }) => [id, Math.round(placement.x * 10) / 10])).toEqual([
      ["p-1", -262.5],
      ["p-2", 112.5],
      ["p-3", 487.5],
      ["p-4", 862.5],
    ]);
    expect(mended[0] && (await findingsOf(bed, mended[0], options))).toEqual([]);
  });

  it("keeps the curves of its outline, and ids that are taken", async () => {
    const layers = [buildLayer("B", [disc("o", 250, [300, 200])]), buildLayer("C", [plate("o-1", 20, 20, [300, 200])])];
    const { mended } = await triedMends(bed, buildSign(layers), options);
    const parts = piecesOf(mended[0]).filter(({ id }) => id !== "o-1");
    // 500 mm over, so that no halves go on 400 by 300: quarters.
    expect(parts.map(({ id }) => id)).toEqual(["o-2", "o-3", "o-4", "o-5"]);
    const segments = parts.flatMap(({ path }) => path.flatMap((ring) => ring.segments));
    expect(segments.filter(({ kind }) => kind === "cubic").length).toBeGreaterThanOrEqual(4);
    expect(segments.length).toBeLessThan(24);
  });

  it("falls into what its cut leaves apart", async () => {
    // A U: two prongs of 100 by 400 over a foot of 400 by 100, cut through y 250: the prongs come apart.
    const u = polygonRing(
      [
        [0, 0],
        [100, 0],
        [100, 420],
        [300, 420],
        [300, 0],
        [400, 0],
        [400, 520],
        [0, 520],
      ].map(([x = 0, y = 0]) => ({ x: x - 200, y: y - 260 })),
    );
    const { labels, mended } = await triedMends(
      bed,
      buildSign([buildLayer("B", [buildPiece("u", [u], { at: [300, 200] })])]),
      options,
    );
    expect(labels).toEqual([["Split it, into 3 parts"]]);
    const areas = await Promise.all(piecesOf(mended[0]).map((piece) => areaOf([piece])));
    expect(areas.toSorted((a, b) => a - b).map(Math.round)).toEqual([26_000, 26_000, 72_000]);
  });
});
