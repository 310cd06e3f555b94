import { describe, expect, it } from "vitest";
import { frameEdges } from "#shared/dry-fit/rules/frame-edges.ts";
import type { FrameOfSign } from "#shared/mockup/document.ts";
import { buildSign } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";
import { buildFrame, buildSlatSign } from "../../../../support/slat-sign.ts";

const onSlats = (rest: Partial<FrameOfSign>) => buildSlatSign({}, [], { frame: buildFrame(rest) });
const onPlank = (rest: Partial<FrameOfSign>) => buildSign([], { frame: buildFrame(rest) });

// Substrate 12 and slats 9 less 0.3 of sanding: flush at 20.7.
describe("a frame round slats", () => {
  it.each([
    { depth: 30, bare: null },
    { depth: 20.7, bare: null },
    { depth: 20.6, bare: "0.1 mm of the slats' ends" },
    { depth: 12, bare: "8.7 mm of the slats' ends" },
    { depth: 11, bare: "1 mm of the substrate's edge and 8.7 mm of the slats' ends" },
  ])("$depth mm deep leaves bare: $bare", async ({ depth, bare }) => {
    const findings = await findingsOf(frameEdges, onSlats({ depth }));
    expect(findings.map(({ text }) => text)).toEqual(
      bare === null
        ? []
        : [`The frame is ${depth} mm deep and leaves ${bare} bare; at 20.7 mm it is level with the face.`],
    );
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 34, severity: "caution", value: depth, limit: 20.7, unit: "mm" });
    }
  });

  it("is made flush", async () => {
    const { labels, mended } = await triedMends(frameEdges, onSlats({ depth: 11 }));
    expect(labels).toEqual([["Make it 20.7 mm deep"]]);
    expect(mended[0]?.frame?.depth).toBeCloseTo(20.7, 9);
  });
});

describe("a frame round a plank of 18", () => {
  it.each([
    { depth: 18, count: 0 },
    { depth: 17.9, count: 1 },
  ])("$depth mm deep: $count", async ({ depth, count }) => {
    const findings = await findingsOf(frameEdges, onPlank({ depth }));
    expect(findings).toHaveLength(count);
    for (const { text } of findings) expect(text).toContain("leaves 0.1 mm of the board's edge bare; at 18 mm");
    if (count > 0) expect((await triedMends(frameEdges, onPlank({ depth }))).labels).toEqual([["Make it 18 mm deep"]]);
  });

  it("is no matter without one", async () => {
    expect(await findingsOf(frameEdges, buildSign([]))).toEqual([]);
  });
});

it("a frame that can't be made stops the sign in words, without a press", async () => {
  const sign = onPlank({ depth: 5 });
  const round = { ...sign, board: { ...sign.board, outline: { kind: "ellipse" as const } } };
  const findings = await findingsOf(frameEdges, round);
  expect(findings).toMatchObject([{ rule: 34, severity: "stop", title: "Frame" }]);
  expect(findings[0]?.text).toMatch(/^The frame can't be made. A frame is made of straight pieces/);
  expect((await triedMends(frameEdges, round)).labels).toEqual([[]]);
});
