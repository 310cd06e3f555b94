import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { rules } from "#shared/dry-fit/index.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import type { Mend } from "#shared/dry-fit/mend.ts";
import type { RuleInput } from "#shared/dry-fit/rule.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { standardHardware, standardScrews } from "#shared/materials/standard-stock.ts";
import { documentSchema, type Hardware, type Hole, type Layer, type MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  standoffHold,
} from "../../../support/build-sign.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const inputOf = (document: MockupDocument, context: Partial<RuleInput["context"]> = {}): RuleInput => ({
  document,
  figures: computeFigures(document, kernel),
  limits: defaultLimits,
  context: { ...usualContext, ...context },
  kernel,
});
const ruleOf = (number: number) => {
  const rule = rules.find((one) => one.number === number);
  if (!rule) throw new Error(`There is no rule ${number}.`);
  return rule;
};

/** What a rule finds on a sign, each with its mends; every mend must do away with its finding and keep the document sound. */
function mended(document: MockupDocument, number: number): { finding: Finding; mends: readonly Mend[] }[] {
  const rule = ruleOf(number);
  const input = inputOf(document);
  return rule.check(input).map((finding) => {
    const mends = rule.mends?.(finding, input) ?? [];
    for (const mend of mends) {
      const after = documentSchema.parse(applyMend(document, mend));
      expect(after).not.toEqual(document);
      const left = rule.check(inputOf(after)).filter((one) => subject(one) === subject(finding));
      expect(left, `${mend.label} should mend: ${finding.text}`).toEqual([]);
    }
    return { finding, mends };
  });
}

const subject = ({ layerKey, holeId, pieceIds, unit }: Finding) => JSON.stringify([layerKey, holeId, pieceIds, unit]);
const labels = (document: MockupDocument, number: number) =>
  mended(document, number).map(({ mends }) => mends.map(({ label }) => label));

const panel = (holes: Hole[], hardware: Hardware = buildCapStud(), rest: Partial<Layer> & { offset?: number } = {}) => {
  const { offset, ...layer } = rest;
  return buildLayer("B", [plate("panel", 400, 200, [300, 200])], {
    thickness: 4.5,
    hold: standoffHold(holes, hardware, offset),
    ...layer,
  });
};
const screwOf = (length: number) => {
  const screw = standardScrews.find((one) => one.length === length);
  if (!screw) throw new Error(`No screw of ${length} mm.`);
  return screw;
};

describe("6, a hole beside its window", () => {
  it("grows or shrinks into it, to a tenth", () => {
    const sign = buildSign([
      panel([hole("f", 300, 200, { fixed: true, diameter: 5 }), hole("h", 400, 200, { diameter: 12 })]),
    ]);
    expect(labels(sign, 6)).toEqual([["Make the hole 6 mm wide"], ["Make the hole 9 mm wide"]]);
  });

  it("without a window gets one from a fixed hole nearer by", () => {
    // 280 mm across the grain are 2.77 mm, 1.5 is what a cap of 15 hides; from the middle 1.0 mm at the most.
    const corners = [hole("a", 80, 60, { fixed: true }), hole("b", 520, 60), hole("c", 80, 340), hole("d", 520, 340)];
    const large = { pieces: [plate("panel", 500, 340, [300, 200])] };
    const sign = buildSign([panel([...corners, hole("m", 300, 200)], buildCapStud(), large)]);
    expect(
      labels(sign, 6).filter((mends) => mends[0] === "Make the hole nearest the middle the fixed one"),
    ).toHaveLength(2);
  });

  it("without a window gets one from hardware that covers more", () => {
    // 200 mm across the grain are 1.98 mm; a cap of 19 hides 2.25.
    const sign = buildSign([
      panel([hole("f", 300, 120, { fixed: true, diameter: 6 }), hole("h", 300, 320)], buildCapStud(), {
        pieces: [plate("panel", 400, 300, [300, 200])],
      }),
    ]);
    expect(labels(sign, 6)).toEqual([["Take Standoff 19 × 12"]]);
  });
});

