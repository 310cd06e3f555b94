import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2, regionPerimeterMm } from "#shared/geometry/area.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Polygon, Region } from "#shared/geometry/path.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import type { Slat } from "#shared/slats/slat-layout.ts";
import { checkReference } from "../support/check-reference.ts";
import { resultOf } from "../support/reference-data.ts";
import {
  enlarged,
  outlines,
  randomSlats,
  reachAlong,
  rectangle,
  sideRectangle,
  wholeStrip,
} from "../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** The clipping is done that much larger, so on a grid of 0.000025 mm. Where edges cross at a flat angle it moves corners by more. */
const finer = 40;
const gridMm = 0.002;
/** Slats clipped to an outline lie on the kernel's own grid of 0.001 mm. */
const coarseMm = 0.02;
const boards = Array.from({ length: 500 }, (_, index) => index + 1);

const namesOf = (pattern: string): readonly Slat["side"][] => (pattern === "single" ? ["whole"] : ["left", "right"]);
const nameOf = ({ side, strip }: Pick<Slat, "side" | "strip">) => `${side} ${strip}`;

describe("slats in closed form against strips clipped one by one", () => {
  let compared = 0;
  let worst = 0;

  it.each(boards)("board %i", (seed) => {
    const { board, design } = randomSlats(seed);
    const layout = resultOf(layOutSlats(board, design, kernel));
    const found = new Map(layout.slats.map((slat) => [nameOf(slat), slat]));
    expect(found.size).toBe(layout.slats.length);
    const clip = (strip: Polygon, rectangle: Polygon) =>
      enlarged(kernel.intersect(enlarged([strip], finer), enlarged([rectangle], finer)), 1 / finer);
    let clipped = 0;
    for (const side of namesOf(design.pattern)) {
      const laid = sideRectangle(side, board, design, design.overhang);
      const body = sideRectangle(side, board, design, 0);
      const reach = Math.ceil(6000 / (design.slatWidth + design.gap));
      for (let strip = -reach; strip <= reach; strip++) {
        const { polygon, along, misses } = wholeStrip(strip, side, board, design, layout.startHeight);
        if (misses) continue;
        const trimmed = clip(polygon, body);
        // Slats that would show half a thousandth of a mm are none.
        if (regionAreaMm2(trimmed) <= 0.001 * regionPerimeterMm(trimmed)) continue;
        clipped++;
        const slat = found.get(nameOf({ side, strip }));
        if (!slat) throw new Error(`Strip ${nameOf({ side, strip })} is missing.`);
        const untrimmed = clip(polygon, laid);
        const off = Math.max(
          Math.abs(slat.longPoint - reachAlong(untrimmed, along)),
          Math.abs(slat.trimmedLongPoint - reachAlong(trimmed, along)),
        );
        worst = Math.max(worst, off);
        expect(off, nameOf(slat)).toBeLessThan(gridMm);
        expect(apart([slat.untrimmed], untrimmed)).toBeLessThan(gridMm * regionPerimeterMm(untrimmed));
        expect(apart(slat.trimmed, trimmed)).toBeLessThan(gridMm * regionPerimeterMm(trimmed));
      }
    }
    expect(layout.slats.length).toBe(clipped);
    compared += clipped;
  });

  it("was not a handful, and no length is off by more than the grid", () => {
    expect(compared).toBeGreaterThan(10_000);
    checkReference({
      what: `largest difference over ${compared} slats of 500 boards, mm`,
      source: "calculated by clipping each slat",
      expected: 0,
      got: worst,
      within: gridMm,
    });
  });
});

/** Area that two regions do not share, mm². */
function apart(one: Region, other: Region): number {
  const [a, b] = [enlarged(one, finer), enlarged(other, finer)];
  return (regionAreaMm2(kernel.difference(a, b)) + regionAreaMm2(kernel.difference(b, a))) / finer ** 2;
}

