import { describe, expect, it } from "vitest";
import { breakThrough } from "#shared/dry-fit/rules/break-through.ts";
import { load } from "#shared/dry-fit/rules/load.ts";
import { onlySlat } from "#shared/dry-fit/rules/only-slat.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { Hardware, Slats } from "#shared/mockup/document.ts";
import { buildCapStud, buildHardware, buildLayer, hole, plate, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";
import { buildSlatSign } from "../../../../support/slat-sign.ts";

const { screw } = buildCapStud();
const screwed = (length: number): Hardware => buildCapStud({ screw: { ...screw, length } });
/** On the middle of the sixth slat from below, which lies from y 160 to 200. */
const panel = (hardware: Hardware, slats: Partial<Slats> = {}, y = 180) =>
  buildSlatSign(slats, [
    buildLayer("B", [plate("panel", 200, 100, [300, y])], { hold: standoffHold([hole("h", 300, y)], hardware) }),
  ]);

// Through a countersunk floor of 2.5 mm and a slat of 9 mm a screw of L comes L − 11.5 into the substrate.
describe("a screw through a slat", () => {
  it.each([
    { length: 17.5, value: null },
    { length: 17.4, value: 5.9 },
    { length: 16, value: 4.5 },
    { length: 10, value: -1.5 },
  ])("of $length mm: $value", async ({ length, value }) => {
    const findings = await findingsOf(onlySlat, panel(screwed(length)));
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 11, severity: "stop", layerKey: "B", holeId: "h", limit: 6, unit: "mm" });
      expect(finding.where).toEqual({ x: 300, y: 180 });
    }
  });

  it("says how far it comes, and when it does not come there", async () => {
    const textOf = async (length: number) => (await findingsOf(onlySlat, panel(screwed(length))))[0]?.text;
    expect(await textOf(16)).toBe(
      "No. 6 × 16, flat head in Standoff 15 × 12 of B, Layer B comes 4.5 mm past the slat; 6 mm into the substrate is the least. Only glue holds a slat: the load pulls it off.",
    );
    expect(await textOf(10)).toContain("ends 1.5 mm short of the substrate;");
  });

  it("keeps to what the shop asks of it, and to the slats' thickness", async () => {
    expect(await findingsOf(onlySlat, panel(screwed(16)), { limits: { slatHoldMm: 4.5 } })).toEqual([]);
    expect(await findingsOf(onlySlat, panel(screwed(16)), { limits: { slatHoldMm: 4.51 } })).toHaveLength(1);
    expect(await findingsOf(onlySlat, panel(screwed(16), { thickness: 7.5 }))).toEqual([]);
    expect(await findingsOf(onlySlat, panel(screwed(16), { thickness: 7.6 }))).toHaveLength(1);
  });

  it("is no matter on a plank", async () => {
    const sign = panel(screwed(10));
    expect(await findingsOf(onlySlat, { ...sign, backer: { ...sign.backer, slats: null } })).toEqual([]);
  });

  it("a glued stud is held to it too", async () => {
    // 26 − 12 − 9 = 5.
    const stud = (studLength: number) => panel(buildHardware("blindStud", { studLength }));
    expect(await findingsOf(onlySlat, stud(26))).toMatchObject([{ value: 5 }]);
    expect(await findingsOf(onlySlat, stud(27))).toEqual([]);
  });

  it("one stop stands for a layer, at its shallowest", async () => {
    const sign = buildSlatSign({}, [
      buildLayer("B", [plate("raised", 60, 60, [200, 180])]),
      buildLayer("C", [plate("p", 60, 60, [200, 180]), plate("q", 60, 60, [400, 180])], {
        hold: standoffHold([hole("high", 200, 180), hole("low", 400, 180)], screwed(16)),
      }),
    ]);
    // Over a 3 mm sheet: 16 − 2.5 − 3 − 9.
    expect(await findingsOf(onlySlat, sign)).toMatchObject([{ holeId: "high", value: 1.5 }]);
  });
});

describe("the screw that is offered instead", () => {
  const stocked = (...lengths: number[]) => ({
    context: {
      stock: { ...standardStock, screws: lengths.map((length) => ({ ...screw, name: `${length} mm`, length })) },
    },
  });

  it("reaches and does not break through", async () => {
    // It may open 9 + 12 − 0.3 − 2 = 18.7, so up to 21.2 of it; 17.5 at the least.
    const offered = async (...lengths: number[]) =>
      (await triedMends(onlySlat, panel(screwed(16)), stocked(...lengths))).labels;
    expect(await offered(12, 17, 18, 20, 25)).toEqual([["Take 20 mm"]]);
    expect(await offered(12, 17.4, 21.3)).toEqual([[]]);
    const { mended } = await triedMends(onlySlat, panel(screwed(16)), stocked(21.2));
    expect(mended).toHaveLength(1);
    for (const document of mended) expect(await findingsOf(breakThrough, document)).toEqual([]);
  });

  it("does not end in the slat for one that breaks through", async () => {
    const { labels } = await triedMends(breakThrough, panel(screwed(30)), stocked(12, 16));
    expect(labels).toEqual([[]]);
    expect((await triedMends(breakThrough, panel(screwed(30)), stocked(12, 18))).labels).toEqual([["Take 18 mm"]]);
  });
});

describe("on slats", () => {
  it.each([
    { length: 21.2, count: 0 },
    { length: 21.3, count: 1 },
  ])("a screw of $length mm breaks through slat and substrate together: $count", async ({ length, count }) => {
    const findings = await findingsOf(breakThrough, panel(screwed(length)));
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding).toMatchObject({ limit: 18.7 });
      expect(finding.text).toContain("18.7 mm is the most: 21 mm less 0.3 mm for sanding");
    }
  });

  it("only what is in the substrate carries, and what ends in the slat is not told twice", async () => {
    expect(await findingsOf(load, panel(screwed(11)))).toEqual([]);
    const heavy = { limits: { unprovenLoadShare: 0, withdrawalDivisor: 20, lateralDivisor: 20 } };
    const [finding] = await findingsOf(load, panel(screwed(16)), heavy);
    expect(finding?.text).toContain("4.5 mm deep in this substrate");
  });
});
