import { describe, expect, it } from "vitest";
import { limitsSchema } from "#shared/dry-fit/limits.ts";
import type { Hold } from "#shared/mockup/document.ts";
import { capCovers, capCoversOf } from "@/features/mockup/model/cap-covers.ts";
import { buildCapStud, buildHardware, buildLayer, buildSign, plate } from "../../../../../support/build-sign.ts";

const limits = limitsSchema.parse({ coverMm: 1 });
const hole = (diameter: number) => ({ id: "h", x: 50, y: 60, diameter, fixed: true });
const held = (hardware: Extract<Hold, { kind: "standoff" }>["hardware"], diameter: number) =>
  ({ kind: "standoff", hardware, offset: 12, holes: [hole(diameter)] }) as const satisfies Hold;

/** By hand: a hole lying hard over to one side of a 5 mm stud has its far edge at d − 2.5 mm from the stud's middle. */
describe("how far cap and barrel reach over a hole's edge", () => {
  const stud = buildCapStud({ studDiameter: 5, capDiameter: 15, barrelDiameter: 15 });

  it.each([
    { diameter: 5, reach: 5, isEnough: true },
    { diameter: 9, reach: 1, isEnough: true },
    { diameter: 9.5, reach: 0.5, isEnough: false },
    { diameter: 11, reach: -1, isEnough: false },
  ])("Ø $diameter under a Ø 15 cap: $reach mm", ({ diameter, reach, isEnough }) => {
    const [cover] = capCovers(held(stud, diameter), limits);
    expect(cover).toMatchObject({ id: "h", x: 50, y: 60, hole: diameter, cap: 15, isEnough });
    expect(cover?.reach).toBeCloseTo(reach, 9);
  });

  it("is the barrel's where that is narrower than the cap", () => {
    const narrow = buildCapStud({ studDiameter: 5, capDiameter: 15, barrelDiameter: 11 });
    expect(capCovers(held(narrow, 6), limits)[0]?.reach).toBeCloseTo(2, 9);
  });

  it("is nothing where nothing passes the panel", () => {
    expect(capCovers(held(buildHardware("blindStud"), 6), limits)).toEqual([]);
    expect(capCovers(held(buildHardware("edgeGrip"), 6), limits)).toEqual([]);
  });

  it("is asked for of a layer that is seen and stands off", () => {
    const layer = buildLayer("B", [plate("b", 100, 100, [50, 60])], { hold: held(stud, 6) });
    expect(capCoversOf(buildSign([layer]), "B", limits)).toHaveLength(1);
    expect(capCoversOf(buildSign([{ ...layer, hidden: true }]), "B", limits)).toEqual([]);
    expect(capCoversOf(buildSign([layer]), null, limits)).toEqual([]);
  });
});