describe("slats clipped to an outline", () => {
  it.each(boards.slice(0, 120))("that is a rectangle are those in closed form, board %i", (seed) => {
    const { board, design } = randomSlats(seed);
    const outline = [rectangle(0, 0, board.width, board.height)];
    const closed = resultOf(layOutSlats(board, design, kernel)).slats;
    const clipped = resultOf(layOutSlats({ ...board, outline }, design, kernel)).slats;
    const isThin = (slat: Slat) => regionAreaMm2(slat.trimmed) < 0.005 * regionPerimeterMm(slat.trimmed);
    const lines = (slats: readonly Slat[]) => slats.filter((slat) => !isThin(slat));
    expect(lines(clipped).map(nameOf)).toEqual(lines(closed).map(nameOf));
    const byName = new Map(closed.map((slat) => [nameOf(slat), slat]));
    for (const slat of lines(clipped)) {
      const other = byName.get(nameOf(slat));
      expect(Math.abs(slat.trimmedLongPoint - (other?.trimmedLongPoint ?? 0))).toBeLessThan(coarseMm);
      expect(Math.abs(slat.trimmedWidth - (other?.trimmedWidth ?? 0))).toBeLessThan(coarseMm);
      // An end with a corner in it is cut square past it, the others are cut alike.
      if (other?.near.length !== 1 || other.far.length !== 1) continue;
      expect(Math.abs(slat.longPoint - other.longPoint), nameOf(slat)).toBeLessThan(coarseMm);
      expect(Math.abs((slat.far[0]?.setting ?? NaN) - (other.far[0]?.setting ?? NaN))).toBeLessThan(0.1);
      expect(Math.abs((slat.near[0]?.setting ?? NaN) - (other.near[0]?.setting ?? NaN))).toBeLessThan(0.1);
    }
  });

  const cases = Object.keys(outlines).flatMap((name) => boards.slice(0, 12).map((seed) => ({ name, seed })));
  it.each(cases)("$name, slats $seed: cover what their strips cover, and nothing twice", ({ name, seed }) => {
    const { design: random } = randomSlats(seed);
    const board = { width: 600, height: 500, outline: outlines[name] ?? [] };
    const design = { ...random, spineOffset: Math.max(-150, Math.min(150, random.spineOffset)) };
    const layout = resultOf(layOutSlats(board, design, kernel));
    let expected = 0;
    for (const side of namesOf(design.pattern)) {
      const body = kernel.intersect(board.outline, [sideRectangle(side, board, design, 0)]);
      for (let strip = -500; strip <= 500; strip++) {
        const { polygon, misses } = wholeStrip(strip, side, board, design, layout.startHeight);
        if (misses) continue;
        expected += regionAreaMm2(kernel.intersect([polygon], body));
      }
    }
    const edges = layout.slats.reduce((sum, slat) => sum + regionPerimeterMm(slat.trimmed), 0);
    const total = layout.slats.reduce((sum, slat) => sum + regionAreaMm2(slat.trimmed), 0);
    expect(Math.abs(total - expected)).toBeLessThan(edges * 0.002);
    const union = kernel.union(
      layout.slats.flatMap((slat) => slat.trimmed),
      "nonzero",
    );
    expect(Math.abs(regionAreaMm2(union) - total)).toBeLessThan(edges * 0.002);
    for (const slat of layout.slats) {
      const outside = regionAreaMm2(kernel.difference(slat.trimmed, [slat.untrimmed]));
      expect(outside, nameOf(slat)).toBeLessThan(0.004 * regionPerimeterMm(slat.trimmed));
      expect(slat.longPoint).toBeGreaterThan(slat.trimmedLongPoint - coarseMm);
      expect(slat.shortPoint).toBeLessThanOrEqual(slat.longPoint + 1e-9);
    }
    expect(layout.slats.map(({ order }) => order)).toEqual(layout.slats.map((_, index) => index + 1));
  });
});
