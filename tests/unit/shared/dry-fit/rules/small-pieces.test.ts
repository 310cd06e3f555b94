import { expect, it } from "vitest";
import { smallPieces } from "#shared/dry-fit/rules/small-pieces.ts";
import { buildLayer, buildPiece, buildSign, disc, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const signOf = (...pieces: Parameters<typeof buildLayer>[1]) => buildSign([buildLayer("B", pieces)]);

it.each([
  { size: 7.9, count: 1 },
  { size: 8, count: 0 },
  { size: 8.1, count: 0 },
])("a piece of $size by 3 mm: $count", async ({ size, count }) => {
  const findings = await findingsOf(smallPieces, signOf(plate("p", size, 3, [100, 200])));
  expect(findings).toHaveLength(count);
  for (const finding of findings) {
    expect(finding).toMatchObject({
      rule: 28,
      severity: "remark",
      pieceIds: ["p"],
      value: 1,
      where: { x: 100, y: 200 },
    });
  }
});

it("turned it is as long as it lies", async () => {
  const turned = buildPiece("t", plate("x", 9, 2, [0, 0]).path, {
    placement: { x: 100, y: 200, turn: 45, scale: 1, mirrored: false },
  });
  expect(await findingsOf(smallPieces, signOf(turned))).toEqual([]);
});

it("all of a layer are counted in one remark, for all signs", async () => {
  const dots = [6, 4, 7, 20].map((size, index) =>
    plate(`d${index}`, size, 2, [100 + 40 * index, 200], { name: `Dot ${index}` }),
  );
  const findings = await findingsOf(smallPieces, buildSign([buildLayer("B", dots)], { quantity: 6 }));
  expect(findings).toMatchObject([{ pieceIds: ["d1", "d0", "d2"], value: 3, where: { y: 200 } }]);
  expect(findings[0]?.text).toBe(
    "3 pieces of B, Layer B (Dot 1, Dot 0, Dot 2) are down to 4 mm long, under 8 mm: count them as they come off the bed, and cut some to spare. 18 in all for 6 signs.",
  );
});

it("a piece of nothing is none, and the shop sets the limit", async () => {
  expect(await findingsOf(smallPieces, signOf(buildPiece("none", [], { at: [100, 200] })))).toEqual([]);
  expect(
    await findingsOf(smallPieces, signOf(disc("d", 5, [100, 200])), { limits: { smallPieceMm: 12 } }),
  ).toHaveLength(1);
});
