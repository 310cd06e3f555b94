import createClipper from "clipper2-wasm";
import { beforeAll, describe, expect, it } from "vitest";
import type { Item } from "#shared/drawing/display-list.ts";
import { rules } from "#shared/dry-fit/index.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { drawPicture } from "@/features/mockup/engine/draw-picture.ts";
import { createGrainCache } from "@/features/mockup/engine/grain-cache.ts";
import { setBoard } from "@/features/mockup/model/commands/set-board.ts";
import { signWithFigures } from "../sign-with-figures.ts";

const { document } = signWithFigures();
let kernel: Kernel;
beforeAll(async () => {
  kernel = clipperKernel(await createClipper());
});

const input = {
  document,
  context: usualContext,
  limits: defaultLimits,
  paperScale: 5,
  dimensions: true,
  what: "all" as const,
};
const idsOf = (items: readonly Item[]): string[] =>
  items.flatMap((item) => [
    ...("id" in item && item.id !== undefined ? [item.id] : []),
    ...("items" in item ? idsOf(item.items) : []),
  ]);

describe("the picture on the desk", () => {
  it("shows every piece by its id, and counts the rules that found nothing", () => {
    const { figures, drawing } = drawPicture(input, { kernel, grain: createGrainCache() });
    expect(idsOf(drawing?.elevation.items ?? [])).toEqual(expect.arrayContaining(["board", "disc", "ring", "sun"]));
    // Over the board's face: a barrel of 19 and a sheet of 4.5.
    const disc = figures.layers[0];
    expect((disc?.top.nominal ?? 0) - figures.backerTop.nominal).toBeCloseTo(23.5, 6);
    const found = new Set(drawing?.dryFit.findings.map(({ rule }) => rule));
    expect((drawing?.dryFit.fine ?? 0) + found.size).toBe(rules.length);
  });

  it("is figures only while something is dragged", () => {
    expect(drawPicture({ ...input, what: "figures" }, { kernel, grain: createGrainCache() }).drawing).toBeNull();
  });

  it("is the same with grain that was kept, and gets new grain for another board", () => {
    const grain = createGrainCache();
    const first = drawPicture(input, { kernel, grain }).drawing?.elevation;
    const kept = grain.find(document);
    expect(kept?.pngBase64.length).toBeGreaterThan(1000);
    expect(drawPicture(input, { kernel, grain }).drawing?.elevation).toEqual(first);
    expect(grain.find(setBoard(document, { width: 610 }))).toBeUndefined();
    const stain = { kind: "stain" as const, name: "Umber", colour: "#3A2415", strength: 0.8, dryingHours: 8 };
    expect(grain.find(setBoard(document, { finish: [stain] }))).toBeUndefined();
  });
});
