import { describe, expect, it } from "vitest";
import { capOnLevel } from "#shared/dry-fit/rules/cap-on-level.ts";
import { grip } from "#shared/dry-fit/rules/grip.ts";
import type { Hardware, Layer, Piece } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  pocketHold,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const under = (hardware: Hardware = buildCapStud()) =>
  buildLayer("B", [plate("panel", 400, 200, [300, 200])], { hold: standoffHold([hole("h", 200, 200)], hardware) });
const over = (pieces: Piece[], overrides: Partial<Layer> = {}, hardware?: Hardware) =>
  buildSign([under(hardware), buildLayer("C", pieces, overrides)]);
/** A plate of 100 mm whose left edge lies that far right of the middle of the cap. */
const beside = (mm: number) => [plate("badge", 100, 60, [250 + mm, 200], { name: "Badge" })];

// Cap 15: it reaches 7.5 and asks for 0.5 more.
describe("a cap of 15 mm", () => {
  it.each([
    { edge: 8, notch: null },
    { edge: 7.9, notch: 0.1 },
    { edge: 0, notch: 8 },
    { edge: -7.4, notch: 15.4 },
    { edge: -7.5, notch: null },
    { edge: -20, notch: null },
  ])("with a bonded edge $edge mm right of its middle: $notch", async ({ edge, notch }) => {
    const findings = await findingsOf(capOnLevel, over(beside(edge)));
    expect(findings.map(({ value }) => value)).toEqual(notch === null ? [] : [notch]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 13, severity: "stop", layerKey: "B", holeId: "h", pieceIds: ["badge"] });
      expect(finding.where).toEqual({ x: 200, y: 200 });
    }
  });

  it("says what it meets, and both ways out", async () => {
    const [finding] = await findingsOf(capOnLevel, over(beside(2)));
    expect(finding?.text).toBe(
      "The 15 mm cap at a hole of B, Layer B does not clear Badge (C): tightened on a step it tilts, shows a gap and cracks the sheet. Move the hole, or notch it by 6 mm, 0.5 mm of that to clear it.",
    );
  });

  it("names a piece without a name by its layer, within the sentence", async () => {
    const [finding] = await findingsOf(capOnLevel, over([plate("badge", 100, 60, [252, 200])]));
    expect(finding?.text).toContain("does not clear a piece of C, Layer C: tightened");
  });

  it.each([
    { studLength: 11, way: "off the badge, where the stud still grips", x: [189, 190] },
    { studLength: 14.6, way: "onto the badge, which is nearer, where a longer stud grips there too", x: [205, 206.5] },
  ])("moves $way", async ({ studLength, x: [least = 0, most = 0] }) => {
    // The badge's edge lies 2 left of the middle: 5.5 to the right the cap of 15 lies on it wholly, 10 to the left it clears it.
    const sign = buildSign([
      buildLayer("B", [plate("panel", 400, 200, [300, 200])], {
        hold: standoffHold([hole("h", 200, 200)], buildCapStud({ studLength })),
        thickness: 5,
      }),
      buildLayer("C", beside(-2), { thickness: 3 }),
    ]);
    const { mended } = await triedMends(capOnLevel, sign);
    const [moved] = mended.flatMap(({ layers: [panel] }) => (panel?.hold.kind === "standoff" ? panel.hold.holes : []));
    expect(moved?.x).toBeGreaterThanOrEqual(least);
    expect(moved?.x).toBeLessThanOrEqual(most);
    expect(mended).toHaveLength(1);
    expect(await findingsOf(grip, mended[0] ?? sign)).toEqual([]);
  });

  it("keeps to the shop's clearance", async () => {
    expect(await findingsOf(capOnLevel, over(beside(8)), { limits: { capClearanceMm: 0.6 } })).toHaveLength(1);
  });

  it("may have the stud's hole in the piece that it lies on", async () => {
    const badge = plate("badge", 100, 60, [200, 200]);
    const drilled = { ...badge, path: [...badge.path, ...disc("x", 4, [0, 0]).path] };
    expect(await findingsOf(capOnLevel, over([drilled]))).toEqual([]);
    const wide = { ...badge, path: [...badge.path, ...disc("x", 7.6, [0, 0]).path] };
    expect(await findingsOf(capOnLevel, over([wide]))).toHaveLength(1);
  });

  it("stands on a small piece that is all under it", async () => {
    expect(await findingsOf(capOnLevel, over([disc("dot", 3, [200, 200])]))).toHaveLength(1);
  });

  it("lies on a badge, half on what is bonded on that", async () => {
    const sign = buildSign([
      under(),
      buildLayer("C", [plate("badge", 100, 60, [200, 200])]),
      buildLayer("D", [plate("on it", 100, 60, [250, 200])]),
    ]);
    expect(await findingsOf(capOnLevel, sign)).toMatchObject([{ pieceIds: ["on it"], value: 8 }]);
  });
});

