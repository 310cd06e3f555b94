import { expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import type { Board } from "#shared/mockup/document.ts";
import { boardPath } from "#shared/stack/board-outline.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { boardRegion } from "#shared/stack/piece-region.ts";
import { buildSign } from "../../../support/build-sign.ts";

const board = (outline: Board["outline"]): Board => ({ outline, width: 600, height: 400, measures: "body" });
const triangle: Board["outline"] = {
  kind: "path",
  path: [
    {
      start: { x: 5, y: 5 },
      segments: [
        { kind: "line", to: { x: 35, y: 5 } },
        { kind: "line", to: { x: 5, y: 25 } },
        { kind: "line", to: { x: 5, y: 5 } },
      ],
    },
  ],
};

// Closed forms: rectangle, rectangle less four corner squares with their quarter discs, ellipse, half a rectangle.
it.each([
  { outline: { kind: "rectangle" } as const, area: 240_000 },
  { outline: { kind: "rounded", radius: 50 } as const, area: 240_000 - (4 - Math.PI) * 2500 },
  { outline: { kind: "rounded", radius: 9000 } as const, area: 200 * 400 + Math.PI * 200 ** 2 },
  { outline: { kind: "ellipse" } as const, area: Math.PI * 300 * 200 },
  { outline: triangle, area: 120_000 },
])("a board with outline $outline.kind fills its measures and has its area", async ({ outline, area }) => {
  const kernel = await loadKernel();
  expect(boxOfPath(boardPath(board(outline)))).toEqual({ x: 0, y: 0, width: 600, height: 400 });
  expect(regionAreaMm2(boardRegion(board(outline), kernel)) / area).toBeCloseTo(1, 3);
});

it("a path without an extent is a rectangle rather than nothing", () => {
  const line: Board["outline"] = {
    kind: "path",
    path: [{ start: { x: 0, y: 0 }, segments: [{ kind: "line", to: { x: 10, y: 0 } }] }],
  };
  expect(boardPath(board(line))).toEqual(rectanglePath({ x: 0, y: 0, width: 600, height: 400 }));
});

it("an ellipse weighs what its area does", async () => {
  const kernel = await loadKernel();
  const mass = (outline: Board["outline"]) =>
    computeFigures(buildSign([], { board: board(outline) }), kernel).backerMassG;
  expect(mass({ kind: "ellipse" }) / mass({ kind: "rectangle" })).toBeCloseTo(Math.PI / 4, 3);
});
