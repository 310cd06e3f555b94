import { describe, expect, it } from "vitest";
import { dryingHoursOfSign } from "#shared/bonds/drying-hours-of-sign.ts";
import type { Coat } from "#shared/mockup/document.ts";
import { bondHold, buildLayer, buildSign, pocketHold } from "../../../support/build-sign.ts";

const coats: Coat[] = [
  { kind: "conditioner", name: "Conditioner", dryingHours: 2 },
  { kind: "other", name: "Wax", dryingHours: 12 },
];
const sign = (finish: Coat[], holds: (typeof bondHold)[]) => {
  const built = buildSign(holds.map((hold, index) => buildLayer("BCD"[index] ?? "E", [], { hold })));
  return { ...built, backer: { ...built.backer, finish } };
};

// Hours of the families are shared/bonds/adhesive-families.ts: tape 72 to full strength.
describe("a sign dries", () => {
  it("coat after coat", () => {
    expect(dryingHoursOfSign(sign(coats, []))).toBe(14);
  });

  it("then its slowest bond, bonds side by side", () => {
    expect(dryingHoursOfSign(sign(coats, [bondHold, pocketHold(1), bondHold]))).toBe(86);
  });

  it("not at all when nothing is coated or bonded", () => {
    expect(dryingHoursOfSign(sign([], []))).toBe(0);
  });
});
