import { describe, expect, it } from "vitest";
import { barrelAddsUp, nearestBarrel } from "#shared/hardware/barrel-offset.ts";
import { capStudGrip } from "#shared/hardware/grip.ts";
import { holeEdge } from "#shared/hardware/hole-edge.ts";
import { screwMisfits } from "#shared/hardware/screw-fit.ts";
import type { CapStud } from "#shared/mockup/document.ts";
import { buildCapStud } from "../../../support/build-sign.ts";

describe("the grip", () => {
  const panel = { nominal: 5, least: 4.1, most: 5.9 };

  it("is the stud less the panel, at its thickest and its thinnest", () => {
    const stud: Parameters<typeof capStudGrip>[0] = {
      studLength: 12,
      studDiameter: 5,
      boreDepth: 9.5,
      countersunk: true,
      screw: { head: "flat", headHeight: 2 },
    };
    const grip = capStudGrip(stud, panel);
    expect(grip.least).toBeCloseTo(6.1, 9);
    expect(grip.most).toBeCloseTo(7.9, 9);
    expect(grip).toMatchObject({ needed: 5, room: 9.5 });
  });

  it("has less room over a head that stands on a plain floor", () => {
    const stud: Parameters<typeof capStudGrip>[0] = {
      studLength: 12,
      studDiameter: 5,
      boreDepth: 9.5,
      countersunk: false,
      screw: { head: "flat", headHeight: 2 },
    };
    expect(capStudGrip(stud, panel).room).toBe(7.5);
  });
});

describe("the barrel", () => {
  it("adds up when bore and floor make its length", () => {
    expect(barrelAddsUp(buildCapStud({ boreDepth: 9.5, floorThickness: 2.5, barrelLength: 12 }))).toBe(true);
    expect(barrelAddsUp(buildCapStud({ boreDepth: 9.5, floorThickness: 2.5, barrelLength: 12.1 }))).toBe(false);
  });

  const barrels = [12, 19, 25].map((barrelLength) => ({ barrelLength }));
  it.each([
    { offset: 0, nearest: 12 },
    { offset: 15, nearest: 12 },
    { offset: 15.5, nearest: 12 },
    { offset: 15.6, nearest: 19 },
    { offset: 100, nearest: 25 },
  ])("nearest to $offset mm is $nearest mm long", ({ offset, nearest }) => {
    expect(nearestBarrel(offset, barrels)?.barrelLength).toBe(nearest);
    expect(nearestBarrel(offset, barrels.toReversed())?.barrelLength).toBe(nearest);
  });

  it("can't be found where there are none", () => {
    expect(nearestBarrel(12, [])).toBeNull();
  });
});

describe("the screw", () => {
  const screw: CapStud["screw"] = {
    name: "No. 6",
    gauge: 6,
    head: "flat",
    diameter: 3.5052,
    length: 16,
    headDiameter: 7.0866,
    headHeight: 2.06,
  };
  it.each([
    { floorHole: 4, boreDiameter: 7.5, misfits: [] },
    { floorHole: 3.5052, boreDiameter: 7.0866, misfits: [] },
    { floorHole: 3.4, boreDiameter: 7.5, misfits: ["floor hole"] },
    { floorHole: 4, boreDiameter: 7, misfits: ["bore"] },
    { floorHole: 3, boreDiameter: 6, misfits: ["floor hole", "bore"] },
  ])("with a floor hole of $floorHole and a bore of $boreDiameter has $misfits", ({ misfits, ...measures }) => {
    expect(screwMisfits(buildCapStud({ ...measures, screw })).map(({ at }) => at)).toEqual(misfits);
  });
});

describe("a hole near an edge", () => {
  const panel = [
    [
      { x: 0, y: 0 },
      { x: 100, y: 0 },
      { x: 100, y: 60 },
      { x: 0, y: 60 },
    ],
    [
      { x: 60, y: 20 },
      { x: 80, y: 20 },
      { x: 80, y: 40 },
      { x: 60, y: 40 },
    ],
  ];

  it("keeps its distance from the outline", () => {
    expect(holeEdge({ x: 12, y: 30, diameter: 8 }, panel, [])).toEqual({ centreMm: 12, webMm: 8 });
  });

  it("keeps its distance from a cut-out", () => {
    expect(holeEdge({ x: 50, y: 30, diameter: 8 }, panel, [])).toEqual({ centreMm: 10, webMm: 6 });
  });

  it("keeps a web to the next hole", () => {
    const other = { x: 20, y: 30, diameter: 6 };
    expect(holeEdge({ x: 30, y: 30, diameter: 8 }, panel, [other])).toEqual({ centreMm: 30, webMm: 3 });
  });

  it("is no hole of a piece it does not lie in", () => {
    expect(holeEdge({ x: 70, y: 30, diameter: 8 }, panel, [])).toBeNull();
    expect(holeEdge({ x: -1, y: 30, diameter: 8 }, panel, [])).toBeNull();
  });
});
