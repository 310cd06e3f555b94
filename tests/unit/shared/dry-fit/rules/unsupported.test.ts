import { describe, expect, it } from "vitest";
import { unsupported } from "#shared/dry-fit/rules/unsupported.ts";
import { buildLayer, buildSign, plate, pocketHold, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

/** A piece of 40 by 20 on a plate whose right edge lies at x = 200, hanging `over` mm over it. */
const hanging = (over: number, height = 20) =>
  buildSign([
    buildLayer("B", [plate("base", 100, 100, [150, 200])]),
    buildLayer("C", [plate("piece", 40, height, [180 + over, 200], { name: "Moon" })]),
  ]);

it.each([
  { over: 0, severity: null },
  { over: 4, severity: null },
  { over: 4.1, severity: "caution" },
  { over: 12, severity: "caution" },
  { over: 12.1, severity: "stop" },
  { over: 30, severity: "stop" },
])("of 40 mm hanging $over mm over: $severity (10 % and 30 % are the limits)", async ({ over, severity }) => {
  const findings = await findingsOf(unsupported, hanging(over));
  expect(findings.map((finding) => finding.severity)).toEqual(severity === null ? [] : [severity]);
});

it("says what hangs over, by how much, and where", async () => {
  const [finding] = await findingsOf(unsupported, hanging(16));
  expect(finding).toMatchObject({
    rule: 1,
    severity: "stop",
    layerKey: "C",
    pieceIds: ["piece"],
    value: 40,
    limit: 30,
    unit: "%",
    source: "common practice",
  });
  expect(finding?.text).toMatch(
    /^Moon \(C\) has 40 % of its area off its support, reaching up to 1[56](\.\d+)? mm over; 30 %/,
  );
  expect(finding?.where?.x).toBeGreaterThan(214);
});

it.each([
  { over: 9.9, count: 0 },
  { over: 10.2, count: 1 },
])(
  "a long arm that hangs $over mm over by less than a tenth of its area is found by its reach: $count",
  async ({ over, count }) => {
    const sign = buildSign([
      buildLayer("B", [plate("base", 300, 100, [150, 200])]),
      buildLayer("C", [plate("piece", 200, 20, [200 + over, 200])]),
    ]);
    const findings = await findingsOf(unsupported, sign);
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding).toMatchObject({ severity: "caution", limit: 10, unit: "mm" });
  },
);

it("a piece beside the board lies on nothing", async () => {
  const [finding] = await findingsOf(unsupported, buildSign([buildLayer("B", [plate("lost", 20, 20, [700, 200])])]));
  expect(finding).toMatchObject({ severity: "stop", value: 100, where: { x: 700, y: 200 } });
});

it("a piece on two plates of one height is carried by both", async () => {
  const sign = buildSign([
    buildLayer("B", [plate("left", 100, 100, [150, 200]), plate("right", 100, 100, [250, 200])]),
    buildLayer("C", [plate("bridge", 80, 20, [200, 200])]),
  ]);
  expect(await findingsOf(unsupported, sign)).toEqual([]);
});

it("asks nothing of pieces in pockets or on standoffs, and takes the shop's own limits", async () => {
  const held = (hold: ReturnType<typeof pocketHold>) =>
    buildSign([buildLayer("B", [plate("b", 100, 100, [590, 200])], { hold })]);
  expect(await findingsOf(unsupported, held(pocketHold(2)))).toEqual([]);
  expect(await findingsOf(unsupported, held(standoffHold([])))).toEqual([]);
  const lenient = { unsupportedCaution: 0.5, unsupportedStop: 0.6, reachMm: 100 };
  expect(await findingsOf(unsupported, hanging(16), { limits: lenient })).toEqual([]);
});

describe("mends", () => {
  const base = () => buildLayer("B", [plate("base", 100, 100, [150, 200])]);
  const on = (width: number, height: number, at: [number, number]) =>
    buildSign([base(), buildLayer("C", [plate("piece", width, height, at)])]);

  // The base ends at 200 mm; a tenth more is given to spare, and no more than the 10 mm that may hang over is moved.
  it.each([
    { what: "over one edge", sign: on(20, 20, [196, 200]), labels: [["Move it 6.1 mm onto its support"]] },
    { what: "over a corner", sign: on(20, 20, [194, 154]), labels: [["Move it 7.35 mm onto its support"]] },
    {
      what: "half over, ten millimetres to go",
      sign: on(18, 18, [200.9, 200]),
      labels: [["Move it 10 mm onto its support"]],
    },
    { what: "half over, more to go", sign: on(20, 20, [200.5, 200]), labels: [[]] },
    { what: "on one too small for it", sign: on(150, 20, [150, 200]), labels: [[]] },
  ])("of a piece $what: $labels", async ({ sign, labels }) => {
    expect((await triedMends(unsupported, sign)).labels).toEqual(labels);
  });

  it("brings a piece beside the board back onto it", async () => {
    const sign = buildSign([buildLayer("B", [plate("lost", 8, 8, [605, 200])])]);
    const { labels, mended } = await triedMends(unsupported, sign);
    expect(labels).toEqual([["Move it 9.1 mm onto its support"]]);
    expect(mended[0]?.layers[0]?.pieces[0]?.placement).toMatchObject({ x: 595.9, y: 200 });
  });

  it("moves nothing under something higher", async () => {
    const high = buildLayer("D", [plate("high", 30, 30, [570, 200])], { thickness: 6 });
    const sign = buildSign([high, buildLayer("E", [plate("piece", 16, 16, [599, 200])])]);
    expect((await triedMends(unsupported, sign)).labels).toEqual([[]]);
  });
});
