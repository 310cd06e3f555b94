import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { chooseStart } from "#shared/slats/choose-start.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import type { SlatBoard, SlatDesign } from "#shared/slats/slat-layout.ts";
import { startWords } from "#shared/slats/slat-words.ts";
import { sliversOf } from "#shared/slats/slivers.ts";
import { resultOf } from "../../../support/reference-data.ts";
import { outlines, randomSlats, usualBoard, usualSlats } from "../../../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const lengthsFrom = (height: number, board: SlatBoard, design: SlatDesign): number[] =>
  resultOf(layOutSlats(board, { ...design, start: { kind: "height", height } }, kernel)).slats.map(
    ({ trimmedLongPoint }) => trimmedLongPoint,
  );
/** The shortest slat when the first is laid up to half a mm off. */
const surely = (height: number, board: SlatBoard, design: SlatDesign): number =>
  Math.min(...[-0.5, 0, 0.5].flatMap((off) => lengthsFrom(height + off, board, design)));

describe("slivers", () => {
  it("are slats shorter than a slat is wide, after trimming", () => {
    // The last of 30 degrees from the corner is 8.49 long.
    const layout = resultOf(layOutSlats(usualBoard, { ...usualSlats, angle: 30 }, kernel));
    const found = sliversOf(layout);
    expect(found.map(({ slat }) => slat.side)).toEqual(["left", "right"]);
    expect(found[0]?.lengthMm).toBeCloseTo(8.488, 3);
    expect(found[0]?.limitMm).toBe(38.1);
    expect(sliversOf(resultOf(layOutSlats(usualBoard, usualSlats, kernel)))).toEqual([]);
  });

  it("a slat exactly as long as wide is none", () => {
    const [slat] = resultOf(layOutSlats(usualBoard, usualSlats, kernel)).slats;
    if (!slat) throw new Error("No slat.");
    const layout = (trimmedLongPoint: number) => ({ slats: [{ ...slat, trimmedLongPoint }], design: usualSlats });
    expect(sliversOf(layout(38.1))).toHaveLength(0);
    expect(sliversOf(layout(38.09))).toHaveLength(1);
  });
});

