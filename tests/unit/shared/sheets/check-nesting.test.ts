import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path } from "#shared/geometry/path.ts";
import { circlePath, polygonRing, rectanglePath } from "#shared/geometry/shapes.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { NestingRequest } from "#shared/sheets/nesting.ts";
import { buildPiece, buildRequest, buildSheet } from "../../../support/concave-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const outline = (...points: readonly (readonly [number, number])[]): Path => [
  polygonRing(points.map(([x, y]) => ({ x, y }))),
];
const square = rectanglePath({ x: 0, y: 0, width: 50, height: 50 });
const piece = buildPiece("a", square, { name: "Badge" });
const sheet = buildSheet(600, 400);
const bowTie = outline([0, 0], [50, 50], [50, 0], [0, 50]);
const overlapping: Path = [...square, ...rectanglePath({ x: 25, y: 25, width: 50, height: 50 })];
const rules = (wanted: Partial<NestingRequest["rules"]>) => buildRequest([piece], [sheet], { rules: wanted });
const turned = (from: number, every: number) =>
  buildRequest([{ ...piece, turns: { kind: "steps", from, every } }], [sheet]);

describe("what can't be nested is refused in words", () => {
  it.each([
    { field: "pieces", words: "There is no piece to cut.", request: buildRequest([], [sheet]) },
    { field: "stock", words: "There is no sheet to cut from.", request: buildRequest([piece], []) },
    { field: "rules.marginMm", words: "The margin must be a number.", request: rules({ marginMm: Number.NaN }) },
    {
      field: "rules.marginMm",
      words: "The margin is -1 mm; it must be at least 0 mm.",
      request: rules({ marginMm: -1 }),
    },
    { field: "rules.kerfMm", words: "The kerf is 21 mm; it must be at most 20 mm.", request: rules({ kerfMm: 21 }) },
    { field: "rules.spacingMm", words: "The spacing must be a number.", request: rules({ spacingMm: Infinity }) },
    {
      field: "rules.bed.widthMm",
      words: "The bed's width is 0 mm; it must be at least 10 mm.",
      request: rules({ bed: { widthMm: 0, heightMm: 500, larger: "split" } }),
    },
    {
      field: "pieces.0.quantity",
      words: "The quantity of Badge is 0; it must be at least 1.",
      request: buildRequest([{ ...piece, quantity: 0 }], [sheet]),
    },
    {
      field: "pieces.0.quantity",
      words: "The quantity of Badge must be a whole number, not 1.5.",
      request: buildRequest([{ ...piece, quantity: 1.5 }], [sheet]),
    },
    {
      field: "pieces",
      words: "10001 pieces are more than one layout takes: at most 10000.",
      request: buildRequest([piece, buildPiece("b", square, { quantity: 10_000 })], [sheet]),
    },
    { field: "pieces", words: "Two of the pieces are called a.", request: buildRequest([piece, piece], [sheet]) },
    {
      field: "pieces.0.turns.every",
      words: "The step in which Badge is turned is 0°; it must be at least 1°.",
      request: turned(0, 0),
    },
    {
      field: "pieces.0.turns.every",
      words: "The step in which Badge is turned must go into a full turn, as 15°, 90° or 180° do.",
      request: turned(0, 70),
    },
    { field: "pieces.0.turns.from", words: "The turn of Badge must be a number.", request: turned(Number.NaN, 90) },
    {
      field: "effort",
      words: "The effort must be a number.",
      request: buildRequest([piece], [sheet], { effort: Number.NaN }),
    },
    {
      field: "seed",
      words: "The seed must be a whole number, not 0.5.",
      request: buildRequest([piece], [sheet], { seed: 0.5 }),
    },
    {
      field: "pieces.0.path",
      words: "The outline of Badge crosses itself. Join or part its shapes where it does.",
      request: buildRequest([{ ...piece, path: bowTie }], [sheet]),
    },
    {
      field: "pieces.0.path",
      words: "The outline of Badge crosses itself. Join or part its shapes where it does.",
      request: buildRequest([{ ...piece, path: overlapping }], [sheet]),
    },
    {
      field: "pieces.0.path",
      words: "Badge has no outline.",
      request: buildRequest([{ ...piece, path: [] }], [sheet]),
    },
    {
      field: "pieces.0.path",
      words: "The outline of Badge encloses no area.",
      request: buildRequest([{ ...piece, path: outline([0, 0], [50, 0], [25, 0]) }], [sheet]),
    },
    {
      field: "pieces.0.path",
      words: "The outline of Badge has points that are no numbers or lie too far out.",
      request: buildRequest([{ ...piece, path: outline([0, 0], [Number.NaN, 0], [25, 9]) }], [sheet]),
    },
    {
      field: "pieces.0.path",
      words: "The outline of Badge has points that are no numbers or lie too far out.",
      request: buildRequest([{ ...piece, path: outline([0, 0], [1e9, 0], [25, 9]) }], [sheet]),
    },
    {
      field: "stock.0.path",
      words: "The outline of Sheet crosses itself. Join or part its shapes where it does.",
      request: buildRequest([piece], [{ ...sheet, path: bowTie }]),
    },
    {
      field: "stock.0.quantity",
      words: "The quantity of Sheet is -1; it must be at least 0.",
      request: buildRequest([piece], [{ ...sheet, quantity: -1 }]),
    },
    {
      field: "stock",
      words: "No sheet in stock can be used. Inside its margin Sheet has no room for anything.",
      request: rules({ marginMm: 200 }),
    },
  ])("$words", ({ field, words, request }) => {
    expect(nestSheets(request, {}, kernel)).toEqual({ ok: false, problems: [{ field, words }] });
  });

  it("everything that is wrong is said at once", () => {
    const request = buildRequest([{ ...piece, path: bowTie }, buildPiece("b", [], { name: "Bar" })], [sheet]);
    const outcome = nestSheets(request, {}, kernel);
    expect(outcome.ok ? [] : outcome.problems.map(({ field }) => field)).toEqual(["pieces.0.path", "pieces.1.path"]);
  });

  it("a margin of nothing and no kerf are no mistakes: four squares fill their sheet", () => {
    const request = buildRequest([{ ...piece, quantity: 4 }], [buildSheet(100, 100, { quantity: 1 })], {
      rules: { marginMm: 0, kerfMm: 0 },
    });
    const outcome = nestSheets(request, {}, kernel);
    expect(outcome.ok && outcome.value.sheets[0]?.use).toBe(1);
  });

  it("a ring, whose inner outline is an opening, is none that crosses itself", () => {
    const ring = [...circlePath({ x: 0, y: 0 }, 40), ...circlePath({ x: 0, y: 0 }, 30)];
    expect(nestSheets(buildRequest([{ ...piece, path: ring }], [sheet]), {}, kernel).ok).toBe(true);
  });
});
