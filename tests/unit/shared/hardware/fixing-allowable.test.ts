import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fixingAllowable } from "#shared/hardware/fixing-allowable.ts";
import type { Hardware, Wood } from "#shared/mockup/document.ts";
import { buildCapStud, buildHardware } from "../../../support/build-sign.ts";
import { resultOf } from "../../../support/reference-data.ts";

const pine = { gravity: 0.35, hardness: "softwood" } as const;
const usual = { lateral: 2, withdrawal: 5.5 };
const of = (hardware: Hardware, inWood: number, wood: Pick<Wood, "gravity" | "hardness"> = pine, divisors = usual) =>
  resultOf(fixingAllowable(hardware, wood, inWood, divisors));

const stud = buildCapStud();
// No. 6 is 3.5052 mm thick (ASME B18.6.1), two thirds of its 16 mm are thread: 10.667 mm.
describe("what a No. 6 × 16 may carry in pine", () => {
  it.each([
    // 23.17 · 3.5052² · depth/(7 D)/2; 108.25 · 0.35² · 3.5052 · thread/5.5.
    { inWood: 13.5, lateralN: 78.31, withdrawalN: 90.15, unproven: ["shallow"] },
    { inWood: 14.03, lateralN: 81.39, withdrawalN: 90.15, unproven: [] },
    { inWood: 5, lateralN: 29.0, withdrawalN: 42.26, unproven: ["shallow"] },
    { inWood: 0, lateralN: 0, withdrawalN: 0, unproven: [] },
    { inWood: -2, lateralN: 0, withdrawalN: 0, unproven: [] },
  ])("$inWood mm deep: $lateralN N across, $withdrawalN N along", ({ inWood, lateralN, withdrawalN, unproven }) => {
    const got = of(stud, inWood);
    expect(got.lateralN).toBeCloseTo(lateralN, 1);
    expect(got.withdrawalN).toBeCloseTo(withdrawalN, 1);
    expect(got.unproven).toEqual(unproven);
  });

  it("is divided by what the shop says", () => {
    const twice = of(stud, 14.03, pine, { lateral: 4, withdrawal: 11 });
    expect(twice.lateralN).toBeCloseTo(81.39 / 2, 1);
    expect(twice.withdrawalN).toBeCloseTo(90.15 / 2, 1);
  });

  it("is an estimate for sizes that the list does not have, and the nearest number stands for none", () => {
    const with8 = { ...stud.screw, gauge: 8, length: 12.7 };
    // The list has No. 1 to 6 at half an inch.
    expect(of({ ...stud, screw: with8 }, 14.03).unproven).toEqual(["size"]);
    expect(of({ ...stud, screw: { ...with8, gauge: 6 } }, 14.03).unproven).toEqual([]);
    expect(of({ ...stud, screw: { ...with8, gauge: null, diameter: 3.5 } }, 14.03).unproven).toEqual([]);
    expect(of({ ...stud, screw: { ...with8, gauge: null, diameter: 4.2 } }, 17).unproven).toEqual(["size"]);
  });
});

describe("wood beside the table", () => {
  it("that is heavier carries what the heaviest does; one that is lighter less, as an estimate", () => {
    expect(of(stud, 20, { gravity: 0.6, hardness: "softwood" }).lateralN).toBeCloseTo(
      of(stud, 20, { gravity: 0.52, hardness: "softwood" }).lateralN,
      9,
    );
    const light = of(stud, 20, { gravity: 0.145, hardness: "softwood" });
    const least = of(stud, 20, { gravity: 0.29, hardness: "softwood" });
    expect(light.lateralN).toBeCloseTo(least.lateralN / 2, 9);
    expect(light.withdrawalN).toBeCloseTo(least.withdrawalN / 4, 9);
    expect([light.unproven, least.unproven]).toEqual([["light wood"], []]);
  });
});

it("a glued stud carries what a screw of its thickness with thread all along would, as an estimate", () => {
  const glued = of(buildHardware("blindStud", { studDiameter: 4, studLength: 26 }), 14);
  expect(glued.lateralN).toBeCloseTo((23.17 * 16 * (14 / 28)) / 2, 6);
  expect(glued.withdrawalN).toBeCloseTo((108.25 * 0.35 ** 2 * 4 * 14) / 5.5, 6);
  expect(glued.unproven).toContain("glued stud");
});

it("deeper never carries less", () => {
  const mm = fc.double({ min: 0.1, max: 60, noNaN: true });
  fc.assert(
    fc.property(mm, mm, fc.double({ min: 0.1, max: 1.2, noNaN: true }), (inWood, more, gravity) => {
      const wood = { gravity, hardness: "hardwood" } as const;
      const [less, deeper] = [of(stud, inWood, wood), of(stud, inWood + more, wood)];
      expect(deeper.lateralN).toBeGreaterThanOrEqual(less.lateralN);
      expect(deeper.withdrawalN).toBeGreaterThanOrEqual(less.withdrawalN);
    }),
  );
});
