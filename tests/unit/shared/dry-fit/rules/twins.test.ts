import { expect, it } from "vitest";
import { twins } from "#shared/dry-fit/rules/twins.ts";
import type { Path } from "#shared/geometry/path.ts";
import { buildLayer, buildPiece, buildSign, disc, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const polygon = (...points: [number, number][]): Path => {
  const [[x, y] = [0, 0], ...rest] = points;
  return [{ start: { x, y }, segments: rest.map(([toX, toY]) => ({ kind: "line", to: { x: toX, y: toY } })) }];
};
/** A block H whose bar lies that much above its middle: turned by 180° it looks right, but the bar is twice that off. */
const aitch = (id: string, up: number, at: [number, number]) =>
  buildPiece(
    id,
    polygon(
      [-15, -20],
      [-7, -20],
      [-7, -4 - up],
      [7, -4 - up],
      [7, -20],
      [15, -20],
      [15, 20],
      [7, 20],
      [7, 4 - up],
      [-7, 4 - up],
      [-7, 20],
      [-15, 20],
    ),
    { at, name: id },
  );

// Half a millimetre a side is what discs of 20 and 21 mm differ by; an eye overlooks 0.75 mm, or 4 % of the longer side.
it.each([
  { other: 10.05, count: 0 },
  { other: 10.5, count: 1 },
  { other: 11.5, count: 0 },
])("discs of radius 10 and $other: $count", async ({ other, count }) => {
  const sign = buildSign([
    buildLayer("B", [disc("a", 10, [100, 200], { name: "Moon" }), disc("b", other, [200, 200], { name: "Sun" })]),
  ]);
  const findings = await findingsOf(twins, sign);
  expect(findings).toHaveLength(count);
  for (const finding of findings) {
    expect(finding).toMatchObject({ rule: 30, severity: "remark", layerKey: "B", pieceIds: ["a", "b"], value: 2 });
    expect(finding.text).toBe(
      "2 pieces of Midnight (3 mm) can be laid wrong and look right: Moon, Sun in each other's place. Mark each with its place, and which way is up.",
    );
  }
});

it.each([
  { up: 0, count: 0 },
  { up: 0.4, count: 1 },
  { up: 4, count: 0 },
])("an H whose bar lies $up mm high looks right upside down: $count", async ({ up, count }) => {
  const findings = await findingsOf(twins, buildSign([buildLayer("B", [aitch("H", up, [100, 200])])]));
  expect(findings).toHaveLength(count);
  for (const { text } of findings) expect(text).toContain("H upside down");
});

it("pieces of one sheet in two layers lie in one heap; of another sheet or thickness they do not", async () => {
  const b = buildLayer("B", [disc("a", 10, [100, 200])]);
  expect(await findingsOf(twins, buildSign([b, buildLayer("C", [disc("b", 10.5, [200, 200])])]))).toMatchObject([
    { layerKey: null, pieceIds: ["a", "b"] },
  ]);
  const thicker = buildLayer("C", [disc("b", 10.5, [200, 200])], { thickness: 6 });
  expect(await findingsOf(twins, buildSign([b, thicker]))).toEqual([]);
});

it("many are one remark with the first groups named", async () => {
  const sizes = [8, 8.4, 20, 20.5, 32, 32.6, 44, 44.6, 56, 57];
  const pieces = sizes.map((size, index) =>
    plate(`p${index}`, size, 30, [40 + 55 * index, 200], { name: `P${index}` }),
  );
  const findings = await findingsOf(twins, buildSign([buildLayer("B", pieces)]));
  expect(findings).toMatchObject([{ value: 10 }]);
  expect(findings[0]?.text).toContain(
    "P0, P1 in each other's place; P2, P3 in each other's place; P4, P5 in each other's place; and 2 more groups.",
  );
});

it("a chain of pieces that grow little by little is one group", async () => {
  const pieces = [10, 10.6, 11.2, 11.8].map((radius, index) =>
    disc(`d${index}`, radius, [60 + 60 * index, 200], { name: `D${index}` }),
  );
  const [finding] = await findingsOf(twins, buildSign([buildLayer("B", pieces)]));
  expect(finding?.value).toBe(4);
  expect(finding?.text).toContain("D0, D1, D2 and 1 more in each other's place.");
});

it("a hundred equal dots, and pieces of nothing, are no twins", async () => {
  const dots = Array.from({ length: 100 }, (_, index) => disc(`d${index}`, 2, [10 + 5 * index, 200]));
  const sign = buildSign([buildLayer("B", [...dots, buildPiece("none", [], { at: [5, 5] })])]);
  expect(await findingsOf(twins, sign)).toEqual([]);
});
