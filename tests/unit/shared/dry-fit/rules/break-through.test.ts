import { describe, expect, it } from "vitest";
import { breakThrough } from "#shared/dry-fit/rules/break-through.ts";
import type { Hardware, Hold } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  hole,
  plate,
  pocketHold,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

const on = (hold: Hold) => buildSign([buildLayer("B", [plate("panel", 200, 100, [300, 200])], { hold })]);
const panel = (hardware: Hardware) => on(standoffHold([hole("h", 300, 200)], hardware));
const { screw } = buildCapStud();

// A plank of 18 may be opened by 18 − 0.3 − 2 = 15.7 mm.
describe("a screw through a countersunk floor of 2.5 mm", () => {
  it.each([
    { length: 16, value: null },
    { length: 18.2, value: null },
    { length: 18.3, value: 15.8 },
    { length: 25, value: 22.5 },
  ])("of $length mm: $value", async ({ length, value }) => {
    const findings = await findingsOf(breakThrough, panel(buildCapStud({ screw: { ...screw, length } })));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 10, severity: "stop", layerKey: "B", holeId: "h", limit: 15.7 });
      expect(finding.where).toEqual({ x: 300, y: 200 });
    }
  });

  it("says by how much, and whether it comes out", async () => {
    const textOf = async (length: number) =>
      (await findingsOf(breakThrough, panel(buildCapStud({ screw: { ...screw, length } }))))[0]?.text;
    expect(await textOf(19)).toBe(
      "No. 6 × 16, flat head in Standoff 15 × 12 of B, Layer B comes 16.5 mm into the wood; 15.7 mm is the most: 18 mm less 0.3 mm for sanding and 2 mm left under the point. It can show or bulge at the back.",
    );
    expect(await textOf(25)).toContain("It comes out at the back.");
  });

  it("keeps to what the shop leaves under a point", async () => {
    const sign = panel(buildCapStud());
    expect(await findingsOf(breakThrough, sign, { limits: { skinMm: 4.2 } })).toEqual([]);
    expect(await findingsOf(breakThrough, sign, { limits: { skinMm: 4.21 } })).toHaveLength(1);
    expect(await findingsOf(breakThrough, sign, { limits: { skinMm: 4.2, sandingMm: 0.31 } })).toHaveLength(1);
  });

  it("has its head on a plain floor, and comes less deep by it", async () => {
    const plain = { countersunk: false, screw: { ...screw, length: 20.2 } };
    expect(await findingsOf(breakThrough, panel(buildCapStud(plain)))).toEqual([]);
    expect(await findingsOf(breakThrough, panel(buildCapStud({ ...plain, countersunk: true })))).toHaveLength(1);
  });
});

// Washer 0.5, spacer 12, cast 3 mm sheet at its thinnest 2.3: a screw of 30.5 comes 15.7 deep.
describe("a screw through panel and spacer", () => {
  it.each([
    { length: 30.5, count: 0 },
    { length: 30.6, count: 1 },
  ])("of $length mm: $count", async ({ length, count }) => {
    const hardware = buildHardware("throughScrew", { screw: { ...screw, length } });
    const hold: Hold = { kind: "standoff", hardware, offset: 12.5, holes: [hole("h", 300, 200)] };
    expect(await findingsOf(breakThrough, on(hold))).toHaveLength(count);
  });

  it("comes less deep where its cap lies on a piece bonded to the panel", async () => {
    const hardware = buildHardware("throughScrew", { screw: { ...screw, length: 32 } });
    const hold: Hold = { kind: "standoff", hardware, offset: 12.5, holes: [hole("h", 300, 200)] };
    expect(await findingsOf(breakThrough, on(hold))).toHaveLength(1);
    const clad = buildSign([...on(hold).layers, buildLayer("C", [plate("badge", 60, 60, [300, 200])])]);
    expect(await findingsOf(breakThrough, clad)).toEqual([]);
  });
});

describe("a glued stud", () => {
  it.each([
    // Its hole is drilled 1 mm deeper: 26.7 − 12 + 1.
    { studLength: 26.7, count: 0 },
    { studLength: 26.8, count: 1 },
  ])("of $studLength mm: $count", async ({ studLength, count }) => {
    const findings = await findingsOf(breakThrough, panel(buildHardware("blindStud", { studLength })));
    expect(findings).toHaveLength(count);
    for (const { text } of findings) expect(text).toMatch(/^The hole for the stud of Hidden stud 10 × 12 of B/);
  });
});

describe("what a barrel stands on", () => {
  const raised = (hold: Hold) =>
    buildSign([
      buildLayer("B", [plate("under", 300, 200, [300, 200])], { hold }),
      buildLayer("C", [plate("panel", 200, 100, [300, 200])], {
        hold: standoffHold([hole("h", 300, 200)], buildCapStud({ screw: { ...screw, length: 19 } })),
      }),
    ]);

  it("a sheet between them keeps it from the back", async () => {
    // 19 − 2.5 − 3 = 13.5.
    expect(await findingsOf(breakThrough, raised(buildLayer("B", []).hold))).toEqual([]);
  });

  it("a sheet let in brings it nearer", async () => {
    // Its face lies 1 mm over the wood: 16.5 − 1 = 15.5; 0.7 mm over it: 15.8.
    expect(await findingsOf(breakThrough, raised(pocketHold(2)))).toEqual([]);
    expect(await findingsOf(breakThrough, raised(pocketHold(2.3)))).toMatchObject([{ value: 15.8 }]);
  });

  it("beside the board there is no wood to break", async () => {
    const sign = buildSign([
      buildLayer("B", [plate("panel", 200, 100, [600, 200])], {
        hold: standoffHold([hole("h", 650, 200)], buildCapStud({ screw: { ...screw, length: 40 } })),
      }),
    ]);
    expect(await findingsOf(breakThrough, sign)).toEqual([]);
  });
});
