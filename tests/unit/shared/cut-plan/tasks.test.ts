import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { barTasks } from "#shared/cut-plan/bar-tasks.ts";
import { sheetTasks } from "#shared/cut-plan/sheet-tasks.ts";
import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import { planCutting } from "#shared/stock-lengths/plan-cutting.ts";
import { buildLayer, buildSign, disc, plate } from "../../../support/build-sign.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const given = { stock: standardStock, limits: defaultLimits, saws: usualSaws, unit: "mm" as const };
const sign = (): MockupDocument => {
  const built = buildSign([
    buildLayer("B", [plate("p", 200, 100, [300, 200])]),
    buildLayer("C", [disc("d1", 20, [260, 200]), disc("d2", 20, [340, 200], { name: "Moon" })]),
    buildLayer("D", [plate("q", 50, 20, [300, 200])], { thickness: 6, marked: "back" }),
    buildLayer("E", []),
  ]);
  return { ...built, quantity: 3 };
};

describe("what is cut from sheets", () => {
  it("stands by material and thickness, every piece as often as there are signs", () => {
    const tasks = sheetTasks({ document: sign(), ...given });
    expect(
      tasks.map(({ title, request }) => [title, request.pieces.map(({ id, quantity }) => `${quantity} ${id}`)]),
    ).toEqual([
      ["Midnight, 3 mm", ["3 p", "3 d1", "3 d2"]],
      ["Midnight, 6 mm", ["3 q"]],
    ]);
    expect(tasks[0]?.request.pieces.map(({ name }) => name)).toEqual(["B1", "C1", "Moon"]);
  });

  it("keeps its size, and is mirrored only where neither face is marked", () => {
    const document = sign();
    const [first] = document.layers[0]?.pieces ?? [];
    if (first) first.placement = { ...first.placement, scale: 2, turn: 30 };
    const [midnight, thick] = sheetTasks({ document, ...given });
    expect(regionAreaMm2(flattenPath(midnight?.request.pieces[0]?.path ?? []))).toBeCloseTo(4 * 20_000, 6);
    expect(midnight?.request.pieces[0]?.mayMirror).toBe(true);
    expect(thick?.request.pieces[0]?.mayMirror).toBe(false);
  });

  it("comes from the sheets on hand, or from what is usually bought", () => {
    const [first] = standardStock.acrylics;
    if (!first) throw new Error("There is no acrylic.");
    const sheets = [{ thicknessMm: 3, widthMm: 900, heightMm: 600, quantity: 2 }];
    const counted = { ...standardStock, acrylics: [{ ...first, sheets }] };
    const [midnight, thick] = sheetTasks({ document: sign(), ...given, stock: counted });
    expect(midnight).toMatchObject({ sheetsAreCounted: true });
    expect(midnight?.request.stock).toMatchObject([{ quantity: 2, name: "Sheet in stock" }]);
    expect(thick).toMatchObject({ sheetsAreCounted: false });
    expect(thick?.request.stock).toMatchObject([{ quantity: null }]);
  });

  it("is laid by the nester without a word", () => {
    for (const task of sheetTasks({ document: sign(), ...given })) {
      const laid = nestSheets({ ...task.request, effort: 0 }, {}, kernel);
      expect(laid).toMatchObject({ ok: true, value: { unplaced: [] } });
    }
  });
});

describe("what is cut from stock lengths", () => {
  const stock = sign().backer.stock;
  const slatted: MockupDocument = {
    ...sign(),
    backer: {
      ...sign().backer,
      slats: {
        stock,
        thickness: 9,
        pattern: "spine",
        angle: 45,
        slatWidth: 38.1,
        gap: 0,
        spineWidth: 38.1,
        spineOffset: 0,
        start: { kind: "corner" },
        direction: "up",
        overhang: 6,
      },
    },
    frame: { stock, width: 20, depth: 25, mitred: true },
  };

  it("is nothing for a plain board", () => {
    expect(barTasks({ document: sign(), saws: usualSaws, unit: "mm", kernel })).toEqual([]);
  });

  it("is slats, spine and frame, with the ends that the saw makes", () => {
    const [slats, frame] = barTasks({ document: slatted, saws: usualSaws, unit: "mm", kernel });
    expect(slats?.title).toBe("Slats and spine: Eastern white pine, 38.1 × 9 mm");
    expect(slats?.job.parts.every(({ quantity }) => quantity === 3)).toBe(true);
    // Whole slats of 45 degrees have two parallel cuts, so they lie in each other.
    expect(slats?.job.parts[0]).toMatchObject({ start: { angle: 45 }, end: { angle: 45 } });
    expect(slats?.job.parts.at(-1)).toMatchObject({ id: "spine", lengthMm: 412, quantity: 3, start: { angle: 90 } });
    // Outside of a mitred frame: 600 + 2 · 20 and 400 + 2 · 20.
    expect(frame?.job.parts.map(({ lengthMm, start }) => [lengthMm, start.angle])).toEqual([
      [640, 45],
      [440, 45],
      [640, 45],
      [440, 45],
    ]);
  });

  it("takes a spine of another width, or a frame of another wood, from bars of its own", () => {
    const { slats } = slatted.backer;
    const wider = { ...slatted, backer: { ...slatted.backer, slats: slats && { ...slats, spineWidth: 50 } } };
    expect(barTasks({ document: wider, saws: usualSaws, unit: "mm", kernel }).map(({ title }) => title)).toEqual([
      "Slats: Eastern white pine, 38.1 × 9 mm",
      "Spine: Eastern white pine, 50 × 9 mm",
      "Frame: Eastern white pine, 20 × 25 mm",
    ]);
  });

  it("is planned without a word, every part once for each sign", () => {
    for (const { job } of barTasks({ document: slatted, saws: usualSaws, unit: "mm", kernel })) {
      const plan = planCutting(job, { work: 200_000 });
      expect(plan.ok).toBe(true);
      if (plan.ok) expect(plan.value.partCount).toBe(job.parts.length * 3);
    }
  });
});
