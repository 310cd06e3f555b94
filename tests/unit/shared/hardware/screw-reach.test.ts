import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  type Driven,
  leastHoldMm,
  longestScrew,
  reachRoom,
  screwReach,
  usualWood,
} from "#shared/hardware/screw-reach.ts";
import { resultOf } from "../../../support/reference-data.ts";

const panel = { nominal: 5, least: 4.1, most: 5.9 };
const pointOf = (driven: Driven) => resultOf(screwReach(driven)).point;

// Arithmetic, and common practice for how heads are measured.
describe("how deep a fixing comes into the wood", () => {
  it.each([
    { seat: "flat in a countersunk floor", point: 13.5 },
    { seat: "flat on a plain floor", point: 11.44 },
    { seat: "pan or round", point: 13.5 },
  ] as const)("a 16 mm screw with its head $seat of 2.5 mm: $point", ({ seat, point }) => {
    for (const kind of ["capStud", "edgeGrip"] as const) {
      const got = pointOf({ kind, length: 16, floor: 2.5, seat, headHeight: 2.06 });
      for (const depth of [got.nominal, got.least, got.most]) expect(depth).toBeCloseTo(point, 9);
    }
  });

  it("a screw through panel and spacer comes deepest with the thinnest sheet", () => {
    const got = pointOf({ kind: "throughScrew", length: 40, washer: 1, panel, spacer: 19 });
    expect(got.nominal).toBeCloseTo(15, 9);
    expect(got.least).toBeCloseTo(14.1, 9);
    expect(got.most).toBeCloseTo(15.9, 9);
  });

  it("a blind stud's hole is drilled 1 mm deeper than the stud", () => {
    const reach = resultOf(screwReach({ kind: "blindStud", length: 30, offset: 19 }));
    expect(reach.point.nominal).toBeCloseTo(11, 9);
    expect(reach.opened.most).toBeCloseTo(12, 9);
  });

  it("a brad is set half a millimetre under the face", () => {
    expect(pointOf({ kind: "brad", length: 16 }).nominal).toBeCloseTo(16.5, 9);
  });

  it("a screw too short for what it passes does not get there", () => {
    expect(pointOf({ kind: "throughScrew", length: 20, washer: 1, panel, spacer: 19 }).most).toBeLessThan(0);
  });

  it.each([
    { driven: { kind: "brad", length: 0 }, field: "length" },
    { driven: { kind: "blindStud", length: 30, offset: Number.NaN }, field: "offset" },
    { driven: { kind: "capStud", length: 16, floor: -1, seat: "pan or round", headHeight: 2 }, field: "floor" },
    {
      driven: { kind: "throughScrew", length: 16, washer: 0, panel: { ...panel, most: Infinity }, spacer: 12 },
      field: "thickestPanel",
    },
  ] as const)("$driven.kind is refused for its $field", ({ driven, field }) => {
    expect(screwReach(driven)).toMatchObject({ ok: false, reason: { field } });
  });
});

describe("the room left in the wood", () => {
  const deep = (most: number, least = most) => ({
    point: { nominal: most, least, most },
    opened: { nominal: most, least, most },
  });
  it.each([
    // A plain plank of 18 may be opened 15.7 deep.
    { slat: 0, substrate: 18, depth: 15.7, left: 0, past: 15.7 },
    { slat: 0, substrate: 18, depth: 15.8, left: -0.1, past: 15.8 },
    { slat: 8, substrate: 12, depth: 14, left: 3.7, past: 6 },
    { slat: 8, substrate: 12, depth: 7, left: 10.7, past: -1 },
  ])(
    "$depth mm into $slat on $substrate leaves $left and comes $past past the slat",
    ({ slat, substrate, depth, left, past }) => {
      const room = resultOf(reachRoom(deep(depth), { slat, substrate, ...usualWood }));
      expect(room.leftMm).toBeCloseTo(left, 9);
      expect(room.pastSlatMm).toBeCloseTo(past, 9);
    },
  );

  it("counts the hole of a blind stud, which is deeper than its stud", () => {
    const reach = resultOf(screwReach({ kind: "blindStud", length: 30, offset: 19 }));
    const room = resultOf(reachRoom(reach, { slat: 0, substrate: 18, ...usualWood }));
    expect(room.leftMm).toBeCloseTo(3.7, 9);
    expect(room.pastSlatMm).toBeCloseTo(11, 9);
  });

  it("counts the deepest for breaking through and the shallowest for holding", () => {
    const room = resultOf(reachRoom(deep(15.9, 14.1), { slat: 8, substrate: 12, ...usualWood }));
    expect(room.leftMm).toBeCloseTo(1.8, 9);
    expect(room.pastSlatMm).toBeCloseTo(6.1, 9);
    expect(room.pastSlatMm).toBeGreaterThanOrEqual(leastHoldMm.screw);
  });

  it("shrinks by as much as the screw grows", () => {
    const mm = fc.double({ min: 1, max: 100, noNaN: true });
    fc.assert(
      fc.property(mm, mm, mm, (length, longer, substrate) => {
        const leftOf = (screw: number) => {
          const reach = resultOf(
            screwReach({ kind: "capStud", length: screw, floor: 2.5, seat: "pan or round", headHeight: 2 }),
          );
          return resultOf(reachRoom(reach, { slat: 0, substrate, ...usualWood })).leftMm;
        };
        expect(leftOf(length) - leftOf(length + longer)).toBeCloseTo(longer, 6);
      }),
    );
  });
});

describe("the next screw down", () => {
  const screws = [12, 25, 16, 19].map((length) => ({ length }));
  it("is the longest that fits", () => {
    expect(longestScrew(screws, ({ length }) => length < 19)).toEqual({ length: 16 });
    expect(longestScrew(screws, () => false)).toBeNull();
  });
});