describe("the start", () => {
  it("of 30 degrees is moved off the corner, and no slat is a sliver then", () => {
    const design = { ...usualSlats, angle: 30 };
    const { current, best, isSliverFree } = resultOf(chooseStart(usualBoard, design, kernel));
    expect(current.slivers).toBe(2);
    expect(current.shortestMm).toBeCloseTo(8.488, 3);
    expect(isSliverFree).toBe(true);
    expect(best.slivers).toBe(0);
    const lengths = lengthsFrom(best.height, usualBoard, design);
    expect(Math.min(...lengths)).toBeCloseTo(best.shortestMm, 9);
    expect(Math.min(...lengths)).toBeGreaterThan(38.1);
  });

  // 45 degrees without a gap on a board where either the lower corner's slat or the upper one's is short: height + reach is a
  // whole number of faces less half of one.
  it("that does not exist is said, and the best is given", () => {
    const face = 38.1 * Math.SQRT2;
    const board = { width: 457.2, height: 9.5 * face - 209.55 - 20, outline: null };
    const design = { ...usualSlats, spineOffset: face / 4 };
    const { best, isSliverFree } = resultOf(chooseStart(board, design, kernel));
    const scanned = Array.from({ length: 540 }, (_, step) => surely(step / 10, board, design));
    expect(Math.max(...scanned)).toBeLessThan(38.1);
    expect(isSliverFree).toBe(false);
    expect(surely(best.height, board, design)).toBeGreaterThan(Math.max(...scanned) - 0.15);
  });

  const boards = Array.from({ length: 40 }, (_, index) => index + 1);
  it.each(boards)("of board %i is as good as any of 150 others", (seed) => {
    const { board, design } = randomSlats(seed);
    const { best, isSliverFree } = resultOf(chooseStart(board, design, kernel));
    const pitch = resultOf(layOutSlats(board, design, kernel)).pitch;
    const most = Math.max(...Array.from({ length: 150 }, (_, step) => surely((step * pitch) / 150, board, design)));
    const own = surely(best.height, board, design);
    // Heights are rounded to 0.1 mm, which is 0.1/cos along a slat; past a slat's width longer is no better.
    const slack = 0.1 / Math.max(0.1, Math.cos((design.angle * Math.PI) / 180));
    expect(own).toBeGreaterThanOrEqual(Math.min(most, design.slatWidth) - slack);
    if (most >= design.slatWidth) expect(isSliverFree).toBe(true);
    if (isSliverFree) expect(own).toBeGreaterThanOrEqual(design.slatWidth - 0.001);
    expect(best.height).toBeGreaterThanOrEqual(0);
    expect(best.height).toBeLessThan(pitch + 0.1);
    expect(Math.round(best.height * 10) / 10).toBe(best.height);
  });

  it("of slats square to the spine leaves the ripped ones as wide as can be", () => {
    // 482.6 is 12 slats and 25.4: 12 whole ones and two of 12.7, or 11 and two of 31.75.
    const { best } = resultOf(chooseStart(usualBoard, { ...usualSlats, angle: 90 }, kernel));
    expect(best.narrowestMm).toBeGreaterThan(31.6);
  });

  it.each(Object.keys(outlines))("on %s is better than most", (name) => {
    const board = { width: 600, height: 500, outline: outlines[name] ?? [] };
    const { best, isSliverFree } = resultOf(chooseStart(board, usualSlats, kernel));
    const others = Array.from({ length: 20 }, (_, step) => Math.min(...lengthsFrom(step * 2.7, board, usualSlats)));
    const worse = others.filter((length) => length <= best.shortestMm + 0.01);
    if (!isSliverFree) expect(worse.length).toBeGreaterThanOrEqual(14);
    expect(best.shortestMm).toBeCloseTo(Math.min(...lengthsFrom(best.height, board, usualSlats)), 2);
  });

  it("is refused with the slats", () => {
    expect(chooseStart(usualBoard, { ...usualSlats, angle: 5 }, kernel)).toMatchObject({
      ok: false,
      reason: { field: "angle" },
    });
  });
});

describe("words about the start", () => {
  const measure = (height: number, shortestMm: number, slivers: number) => ({
    height,
    shortestMm,
    narrowestMm: 10,
    slivers,
  });
  it.each([
    {
      current: measure(0, 64.4, 0),
      best: measure(3, 70, 0),
      free: true,
      words: "The shortest slat is 64.4 mm long: no sliver.",
    },
    {
      current: measure(0, 8.5, 2),
      best: measure(12.3, 45.2, 0),
      free: true,
      words:
        "Begin 12.3 mm inside the lower edge at the spine: the shortest slat is then 45.2 mm long, and no slat is shorter than it is wide.",
    },
    {
      current: measure(0, 8.5, 2),
      best: measure(12.3, 38.4, 0),
      free: false,
      words:
        "Begin 12.3 mm inside the lower edge at the spine: the shortest slat is then 38.4 mm long, but lay the first with care, since a little off leaves a sliver.",
    },
    {
      current: measure(0, 8.5, 2),
      best: measure(-4, 30, 2),
      free: false,
      words:
        "No start leaves every slat longer than it is wide. The best begins 4 mm outside the lower edge at the spine: the shortest slat is then 30 mm long.",
    },
    {
      current: measure(-4, 30, 2),
      best: measure(-4, 30, 2),
      free: false,
      words: "No start leaves every slat longer than it is wide, and this is the best. Another width of slat may.",
    },
  ])("$words", ({ current, best, free, words }) => {
    expect(startWords({ current, best, isSliverFree: free }, { edge: "lower", at: "spine" }, "mm")).toBe(words);
  });
});