describe("what is not bonded on the panel's face", () => {
  it("flush in it does not lift a cap; proud of it does", async () => {
    expect(await findingsOf(capOnLevel, over(beside(0), { hold: pocketHold(2.9), thickness: 2.9 }))).toEqual([]);
    expect(await findingsOf(capOnLevel, over(beside(0), { hold: pocketHold(2), thickness: 3 }))).toHaveLength(1);
  });

  // The cap is 3 mm thick.
  it.each([
    { barrelLength: 12, count: 0 },
    { barrelLength: 3, count: 0 },
    { barrelLength: 2.9, count: 1 },
  ])("raised $barrelLength mm over it leaves room or not", async ({ barrelLength, count }) => {
    const hold = standoffHold([hole("up", 350, 200)], buildCapStud({ barrelLength }), barrelLength);
    const findings = await findingsOf(capOnLevel, over([plate("raised", 320, 150, [320, 200])], { hold }));
    expect(findings.filter(({ layerKey }) => layerKey === "B")).toHaveLength(count);
    for (const { text } of findings) expect(text).toContain("stands higher than");
  });

  it("a barrel of another panel that stands beside it", async () => {
    const raised = (x: number) =>
      over([plate("raised", 320, 150, [320, 200])], { hold: standoffHold([hole("up", x, 200)], buildCapStud()) });
    expect(await findingsOf(capOnLevel, raised(215.6))).toEqual([]);
    const [finding] = await findingsOf(capOnLevel, raised(210));
    expect(finding).toMatchObject({ holeId: "h", pieceIds: [] });
    expect(finding?.text).toContain("does not clear a barrel of C:");
  });
});

describe("other fronts", () => {
  it("a screw's head without a cap is smaller", async () => {
    const bare = buildHardware("throughScrew", { cap: null });
    // Half of 7.0866 and 0.5.
    expect(await findingsOf(capOnLevel, over(beside(4.05), {}, bare))).toEqual([]);
    const [finding] = await findingsOf(capOnLevel, over(beside(4), {}, bare));
    expect(finding?.text).toMatch(/^The 7.09 mm head at/);
  });

  it("a stud has none", async () => {
    expect(await findingsOf(capOnLevel, over(beside(0), {}, buildHardware("blindStud")))).toEqual([]);
  });

  it("a grip takes the panel alone, so it may not lie on a piece either", async () => {
    const panelAtEdge = (width: number) =>
      buildSign([
        buildLayer("B", [plate("panel", 200, 100, [300, 200])], {
          thickness: 4.5,
          hold: standoffHold([hole("g", 197, 200)], buildHardware("edgeGrip")),
        }),
        buildLayer("C", [plate("clad", width, 90, [300, 200])]),
      ]);
    // The holder's middle lies 3 mm outside, it reaches 8 mm: from x 205.5 on a piece clears it.
    expect(await findingsOf(capOnLevel, panelAtEdge(189))).toEqual([]);
    expect(await findingsOf(capOnLevel, panelAtEdge(189.2))).toHaveLength(1);
    const [finding] = await findingsOf(capOnLevel, panelAtEdge(199));
    expect(finding?.text).toContain("it does not go over the edge there");
  });
});