describe("7 and 13, a hole in a wrong place", () => {
  it("comes in from the edge", () => {
    const sign = buildSign([panel([hole("h", 104, 200, { fixed: true })])]);
    expect(labels(sign, 7)).toEqual([["Move it by 12 mm"]]);
  });

  it("comes off a step, but not over an edge or another hole", () => {
    const sign = buildSign([
      panel([hole("h", 140, 133), hole("other", 175, 130, { fixed: true })]),
      buildLayer("C", [plate("badge", 200, 120, [235, 200])]),
    ]);
    const [found] = mended(sign, 13);
    expect(found?.mends).toHaveLength(1);
    const input = inputOf(applyMend(sign, found?.mends[0] ?? { label: "", steps: [] }));
    expect(ruleOf(7).check(input)).toEqual([]);
    expect(ruleOf(14).check(input)).toEqual([]);
    expect(
      ruleOf(6)
        .check(input)
        .filter(({ holeId }) => holeId === "h"),
    ).toEqual([]);
  });

  it("stays where nothing near by is better", () => {
    const small = buildLayer("B", [plate("panel", 30, 30, [300, 200])], { hold: standoffHold([hole("h", 300, 200)]) });
    expect(labels(buildSign([small]), 7)).toEqual([[]]);
  });

  it("of an edge grip goes to the edge", () => {
    const sign = buildSign([panel([hole("g", 80, 200)], buildHardware("edgeGrip"))]);
    expect(labels(sign, 7)[0]).toHaveLength(1);
  });
});

describe("8, a standoff that does not grip", () => {
  it("offset goes to the barrel, or a barrel comes to the offset", () => {
    const sign = buildSign([panel([hole("h", 300, 200)], buildCapStud(), { offset: 18 })]);
    expect(labels(sign, 8)).toEqual([["Set it 12 mm off", "Take Standoff 15 × 19"]]);
  });

  it("stud is changed for one that is long enough", () => {
    const sign = buildSign([panel([hole("h", 300, 200)], buildCapStud({ studLength: 8 }))]);
    expect(labels(sign, 8)).toEqual([["Take Standoff 15 × 12"]]);
  });

  it("barrel whose measures don't add up is changed", () => {
    const sign = buildSign([panel([hole("h", 300, 200)], buildCapStud({ boreDepth: 9 }))]);
    expect(labels(sign, 8)[0]).toEqual(["Take Standoff 15 × 12"]);
  });

  it("slot is changed for one that takes the sheet, and a holder moved to its edge", () => {
    const sign = buildSign([panel([hole("g", 97, 200)], buildHardware("edgeGrip"), { thickness: 6 })]);
    expect(labels(sign, 8)).toEqual([["Take Edge grip 16 × 12, 6 mm sheet"]]);
    const far = buildSign([panel([hole("g", 93, 200)], buildHardware("edgeGrip"))]);
    expect(labels(far, 8)[0]).toHaveLength(1);
  });

  it("has none for a piece without a standoff", () => {
    expect(labels(buildSign([panel([])]), 8)).toEqual([[]]);
  });
});

