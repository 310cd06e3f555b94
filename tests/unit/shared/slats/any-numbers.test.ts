import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { frameBrads } from "#shared/frame/frame-brads.ts";
import { frameCover } from "#shared/frame/frame-cover.ts";
import { bodyInFrame, layOutFrame } from "#shared/frame/lay-out-frame.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { bradReach } from "#shared/slats/brad-checks.ts";
import { bradMap } from "#shared/slats/brad-map.ts";
import { chooseStart } from "#shared/slats/choose-start.ts";
import { footOnSlats } from "#shared/slats/foot-on-slats.ts";
import { glueArea } from "#shared/slats/glue-area.ts";
import { layOutSlats } from "#shared/slats/lay-out-slats.ts";
import { slatHold } from "#shared/slats/slat-hold.ts";
import { slatRefusalWords } from "#shared/slats/slat-words.ts";
import { stockTaken } from "#shared/slats/stock-taken.ts";
import type { Outcome } from "#shared/units/outcome.ts";
import { resultOf } from "../../../support/reference-data.ts";
import { outlines, usualBoard, usualSlats } from "../../../support/slat-boards.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** Any number that a field, a file or a mistake may bring. */
const number = fc.oneof(
  fc.double(),
  fc.double({ min: -1, max: 700, noNaN: true }),
  fc.constantFrom(0, -0, Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, 1e308, 5e-324, 10_000),
);

function isSound(value: unknown): boolean {
  if (typeof value === "number") return Number.isFinite(value);
  if (typeof value !== "object" || value === null) return value !== undefined;
  return Object.values(value).every(isSound);
}

function expectSound(outcome: Outcome<unknown>): void {
  if (outcome.ok) expect(isSound(outcome.value), JSON.stringify(outcome.value)).toBe(true);
  else expect(slatRefusalWords(outcome.reason, "mm")).not.toMatch(/NaN|Infinity|undefined/);
}

type Numbers = readonly [number, number, number, number, number];

describe("for any numbers", () => {
  const check = (calculate: (numbers: Numbers) => Outcome<unknown>, numRuns = 300) =>
    fc.assert(
      fc.property(fc.tuple(number, number, number, number, number), (numbers) => expectSound(calculate(numbers))),
      { numRuns },
    );

  it("a start is sound or refused in words", () => {
    check(
      ([angle, slatWidth, gap, spineOffset, height]) =>
        chooseStart(
          usualBoard,
          { ...usualSlats, angle, slatWidth, gap, spineOffset, start: { kind: "height", height } },
          kernel,
        ),
      150,
    );
    check(([angle]) => chooseStart(usualBoard, { ...usualSlats, angle }, kernel), 60);
    check(([, slatWidth]) => chooseStart(usualBoard, { ...usualSlats, slatWidth }, kernel), 60);
  });

  it("a map of brads is sound or refused in words", () => {
    const board = { width: 600, height: 500, outline: outlines.notched ?? [] };
    const layout = resultOf(layOutSlats(board, { ...usualSlats, overhang: 20 }, kernel));
    check(
      ([trim, joint, barrel, apart, x]) => bradMap(layout, [{ x, y: 100 }], kernel, { trim, joint, barrel, apart }),
      100,
    );
    check(([trim, , barrel, x, y]) => bradMap(layout, [{ x, y }], kernel, { trim, joint: 10, barrel, apart: 150 }), 60);
  });

  it("a barrel's foot is sound wherever it stands", () => {
    const layout = resultOf(layOutSlats(usualBoard, { ...usualSlats, gap: 5 }, kernel));
    fc.assert(
      fc.property(fc.integer({ min: -900, max: 900 }), fc.integer({ min: -900, max: 900 }), (x, y) => {
        const { onWood } = footOnSlats({ x, y, diameter: 15 }, layout, [], kernel);
        expect(onWood).toBeGreaterThanOrEqual(0);
        expect(onWood).toBeLessThanOrEqual(1);
      }),
      { numRuns: 100 },
    );
  });

  it("stock, holds, reach, glue and frames are sound or refused in words", () => {
    const cut = (setting: number) => [{ edge: "spine" as const, setting, mustFit: true }];
    check(([kerf, slatWidth]) => stockTaken({ longPoint: 100, near: cut(45), far: cut(30) }, { kerf, slatWidth }));
    check(([least, slat, substrate, needed]) => slatHold({ least }, { slat, substrate }, needed));
    check(([length, slat, substrate, sanding, skin]) => bradReach(length, { slat, substrate, sanding, skin }));
    check(([spread]) => glueArea({ slats: [], spine: null }, spread));
    check(([depth, substrate, slats, sanding]) => frameCover(depth, { substrate, slats, sanding }));
    check(([width, height, frameWidth]) => bodyInFrame({ width, height }, frameWidth));
    const board = rectanglePath({ x: 0, y: 0, width: 600, height: 400 });
    check(([width]) => layOutFrame(board, { width, mitred: true }, kernel));
    const frame = resultOf(layOutFrame(board, { width: 20, mitred: true }, kernel));
    check(([length, frameWidth, substrate]) => frameBrads(frame, { length, frameWidth, substrate }));
  });
});
