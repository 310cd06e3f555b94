import { describe, expect, it } from "vitest";
import { load } from "#shared/dry-fit/rules/load.ts";
import type { Hardware, Hole, Layer, MockupDocument } from "#shared/mockup/document.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  standoffHold,
} from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

/** A panel of 900 by 600 by 10 mm weighs 6426 g, less 0.6 g a hole: 63 N, its middle 17 mm off the wood. */
const panel = (
  holes: Hole[],
  { hardware, rest = [], ...sign }: { hardware?: Hardware; rest?: Layer[] } & Partial<MockupDocument> = {},
) =>
  buildSign(
    [
      buildLayer("B", [plate("panel", 900, 600, [300, 200])], {
        thickness: 10,
        hold: standoffHold(holes, hardware ?? buildCapStud()),
      }),
      ...rest,
    ],
    sign,
  );

// No. 6 × 16, 13.5 mm deep in pine: 90.15 N along, 78.3 N across (fixing-allowable.test.ts).
describe("a panel on standoffs", () => {
  it("on one is pulled out of the wood: 63 N 17 mm off turn about half its barrel", async () => {
    const [finding, ...others] = await findingsOf(load, panel([hole("h", 300, 200)]));
    expect(others).toEqual([]);
    expect(finding).toMatchObject({ rule: 12, severity: "stop", pieceIds: ["panel"], unit: "N" });
    expect(finding?.value).toBeCloseTo((63.011 * 17) / 7.5, 1);
    expect(finding?.limit).toBeCloseTo(90.15, 1);
    expect(finding?.text).toBe(
      "B, Layer B and what is on it weighs 6.43 kg: that pulls at its upper standoff with 142.8 N, and 13.5 mm deep in this wood one may carry 90.1 N. Take more standoffs, longer screws or a lighter panel.",
    );
  });

  it("on two in a row is over a quarter of an unproven load: a caution that says why", async () => {
    const [finding, ...others] = await findingsOf(load, panel([hole("a", 200, 200), hole("b", 400, 200)]));
    expect(others).toEqual([]);
    expect(finding?.severity).toBe("caution");
    expect(finding?.value).toBeCloseTo(71.4, 1);
    expect(finding?.limit).toBeCloseTo(90.15 / 4, 1);
    expect(finding?.text).toContain(
      "No published load covers it: it is in the wood by 3.85 of its diameters, and none counts on fewer than 4. Try one on scrap.",
    );
  });

  it("on four corners asks little of each", async () => {
    const corners = [hole("a", 100, 50), hole("b", 500, 50), hole("c", 100, 350), hole("d", 500, 350)];
    expect(await findingsOf(load, panel(corners))).toEqual([]);
    // 15.75 N across each.
    const limits = { lateralDivisor: 9.9 };
    expect(await findingsOf(load, panel(corners), { limits })).toMatchObject([{ severity: "caution", value: 15.75 }]);
    const [over] = await findingsOf(load, panel(corners), { limits: { lateralDivisor: 10 } });
    expect(over).toMatchObject({ severity: "stop", value: 15.75 });
    expect(over?.text).toContain("that bears on each of 4 standoffs with 15.7 N");
  });

  it("in a proven depth has no caution", async () => {
    const deep = buildCapStud({ screw: { ...buildCapStud().screw, length: 17 } });
    const holes = [hole("a", 200, 200), hole("b", 400, 200)];
    expect(await findingsOf(load, panel(holes, { hardware: deep }))).toEqual([]);
  });

  it("carries what is bonded on it, and what is bonded on that", async () => {
    const rest = [
      buildLayer("C", [plate("on", 900, 600, [300, 200])], { thickness: 10 }),
      buildLayer("D", [disc("top", 100, [300, 200])], { thickness: 10 }),
    ];
    const [finding] = await findingsOf(load, panel([hole("h", 300, 200)], { rest }));
    // 12 851 g at 22 mm and 373.8 g at 37 mm.
    expect(finding?.value).toBeCloseTo((126.03 * 22 + 3.666 * 37) / 7.5, 0);
  });

  it("carries a panel that stands on it, but not one that stands on the board", async () => {
    const small = (x: number) =>
      buildLayer("C", [plate("small", 100, 100, [x, 200])], {
        thickness: 10,
        hold: standoffHold([hole("s", x, 200)], buildCapStud()),
      });
    const alone = (await findingsOf(load, panel([hole("h", 300, 200)])))[0]?.value ?? 0;
    const under = panel([hole("h", 300, 200)], { rest: [small(200)] });
    const more = (await findingsOf(load, under)).find(({ layerKey }) => layerKey === "B")?.value ?? 0;
    expect(more).toBeGreaterThan(alone + 2);
  });

  it("lying asks nothing", async () => {
    const hanging = { kind: "none" as const, gap: 0, pose: "lying" as const, carriesKg: null, points: [] };
    expect(await findingsOf(load, panel([hole("h", 300, 200)], { hanging }))).toEqual([]);
  });
});

describe("a screw that finds no wood", () => {
  it("beside the board is a stop, however light the panel", async () => {
    const sign = buildSign([
      buildLayer("B", [plate("p", 100, 60, [600, 200])], {
        hold: standoffHold([hole("in", 570, 200), hole("out", 630, 200)]),
      }),
    ]);
    expect(await findingsOf(load, sign)).toMatchObject([
      { severity: "stop", holeId: "out", value: null, where: { x: 630 } },
    ]);
  });

  it("too short for what it passes is a stop", async () => {
    const screw = { ...buildCapStud().screw, length: 12 };
    const throughScrew = buildHardware("throughScrew", { screw });
    const sign = buildSign([
      buildLayer("B", [plate("p", 100, 60, [300, 200])], {
        hold: { kind: "standoff", hardware: throughScrew, offset: 12.5, holes: [hole("h", 300, 200)] },
      }),
    ]);
    const [finding] = await findingsOf(load, sign);
    // 12 − 12.5 − 3.7, the sheet at its thickest.
    expect(finding).toMatchObject({ severity: "stop", value: -4.2, limit: 0 });
    expect(finding?.text).toContain("ends 4.2 mm short of the wood");
  });

  it("through a sheet into air is a stop", async () => {
    const sign = buildSign([
      buildLayer("B", [plate("under", 300, 200, [300, 200])], {
        hold: standoffHold([hole("a", 200, 150), hole("b", 400, 150), hole("c", 200, 250), hole("d", 400, 250)]),
      }),
      buildLayer("C", [plate("p", 100, 60, [300, 200])], { hold: standoffHold([hole("h", 300, 200)]) }),
    ]);
    // It stands 15 mm above the wood and is 13.5 long under its barrel.
    expect(await findingsOf(load, sign)).toMatchObject([{ layerKey: "C", value: -1.5 }]);
  });
});

it("a glued stud is called an estimate", async () => {
  const hardware = buildHardware("blindStud");
  const [finding] = await findingsOf(load, panel([hole("a", 200, 200), hole("b", 400, 200)], { hardware }));
  expect(finding?.text).toContain("it is glued, not screwed");
});