describe("9, 10 and 12, a wrong screw", () => {
  it("that does not go in is changed for one that does", () => {
    const thick = { ...screwOf(16), name: "No. 10", gauge: 10, diameter: 4.83, headDiameter: 9.8 };
    const sign = buildSign([panel([hole("h", 300, 200)], buildCapStud({ screw: thick }))]);
    for (const mends of labels(sign, 9)) expect(mends).toEqual(["Take No. 6 × 16, flat head", "Take Standoff 15 × 12"]);
  });

  it("that breaks through is changed for the next one down", () => {
    for (const length of [19, 25, 45]) {
      const sign = buildSign([panel([hole("h", 300, 200)], buildCapStud({ screw: screwOf(length) }))]);
      expect(labels(sign, 10)).toEqual([["Take No. 6 × 16, flat head"]]);
    }
  });

  it("without a number is changed for one of its thickness", () => {
    const screw = { ...screwOf(25), gauge: null, diameter: 3.5, name: "3.5 × 25" };
    expect(labels(buildSign([panel([hole("h", 300, 200)], buildCapStud({ screw }))]), 10)).toEqual([
      ["Take No. 6 × 16, flat head"],
    ]);
    const thick = { ...screw, diameter: 4 };
    expect(labels(buildSign([panel([hole("h", 300, 200)], buildCapStud({ screw: thick }))]), 10)).toEqual([
      ["Take Standoff 15 × 12"],
    ]);
  });

  it("that ends short of the wood is changed for one that reaches it", () => {
    const hardware = buildHardware("throughScrew", { screw: screwOf(12) });
    const sign = buildSign([panel([hole("h", 300, 200)], hardware, { offset: 12.5 })]);
    expect(labels(sign, 12)).toEqual([["Take No. 6 × 25, flat head"]]);
  });
});

describe("14 to 16", () => {
  it("a foot beside the wood moves onto it", () => {
    const over = buildLayer("B", [plate("panel", 300, 200, [600, 200])], { hold: standoffHold([hole("h", 598, 200)]) });
    expect(labels(buildSign([over]), 14)[0]).toHaveLength(1);
  });

  it("a panel that gives way gets the next thicker sheet that does not", () => {
    const four = [hole("a", 240, 140), hole("b", 360, 140), hole("c", 240, 260), hole("d", 360, 260)];
    const sign = buildSign([panel(four, buildCapStud(), { thickness: 3 })]);
    expect(labels(sign, 15)).toEqual([["Take 6 mm sheet"]]);
  });

  it("the hole nearest the middle becomes the fixed one", () => {
    for (const fixed of [[], ["a", "c"]]) {
      const holes = ["a", "b", "c"].map((id, index) => hole(id, 200 + 90 * index, 200, { fixed: fixed.includes(id) }));
      expect(labels(buildSign([panel(holes)]), 16)).toEqual([["Make the hole nearest the middle the fixed one"]]);
    }
  });
});

it("whatever the sign, what a mend is for is gone after it, and the document is sound", () => {
  const x = fc.integer({ min: 90, max: 510 });
  const y = fc.integer({ min: 90, max: 310 });
  const holes = fc.array(fc.record({ x, y, diameter: fc.integer({ min: 3, max: 14 }), fixed: fc.boolean() }), {
    minLength: 1,
    maxLength: 4,
  });
  const screw = fc.constantFrom(...standardScrews);
  const hardware = fc
    .tuple(fc.constantFrom(...standardHardware), screw, fc.integer({ min: -3, max: 3 }))
    .map(([one, other, more]): Hardware => {
      if (one.kind === "capStud") return { ...one, screw: other, studLength: one.studLength + more };
      return one.kind === "blindStud" ? { ...one, studLength: one.studLength + more } : { ...one, screw: other };
    });
  const badges = fc.array(fc.record({ x, y, radius: fc.integer({ min: 5, max: 40 }) }), { maxLength: 3 });
  const offset = fc.option(fc.integer({ min: 0, max: 30 }), { nil: undefined });
  let offered = 0;
  fc.assert(
    fc.property(holes, hardware, badges, offset, fc.constantFrom(3, 4.5, 6), (drilled, kind, on, held, thickness) => {
      const sign = buildSign([
        panel(
          drilled.map((one, index) => ({ id: `h${index}`, ...one })),
          kind,
          held === undefined ? { thickness } : { thickness, offset: held },
        ),
        buildLayer(
          "C",
          on.map((one, index) => disc(`badge-${index}`, one.radius, [one.x, one.y])),
        ),
      ]);
      for (const number of [6, 7, 8, 9, 10, 12, 13, 14, 15, 16]) {
        for (const { mends } of mended(sign, number)) offered += mends.length;
      }
    }),
    { numRuns: 60 },
  );
  expect(offered).toBeGreaterThan(60);
});
