import { describe, expect, it } from "vitest";
import { brads } from "#shared/dry-fit/rules/brads.ts";
import type { FrameOfSign } from "#shared/mockup/document.ts";
import { buildSign } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { buildFrame, buildSlatSign } from "../../../../support/slat-sign.ts";

const deep = async (thickness: number, bradLengthMm: number, more: object = {}) =>
  (await findingsOf(brads, buildSlatSign({ thickness }), { limits: { bradLengthMm, ...more } })).filter(
    ({ severity }) => severity === "caution",
  );

// A brad set 0.5 mm under the face comes L + 0.5 deep, of which the slat takes its thickness.
describe("a brad through a slat of 9 on 12 mm", () => {
  it.each([
    { length: 13.5, value: null },
    { length: 13.4, value: 4.9 },
    { length: 8, value: -0.5 },
    // 9 + 12 − 0.3 − 2 = 18.7 is the deepest.
    { length: 18.2, value: null },
    { length: 18.3, value: -0.1 },
  ])("of $length mm: $value", async ({ length, value }) => {
    const findings = await deep(9, length);
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 31, severity: "caution", unit: "mm" });
      expect(finding.text).toContain("Take brads of 13.5 mm to 18.2 mm.");
    }
  });

  it("says so when it is too short, too long, or both", async () => {
    expect((await deep(9, 12))[0]?.text).toMatch(
      /^A brad of 12 mm comes 3.5 mm past the slats; 5 mm into the substrate/,
    );
    expect((await deep(9, 8))[0]?.text).toMatch(/^A brad of 8 mm ends in the slats;/);
    expect((await deep(9, 25))[0]?.text).toMatch(/^A brad of 25 mm comes too deep by 6.8 mm: 2 mm must be left/);
    const both = await deep(9, 15, { bradHoldMm: 8, skinMm: 6 });
    expect(both.map(({ limit }) => limit)).toEqual([8, 0]);
    for (const { text } of both) expect(text).toContain("No length does both");
  });

  it("keeps to the shop's hold and to what it leaves under a point", async () => {
    expect(await deep(9, 13.5, { bradHoldMm: 5.1 })).toHaveLength(1);
    expect(await deep(9, 18.2, { skinMm: 2.1 })).toHaveLength(1);
  });
});

it("a plank has none", async () => {
  expect(await findingsOf(brads, buildSign([]))).toEqual([]);
});

describe("slats that no brad fits in", () => {
  const told = async (bradTrimMm: number, slatWidth = 40) =>
    (await findingsOf(brads, buildSlatSign({ slatWidth }), { limits: { bradTrimMm } })).filter(
      ({ severity }) => severity === "remark",
    );

  it("are told by number", async () => {
    // The lowest slat lies from 0 to 40 mm above the edge and its brads 20 mm above it, 10 off its own edges.
    expect(await told(15)).toEqual([]);
    expect(await told(29.8)).toEqual([]);
    const [finding] = await told(30.1);
    expect(finding).toMatchObject({ rule: 31, value: 2, limit: 0 });
    expect(finding?.text).toMatch(/^Slats 1 and 10 take no brad that keeps 30.1 mm inside the trim line/);
  });

  it("are told with the spine, alone or several", async () => {
    const textOf = async (width: number, spineWidth: number) => {
      const sign = buildSlatSign({ pattern: "spine", angle: 90, spineWidth, slatWidth: 200 });
      return (await findingsOf(brads, { ...sign, board: { ...sign.board, width } })).find(
        ({ severity }) => severity === "remark",
      )?.text;
    };
    // A spine of 15 has nothing 10 mm off its joints; slats beside it need 25, 15 to the trim line and 10 to the joint.
    expect(await textOf(600, 15)).toMatch(/^The spine takes no brad .* Glue and clamp it.$/);
    expect(await textOf(255, 215)).toMatch(/^Slats 1, 2, 3 and 4 take no brad .* Glue and clamp them.$/);
    expect(await textOf(255, 204)).toBeUndefined();
  });

  it("are counted when they are many", async () => {
    // 20 slats of 20 mm have nothing 10 mm off their own edges.
    const [finding] = await told(15, 20);
    expect(finding?.value).toBe(20);
    expect(finding?.text).toMatch(/^20 slats take no brad/);
  });
});

describe("brads of a frame", () => {
  const framed = async (rest: Partial<FrameOfSign>, limits: object = {}) =>
    findingsOf(brads, buildSign([], { frame: buildFrame(rest) }), { limits });

  // 30.5 − width into the edge, 10 at the least.
  it.each([
    { width: 20.5, value: null },
    { width: 20.6, value: 9.9 },
    { width: 31, value: -0.5 },
  ])("through $width mm: $value", async ({ width, value }) => {
    const findings = await framed({ width });
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) expect(finding).toMatchObject({ rule: 31, severity: "caution", limit: 10 });
  });

  it("are told the length that does", async () => {
    expect((await framed({ width: 25 }))[0]?.text).toBe(
      "A brad of 30 mm through the 25 mm frame comes 5.5 mm into the board's edge; 10 mm is the least. Take brads of 34.5 mm or more, screws, or a narrower frame.",
    );
    expect(await framed({ width: 25 }, { frameBradLengthMm: 34.5 })).toEqual([]);
    expect(await framed({ width: 25 }, { frameBradHoldMm: 5.5 })).toEqual([]);
  });
});
