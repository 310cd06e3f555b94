import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { barrelFoot } from "#shared/hardware/barrel-foot.ts";
import { capFootprint } from "#shared/hardware/cap-footprint.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});
const box = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));

describe("a barrel's foot", () => {
  const backer = { wood: box(0, 0, 100, 100), openJoints: [], brads: [] };
  it.each([
    { x: 50, share: 1 },
    { x: 100, share: 0.5 },
    { x: 110, share: 0 },
    // A segment of a disc: 1 − (θ − sin θ)/2π at half a radius from the middle.
    { x: 96.25, share: 0.8045 },
  ])("of 15 mm at x $x stands on wood with $share of it", ({ x, share }) => {
    expect(barrelFoot({ x, y: 50, diameter: 15 }, backer, kernel).onWood).toBeCloseTo(share, 3);
  });

  const joint = { from: { x: 0, y: 60 }, to: { x: 100, y: 60 }, width: 2 };
  it.each([
    { y: 51.4, over: false },
    { y: 51.6, over: true },
    { y: 60, over: true },
    { y: 68.6, over: false },
  ])("at y $y stands over the joint: $over", ({ y, over }) => {
    expect(barrelFoot({ x: 50, y, diameter: 15 }, { ...backer, openJoints: [joint] }, kernel).overJoint).toBe(over);
  });

  it("knows the nearest brad, or that there is none", () => {
    const brads = [
      { x: 53, y: 54 },
      { x: 90, y: 90 },
    ];
    expect(barrelFoot({ x: 50, y: 50, diameter: 15 }, { ...backer, brads }, kernel).nearestBradMm).toBe(5);
    expect(barrelFoot({ x: 50, y: 50, diameter: 15 }, backer, kernel).nearestBradMm).toBeNull();
  });

  it("stands on nothing without width or wood", () => {
    expect(barrelFoot({ x: 50, y: 50, diameter: 0 }, backer, kernel).onWood).toBe(0);
    expect(barrelFoot({ x: 50, y: 50, diameter: 15 }, { ...backer, wood: [] }, kernel).onWood).toBe(0);
  });

  it("never has more than all of it on wood, and no less on more wood", () => {
    const at = fc.double({ min: -20, max: 120, noNaN: true });
    fc.assert(
      fc.property(at, at, fc.double({ min: 1, max: 40, noNaN: true }), (x, y, diameter) => {
        const foot = { x, y, diameter };
        const less = barrelFoot(foot, backer, kernel).onWood;
        const more = barrelFoot(foot, { ...backer, wood: box(-10, 0, 110, 100) }, kernel).onWood;
        expect(less).toBeGreaterThanOrEqual(0);
        expect(more).toBeLessThanOrEqual(1);
        expect(more).toBeGreaterThanOrEqual(less - 1e-6);
      }),
      { numRuns: 50 },
    );
  });
});

describe("a cap's footprint", () => {
  const cap = { x: 50, y: 50, diameter: 15 };
  const letter = (x: number) => ({ id: "letter", region: box(x, 20, 60, 60) });
  it.each([
    { name: "8 mm off a letter", things: [letter(58)], kind: "one level" },
    { name: "7.9 mm off a letter", things: [letter(57.9)], kind: "several levels" },
    { name: "half on a letter", things: [letter(50)], kind: "several levels" },
    { name: "wholly on a plate", things: [{ id: "plate", region: box(0, 0, 100, 100) }], kind: "one level" },
    { name: "with nothing near", things: [], kind: "one level" },
  ])("$name lies on $kind", ({ things, kind }) => {
    expect(capFootprint(cap, things).kind).toBe(kind);
  });

  it("says how deep a letter must be notched", () => {
    expect(capFootprint(cap, [letter(55)])).toEqual({ kind: "several levels", over: [{ id: "letter", notchMm: 3 }] });
    expect(capFootprint(cap, [letter(48)])).toEqual({ kind: "several levels", over: [{ id: "letter", notchMm: 10 }] });
  });

  it("lies on the plate that is all under it", () => {
    expect(capFootprint(cap, [{ id: "plate", region: box(0, 0, 100, 100) }])).toEqual({
      kind: "one level",
      on: "plate",
    });
    expect(capFootprint(cap, [])).toEqual({ kind: "one level", on: null });
  });

  it("is clear once every thing is notched by as much as it says", () => {
    fc.assert(
      fc.property(fc.double({ min: 42.6, max: 57.9, noNaN: true }), (x) => {
        const print = capFootprint(cap, [letter(x)]);
        const notch = print.kind === "several levels" ? (print.over[0]?.notchMm ?? 0) : 0;
        expect(notch).toBeGreaterThan(0);
        expect(capFootprint(cap, [letter(x + notch)]).kind).toBe("one level");
      }),
    );
  });
});
