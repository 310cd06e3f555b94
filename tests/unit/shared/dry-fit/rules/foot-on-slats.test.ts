import { describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { breakThrough } from "#shared/dry-fit/rules/break-through.ts";
import { footOnWood } from "#shared/dry-fit/rules/foot-on-wood.ts";
import { holeWindow } from "#shared/dry-fit/rules/hole-window.ts";
import { unsupported } from "#shared/dry-fit/rules/unsupported.ts";
import { woodAt, woodGround } from "#shared/dry-fit/wood-at.ts";
import type { Slats } from "#shared/mockup/document.ts";
import { slatsOf } from "#shared/stack/backer.ts";
import { bradsOf } from "#shared/stack/brads-of.ts";
import { buildCapStud, buildLayer, buildSign, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf, inputOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";
import { resultOf } from "../../../../support/reference-data.ts";
import { buildSlatSign } from "../../../../support/slat-sign.ts";

/** With gaps of 5 slats repeat every 45 mm: from below 0 to 40, 45 to 85 …, so a gap lies at y 355 to 360, its middle at 357.5. */
const panel = (y: number, slats: Partial<Slats> = { gap: 5 }) =>
  buildSlatSign(slats, [
    buildLayer("B", [plate("panel", 200, 100, [300, 320])], { hold: standoffHold([hole("h", 300, y)]) }),
  ]);

// A foot of 15 clears a joint of 5 from (15 + 5)/2 = 10 mm on.
describe("a barrel's foot beside an open joint", () => {
  it.each([
    { y: 347.5, value: null },
    { y: 347.6, value: 9.9 },
    { y: 350, value: 7.5 },
  ])("with its middle at $y: $value", async ({ y, value }) => {
    const findings = await findingsOf(footOnWood, panel(y));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 14, severity: "caution", holeId: "h", limit: 10, unit: "mm" });
      expect(finding.text).toContain("over an open joint between slats");
    }
  });

  it("over its middle stands with too little on wood", async () => {
    // The disc of 15 without a band of 5 through its middle: 58.1 % of it (closed form of a circle's segments).
    const [finding] = await findingsOf(footOnWood, panel(357.5));
    expect(finding).toMatchObject({ unit: "%", limit: 80 });
    expect(finding?.value ?? 0).toBeCloseTo(58.1, 0);
  });

  it("clears all joints of slats that are laid close", async () => {
    expect(await findingsOf(footOnWood, panel(360, { gap: 0 }))).toEqual([]);
  });

  it("is moved off it", async () => {
    const { labels, mended } = await triedMends(footOnWood, panel(350));
    expect(labels).toEqual([[expect.stringMatching(/^Move it by /)]]);
    expect(mended).toHaveLength(1);
  });
});

it("brads give way to barrels by the shop's distance", async () => {
  const kernel = await loadKernel();
  const nearest = async (x: number, barrel: number) => {
    const sign = buildSlatSign({}, [
      buildLayer("B", [plate("panel", 200, 100, [300, 180])], { hold: standoffHold([hole("h", x, 180)]) }),
    ]);
    const layout = slatsOf(sign, kernel);
    if (!layout) throw new Error("There are slats.");
    const { brads } = resultOf(bradsOf(sign, resultOf(layout), { trim: 15, barrel }, kernel));
    const own = brads.filter(({ y }) => Math.abs(y - 180) < 1);
    expect(own.length).toBeGreaterThan(3);
    return { own, least: Math.min(...own.map((brad) => Math.hypot(brad.x - x, brad.y - 180))) };
  };
  const { own } = await nearest(10_000, 10);
  for (const { x } of own) {
    expect((await nearest(x, 10)).least).toBeGreaterThanOrEqual(10);
    expect((await nearest(x, 25)).least).toBeGreaterThanOrEqual(25);
  }
});

it("wall fixings that pass the board keep brads off too", async () => {
  const kernel = await loadKernel();
  const sign = buildSlatSign();
  const at = { x: 300, y: 180 };
  const hung = (kind: "screwed through" | "cleat") => ({ ...sign, hanging: { ...sign.hanging, kind, points: [at] } });
  const layout = slatsOf(sign, kernel);
  if (!layout) throw new Error("There are slats.");
  const near = (kind: "screwed through" | "cleat") =>
    resultOf(bradsOf(hung(kind), resultOf(layout), { trim: 15, barrel: 80 }, kernel)).brads.filter(
      ({ x, y }) => Math.hypot(x - at.x, y - at.y) < 80,
    );
  expect(near("screwed through")).toEqual([]);
  expect(near("cleat").length).toBeGreaterThan(0);
});

describe("on slats", () => {
  it("the wood under a gap is the substrate's", async () => {
    const input = await inputOf(panel(347.5), {});
    const under = (y: number) => woodAt(input, woodGround(input), { x: 300, y });
    expect(under(340)).toEqual({ face: 20.7, top: 20.7, slat: 9, substrate: 12 });
    expect(under(357.5)).toEqual({ face: 20.7, top: 12, slat: 9, substrate: 12 });
    expect(under(401)).toBeNull();
  });

  it("a screw in a gap may come as deep below the face as one in a slat", async () => {
    const { screw } = buildCapStud();
    const at = (y: number) =>
      buildSlatSign({ gap: 5 }, [
        buildLayer("B", [plate("panel", 200, 100, [300, 320])], {
          hold: standoffHold([hole("h", 300, y)], buildCapStud({ screw: { ...screw, length: 22 } })),
        }),
      ]);
    expect(await findingsOf(breakThrough, at(357.5))).toEqual(
      (await findingsOf(breakThrough, at(340))).map((finding) => ({ ...finding, where: { x: 300, y: 357.5 } })),
    );
  });

  it("a panel moves against the substrate, not the slats", async () => {
    const holes = [hole("fixed", 150, 180, { fixed: true }), hole("far", 450, 180, { diameter: 5.5 })];
    const layers = [buildLayer("B", [plate("panel", 340, 60, [300, 180])], { hold: standoffHold(holes) })];
    const onPlank = buildSign(layers);
    const turned = (document: typeof onPlank) => ({ ...document, backer: { ...document.backer, grainTurn: 90 } });
    const limitsOf = async (document: typeof onPlank) =>
      (await findingsOf(holeWindow, turned(document))).map(({ holeId, limit }) => [holeId, limit]);
    const found = await limitsOf(buildSlatSign({}, layers));
    expect(found.map(([id]) => id)).toContain("far");
    expect(found).toEqual(await limitsOf(onPlank));
  });

  it.each([
    // A strip of gap of 5 in a piece of 30 is 16.7 % of it, in one of 60 8.3 %.
    { height: 30, count: 1 },
    { height: 60, count: 0 },
  ])("a piece $height mm high over a gap has too little under it: $count", async ({ height, count }) => {
    const sign = buildSlatSign({ gap: 5 }, [buildLayer("B", [plate("p", 100, height, [300, 357.5])])]);
    const findings = await findingsOf(unsupported, sign);
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding.value).toBeCloseTo(16.67, 2);
  });
});
