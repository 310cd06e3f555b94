import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { distanceToRegionEdgeMm, regionContains } from "#shared/geometry/contains.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Point } from "#shared/geometry/path.ts";
import { bradReach, bradsAtTrim } from "#shared/slats/brad-checks.ts";
import { type BradMap, bradMap } from "#shared/slats/brad-map.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import type { SlatLayout } from "#shared/slats/slat-layout.ts";
import { resultOf } from "../../../support/reference-data.ts";
import { seededRandom } from "../../../support/seeded-random.ts";
import { outlines, randomSlats, rectangle, usualBoard, usualSlats } from "../../../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const usual = () => resultOf(layOutSlats(usualBoard, { ...usualSlats, overhang: 30 }, kernel));

function expectClear(map: BradMap, layout: SlatLayout, barrels: readonly Point[]): void {
  const woodOf = new Map(layout.slats.map(({ order, trimmed }) => [order, trimmed]));
  if (layout.spine) woodOf.set(0, layout.spine.trimmed);
  for (const brad of map.brads) {
    const wood = woodOf.get(brad.slat) ?? [];
    expect(regionContains(wood, brad)).toBe(true);
    expect(distanceToRegionEdgeMm(wood, brad)).toBeGreaterThanOrEqual(10);
    expect(distanceToRegionEdgeMm(layout.body, brad)).toBeGreaterThanOrEqual(15);
    for (const barrel of barrels) expect(Math.hypot(barrel.x - brad.x, barrel.y - brad.y)).toBeGreaterThanOrEqual(10);
  }
  const held = new Set(map.brads.map(({ slat }) => slat));
  expect([...woodOf.keys()].filter((slat) => !held.has(slat)).toSorted((a, b) => a - b)).toEqual(
    map.without.toSorted((a, b) => a - b),
  );
}

describe("a map of brads", () => {
  it("holds every slat of the usual board, the two corners by one brad", () => {
    const layout = usual();
    const map = resultOf(bradMap(layout, [], kernel));
    expect(map.without).toEqual([]);
    expect(map.withOne).toEqual([1, 2]);
    expectClear(map, layout, []);
  });

  it("sets brads at both ends of a slat and no farther apart than asked", () => {
    const layout = usual();
    const { brads } = resultOf(bradMap(layout, [], kernel));
    const slat = layout.slats.find(({ side, strip }) => side === "right" && strip === 7);
    const own = brads.filter((brad) => brad.slat === slat?.order);
    expect(own).toHaveLength(3);
    const apart = own
      .slice(1)
      .map((brad, index) => Math.hypot(brad.x - (own[index]?.x ?? 0), brad.y - (own[index]?.y ?? 0)));
    for (const distance of apart) expect(distance).toBeLessThanOrEqual(150);
    // The outer one lies 15 mm inside the trim line, on the middle line.
    expect(Math.max(...own.map(({ x }) => x))).toBeCloseTo(457.2 - 15, 0);
    // The near one lies 10 mm off the spine.
    expect(Math.min(...own.map(({ x }) => x))).toBeCloseTo(247.65 + 10, 0);
  });

  it("moves a brad that a barrel stands on along its slat", () => {
    const layout = usual();
    const free = resultOf(bradMap(layout, [], kernel)).brads;
    const slat = layout.slats.find(({ side, strip }) => side === "right" && strip === 7);
    const middle = free.filter((brad) => brad.slat === slat?.order)[1];
    if (!middle) throw new Error("No brad.");
    const barrels = [{ x: middle.x + 3, y: middle.y }];
    const map = resultOf(bradMap(layout, barrels, kernel));
    expectClear(map, layout, barrels);
    expect(map.brads).toHaveLength(free.length);
    const moved = map.brads.filter((brad) => brad.slat === slat?.order)[1];
    expect(Math.hypot((moved?.x ?? 0) - middle.x, (moved?.y ?? 0) - middle.y)).toBeLessThan(13);
  });

  it("gives wide slats two rows", () => {
    const layout = resultOf(layOutSlats(usualBoard, { ...usualSlats, slatWidth: 80, overhang: 30 }, kernel));
    const map = resultOf(bradMap(layout, [], kernel));
    expectClear(map, layout, []);
    const slat = layout.slats.find(({ side, strip }) => side === "right" && strip === 3);
    if (!slat) throw new Error("No slat.");
    const { from, to } = slat.axis;
    const length = Math.hypot(to.x - from.x, to.y - from.y);
    const off = (brad: Point) => ((brad.x - from.x) * (to.y - from.y) - (brad.y - from.y) * (to.x - from.x)) / length;
    const rows = new Set(map.brads.filter((brad) => brad.slat === slat.order).map((brad) => Math.round(off(brad))));
    expect([...rows].toSorted((a, b) => a - b)).toEqual([-20, 20]);
  });

  it("says which slats no brad fits in", () => {
    const layout = resultOf(layOutSlats(usualBoard, { ...usualSlats, slatWidth: 20 }, kernel));
    const map = resultOf(bradMap(layout, [], kernel));
    expect(map.without).toHaveLength(layout.slats.length);
    expect(map.brads.every(({ slat }) => slat === 0)).toBe(true);
  });

  const boards = Array.from({ length: 60 }, (_, index) => index + 1);
  it.each(boards)("keeps clear of trim line, joints and barrels on board %i", (seed) => {
    const { board, design } = randomSlats(seed);
    const layout = resultOf(layOutSlats(board, design, kernel));
    const random = seededRandom(seed);
    const barrels = Array.from({ length: 8 }, () => ({ x: random() * board.width, y: random() * board.height }));
    expectClear(resultOf(bradMap(layout, barrels, kernel)), layout, barrels);
  });

  it.each(Object.keys(outlines))("keeps clear on %s", (name) => {
    const board = { width: 600, height: 500, outline: outlines[name] ?? [] };
    const layout = resultOf(layOutSlats(board, { ...usualSlats, overhang: 20 }, kernel));
    const barrels = [
      { x: 150, y: 150 },
      { x: 450, y: 400 },
    ];
    const map = resultOf(bradMap(layout, barrels, kernel));
    expectClear(map, layout, barrels);
    expect(map.brads.length).toBeGreaterThan(20);
  });

  it.each([
    { spacing: { trim: Number.NaN }, field: "trim" },
    { spacing: { joint: -1 }, field: "joint" },
    { spacing: { apart: 0 }, field: "apart" },
  ])("refuses $spacing", ({ spacing, field }) => {
    const usualSpacing = { trim: 15, joint: 10, barrel: 10, apart: 150 };
    expect(bradMap(usual(), [], kernel, { ...usualSpacing, ...spacing })).toMatchObject({
      ok: false,
      reason: { field },
    });
  });

  it("refuses a barrel that is nowhere", () => {
    expect(bradMap(usual(), [{ x: 10, y: Number.NaN }], kernel)).toMatchObject({
      ok: false,
      reason: { field: "barrel1Y" },
    });
  });
});

