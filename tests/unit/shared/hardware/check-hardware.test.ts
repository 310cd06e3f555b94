import { describe, expect, it } from "vitest";
import { checkHardware } from "#shared/hardware/check-hardware.ts";
import { standardHardware } from "#shared/materials/standard-stock.ts";
import type { Hardware } from "#shared/mockup/document.ts";

function ofKind<K extends Hardware["kind"]>(kind: K): Extract<Hardware, { kind: K }> {
  const found = standardHardware.find((one): one is Extract<Hardware, { kind: K }> => one.kind === kind);
  if (!found) throw new Error(`The usual list has no ${kind}.`);
  return found;
}
const capStud = ofKind("capStud");
const through = ofKind("throughScrew");
const blind = ofKind("blindStud");
const grip = ofKind("edgeGrip");
const fields = (hardware: Hardware) => checkHardware(hardware, "mm").map(({ path }) => path.join("."));

describe("a standoff whose measures agree", () => {
  it.each(standardHardware)("$name has no fault", (hardware) => expect(checkHardware(hardware, "mm")).toEqual([]));
});

describe("a standoff whose measures don't agree", () => {
  // The slim standoff: barrel 12 = bore 9.5 + floor 2.5, floor hole 4, screw 3.51 with a head of 7.09 in a bore of 7.5.
  it.each<{ what: string; hardware: Hardware; at: string }>([
    { what: "bore and floor make another length", hardware: { ...capStud, boreDepth: 10 }, at: "barrelLength" },
    { what: "the floor hole is too narrow", hardware: { ...capStud, floorHole: 3.4 }, at: "floorHole" },
    { what: "the head falls through the floor", hardware: { ...capStud, floorHole: 7.2 }, at: "floorHole" },
    { what: "the head does not go down", hardware: { ...capStud, boreDiameter: 7 }, at: "boreDiameter" },
    { what: "the stud does not go in", hardware: { ...capStud, studDiameter: 8 }, at: "boreDiameter" },
    { what: "the bore takes the whole barrel", hardware: { ...capStud, barrelDiameter: 7.5 }, at: "barrelDiameter" },
    { what: "the cap is no wider than the stud", hardware: { ...capStud, capDiameter: 5 }, at: "capDiameter" },
    {
      what: "the screw ends within the floor",
      hardware: { ...capStud, screw: { ...capStud.screw, length: 2.5 } },
      at: "floorThickness",
    },
    {
      what: "a pan head is countersunk",
      hardware: { ...capStud, screw: { ...capStud.screw, head: "pan" } },
      at: "countersunk",
    },
    { what: "the screw does not pass", hardware: { ...through, boreDiameter: 3.4 }, at: "boreDiameter" },
    {
      what: "the spacer is no wider than its bore",
      hardware: { ...through, barrelDiameter: 4.5 },
      at: "barrelDiameter",
    },
    {
      what: "the cap is smaller than the head",
      hardware: { ...through, cap: { diameter: 7, thickness: 2 } },
      at: "cap.diameter",
    },
    { what: "the screw ends in the spacer", hardware: { ...through, barrelLength: 38 }, at: "barrelLength" },
    { what: "the stud ends in the spacer", hardware: { ...blind, studLength: 6 }, at: "studLength" },
    { what: "the spacer is as thin as the stud", hardware: { ...blind, barrelDiameter: 4 }, at: "barrelDiameter" },
    { what: "the slot begins in the floor", hardware: { ...grip, floorThickness: 12.5 }, at: "barrelLength" },
    { what: "the front lies below the slot's end", hardware: { ...grip, height: 17 }, at: "height" },
    { what: "the slot is as deep as the holder", hardware: { ...grip, gripDepth: 16 }, at: "gripDepth" },
    { what: "a measure is absurd", hardware: { ...blind, studLength: 501 }, at: "studLength" },
    {
      what: "the screw's number and thickness disagree",
      hardware: { ...grip, screw: { ...grip.screw, gauge: 8 } },
      at: "screw.diameter",
    },
  ])("$what: said at $at", ({ hardware, at }) => expect(fields(hardware)).toContain(at));

  it("may be a hidden stud without a spacer, whose barrel says nothing", () => {
    expect(checkHardware({ ...blind, barrelLength: 0, barrelDiameter: 1 }, "mm")).toEqual([]);
  });

  it("is told in the unit that the shop reads", () => {
    const wrong = { ...capStud, boreDepth: 10 };
    expect(checkHardware(wrong, "mm")).toEqual([
      {
        path: ["barrelLength"],
        detail: "Bore and floor make 12.5 mm, the barrel is 12 mm. One of the three is wrong.",
      },
    ]);
    expect(checkHardware(wrong, "in")[0]?.detail).toBe(
      "Bore and floor make 0.492″, the barrel is 0.472″. One of the three is wrong.",
    );
  });
});
