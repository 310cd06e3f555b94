import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { woodPlan } from "#shared/cut-plan/wood-plan.ts";
import type { Item } from "#shared/drawing/display-list.ts";
import { drawBradMap, drawSlatPlan } from "#shared/drawing/slat-plan.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { buildFrame, buildSlatSign } from "../../../support/slat-sign.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const planned = (...given: Parameters<typeof buildSlatSign>) =>
  woodPlan({ document: buildSlatSign(...given), limits: defaultLimits, unit: "mm", kernel });
const slatsOf = (...given: Parameters<typeof buildSlatSign>) => {
  const { slats } = planned(...given);
  if (!slats?.ok) throw new Error("No slats were laid.");
  return slats.value;
};
const textsOf = (items: readonly Item[]) => items.flatMap((item) => (item.kind === "text" ? [item] : []));

it("numbers every slat of 40 mm over 400 mm, on wide paper level and on narrow paper too", () => {
  const { layout } = slatsOf();
  const numbers = ["1", "2", "3", "4", "5", "6", "7", "8", "9", "10"];
  for (const widthMm of [120, 92]) {
    const list = drawSlatPlan({ layout, widthMm, heightMm: 200 });
    expect(textsOf(list?.items ?? []).map(({ text }) => text)).toEqual(numbers);
    // 600 by 400 in 118 or 90 mm of paper, with a millimetre round it.
    expect(list?.heightMm).toBeCloseTo(((widthMm - 2) * 400) / 600 + 2, 9);
  }
});

it("turns a number along a slanting slat that has no level room for it", () => {
  const { layout } = slatsOf({ angle: 45, slatWidth: 24 });
  const texts = textsOf(drawSlatPlan({ layout, widthMm: 92, heightMm: 200 })?.items ?? []);
  expect(texts).toHaveLength(layout.slats.length);
  const turned = texts.flatMap(({ turn }) => (turn === undefined ? [] : [Math.round(turn)]));
  expect(turned.length).toBeGreaterThan(5);
  expect(new Set(turned)).toEqual(new Set([-45]));
});

it("draws two strokes for each brad, and the barrels that brads keep off", () => {
  const { layout, brads } = slatsOf();
  if (!brads.ok) throw new Error(brads.words);
  const barrels = [{ x: 300, y: 200, diameter: 15 }];
  const list = drawBradMap({ layout, widthMm: 120, heightMm: 200, unit: "mm", brads: brads.value.brads, barrels });
  const lines = (list?.items ?? []).filter(({ kind }) => kind === "line");
  expect(lines).toHaveLength(2 * brads.value.brads.length);
  expect(textsOf(list?.items ?? []).map(({ text }) => text)).toEqual(["600 × 400, at 1:5.1"]);
});

it("says in words what to change where slats or a frame can't be made", () => {
  const round = { outline: { kind: "ellipse" as const }, width: 600, height: 400, measures: "body" as const };
  const { slats } = planned({ slatWidth: 5000 });
  expect(slats).toEqual({ ok: false, words: "A slat of 5000 mm is wider than the board: choose 400 mm at most." });
  const { frame } = planned({}, [], { board: round, frame: buildFrame() });
  expect(frame).toMatchObject({ ok: false, words: expect.stringContaining("round edges") });
});