describe("brads at the trim line", () => {
  const body = [rectangle(0, 0, 400, 300)];
  const brad = (x: number) => ({ x, y: 150, slat: 1 });
  it.each([
    { x: 14.9, inside: [14.9] },
    { x: 15, inside: [] },
    { x: 15.1, inside: [] },
    { x: -2, inside: [-2] },
    { x: 392, inside: [8] },
  ])("at x $x: $inside", ({ x, inside }) => {
    expect(bradsAtTrim([brad(x)], body).map(({ insideMm }) => insideMm)).toEqual(
      inside.map((mm) => expect.closeTo(mm, 9)),
    );
  });

  it("come nearest first", () => {
    expect(bradsAtTrim([brad(12), brad(200), brad(3)], body).map(({ brad: { x } }) => x)).toEqual([3, 12]);
  });
});

describe("a brad's reach", () => {
  const under = { slat: 9, substrate: 12, sanding: 0.3, skin: 2 };
  // Set half a mm under the face: a brad of 15 reaches 15.5, 6.5 past the slat; 18.7 may be opened.
  it.each([
    { length: 15, past: 6.5, left: 3.2, only: false },
    { length: 13.5, past: 5, left: 4.7, only: false },
    { length: 13.4, past: 4.9, left: 4.8, only: true },
    { length: 20, past: 11.5, left: -1.8, only: false },
  ])("of $length mm is $past past the slat, $left left", ({ length, past, left, only }) => {
    const reach = resultOf(bradReach(length, under));
    expect(reach.pastSlatMm).toBeCloseTo(past, 9);
    expect(reach.leftMm).toBeCloseTo(left, 9);
    expect(reach.onlySlat).toBe(only);
  });
  it("refuses what is no number", () => {
    expect(bradReach(Number.NaN, under)).toMatchObject({ ok: false });
    expect(bradReach(15, { ...under, slat: Number.NaN })).toMatchObject({ ok: false });
    expect(bradReach(15, { ...under, slat: 0 })).toMatchObject({ ok: false, reason: { field: "slat" } });
  });
});
