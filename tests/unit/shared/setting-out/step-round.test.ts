import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Point } from "#shared/geometry/path.ts";
import { bearingOf, directionOf } from "#shared/setting-out/direction.ts";
import { type RigidStep, stepsOfCopiesRound, stepsRound } from "#shared/setting-out/step-round.ts";

const centre = { x: 300, y: 200 };
const round = { centre, radius: null, sweep: 360, turned: false };
const moved = (point: Point, step: RigidStep | undefined) => ({
  x: point.x + (step?.dx ?? 0),
  y: point.y + (step?.dy ?? 0),
});
/** Degrees from one bearing on to the next, 0 up to 360. */
const onward = (from: number, to: number) => (((to - from) % 360) + 360) % 360;

describe("stepping copies off round a centre", () => {
  it("sets three copies of a thing at the right of a centre below it, left of it and over it", () => {
    const made = stepsOfCopiesRound({ x: 400, y: 200 }, 3, round);
    expect(made?.own).toMatchObject({ turn: 0, dx: 0, dy: 0 });
    expect(made?.copies.map((step) => moved({ x: 400, y: 200 }, step))).toEqual([
      { x: 300, y: 300 },
      { x: 200, y: 200 },
      { x: 300, y: 100 },
    ]);
  });

  it("stands n things a part of 360/n from each other and equally far out, whatever n", () => {
    const far = fc.double({ min: 1, max: 800, noNaN: true });
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 60 }),
        far,
        fc.double({ min: -180, max: 180, noNaN: true }),
        (count, out, at) => {
          const { x, y } = directionOf(at);
          const middle = { x: centre.x + out * x, y: centre.y + out * y };
          const made = stepsOfCopiesRound(middle, count, { ...round, turned: true });
          const places = [middle, ...(made?.copies ?? []).map((step) => moved(middle, step))];
          expect(places).toHaveLength(count + 1);
          for (const [index, place] of places.entries()) {
            expect(Math.abs(Math.hypot(place.x - centre.x, place.y - centre.y) - out)).toBeLessThan(1e-9);
            const next = places[(index + 1) % places.length] ?? place;
            const apart = onward(bearingOf(centre, place) ?? Number.NaN, bearingOf(centre, next) ?? Number.NaN);
            expect(apart).toBeCloseTo(360 / (count + 1), 7);
          }
          for (const [index, { turn }] of (made?.copies ?? []).entries())
            expect(turn).toBeCloseTo(((index + 1) * 360) / (count + 1), 7);
        },
      ),
    );
  });

  it("fills an arc from its beginning to its end, backwards when the sweep is under 0", () => {
    const arc = stepsOfCopiesRound({ x: 400, y: 200 }, 2, { ...round, sweep: -90, turned: true });
    expect(arc?.copies.map(({ turn }) => turn)).toEqual([-45, -90]);
    const [, last] = arc?.copies ?? [];
    expect(moved({ x: 400, y: 200 }, last)).toEqual({ x: 300, y: 100 });
  });

  it("asks for a radius when the thing lies on the centre, and begins at the top with one", () => {
    expect(stepsOfCopiesRound(centre, 3, round)).toBeNull();
    const made = stepsOfCopiesRound(centre, 1, { ...round, radius: 50 });
    expect(made && moved(centre, made.own)).toEqual({ x: 300, y: 150 });
    expect(made && moved(centre, made.copies[0])).toEqual({ x: 300, y: 250 });
  });
});

describe("stepping things off round a centre", () => {
  const four = [
    { x: 400, y: 200 },
    { x: 290, y: 120 },
    { x: 305, y: 290 },
    { x: 210, y: 195 },
  ];
  it("keeps the first's bearing, the order round the centre and each one's own distance", () => {
    const steps = stepsRound(four, round);
    const places = four.map((middle, index) => moved(middle, steps?.[index]));
    const far = four.map(({ x, y }) => Math.hypot(x - 300, y - 200));
    const expected = [
      { x: 400, y: 200 },
      { x: 300, y: 200 - (far[1] ?? 0) },
      { x: 300, y: 200 + (far[2] ?? 0) },
      { x: 300 - (far[3] ?? 0), y: 200 },
    ];
    for (const [index, place] of places.entries()) {
      expect(place.x).toBeCloseTo(expected[index]?.x ?? Number.NaN, 9);
      expect(place.y).toBeCloseTo(expected[index]?.y ?? Number.NaN, 9);
    }
  });

  it("brings all of them to one radius, and the last to the end of an arc", () => {
    const steps = stepsRound(four, { ...round, radius: 60, sweep: 180 });
    const places = four.map((middle, index) => moved(middle, steps?.[index]));
    for (const { x, y } of places) expect(Math.hypot(x - 300, y - 200)).toBeCloseTo(60, 9);
    // Clockwise from the right: below, left, above.
    expect(places[0]).toEqual({ x: 360, y: 200 });
    expect(bearingOf(centre, places[2] ?? centre)).toBeCloseTo(60, 9);
    expect(bearingOf(centre, places[3] ?? centre)).toBeCloseTo(120, 9);
    expect(Math.abs(bearingOf(centre, places[1] ?? centre) ?? 0)).toBeCloseTo(180, 9);
  });

  it("turns each along by as much as it went round", () => {
    const steps = stepsRound(four, { ...round, turned: true });
    expect(steps?.[0]?.turn).toBe(0);
    // It lay at atan2(90, 5) = 86.82° and comes to 90°.
    expect(steps?.[2]?.turn).toBeCloseTo(90 - (Math.atan2(90, 5) * 180) / Math.PI, 9);
  });
});
