import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Item } from "#shared/drawing/display-list.ts";
import { labelRoom } from "#shared/drawing/label-room.ts";
import { drawNestingDiagrams } from "#shared/drawing/nesting-diagram.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { SheetPiece, StockSheet } from "#shared/sheets/nesting.ts";
import { annulus, buildPiece, buildRequest, buildSheet } from "../../../support/concave-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

function drawn(pieces: readonly SheetPiece[], stock: readonly StockSheet[]) {
  const outcome = nestSheets(buildRequest(pieces, stock), {}, kernel);
  if (!outcome.ok) throw new Error("Not nested.");
  return drawNestingDiagrams({ layout: outcome.value, pieces, stock, unit: "mm", widthMm: 180, heightMm: 120 });
}

const texts = (items: readonly Item[]): string[] => items.flatMap((item) => (item.kind === "text" ? [item.text] : []));
const plate = (width: number, height: number, overrides: Partial<SheetPiece> = {}) =>
  buildPiece("plate", rectanglePath({ x: 0, y: 0, width, height }), { name: "Plate", ...overrides });

describe("a layout as drawings", () => {
  it("shows each sheet with its name, size, use and scale, and what lies on it", () => {
    const pages = drawn([plate(400, 290, { quantity: 3 })], [buildSheet(900, 300, { name: "Acrylic 3 mm" })]);
    expect(pages.map(({ items }) => texts(items))).toEqual([
      ["Acrylic 3 mm", "1 of 2", "900 × 300 mm, 86 % used, at 1:5", "Plate", "Plate", "2 × Plate"],
      ["Acrylic 3 mm", "2 of 2", "900 × 300 mm, 43 % used, at 1:5", "left 494 × 300 mm", "Plate", "Plate"],
    ]);
  });

  it("draws a piece where it lies, to scale: 400 mm at 1:5.007 from a margin of 3", () => {
    const [page] = drawn([plate(400, 290)], [buildSheet(900, 300)]);
    const piece = page?.items.find((item) => item.kind === "path" && item.id === "piece:plate");
    const box = piece?.kind === "path" ? boxOfPath(piece.path) : null;
    // 900 mm on 179.75 of paper; the sheet begins half a line from the left and under 13 mm of heading.
    expect(box?.width).toBeCloseTo((400 * 179.75) / 900, 9);
    expect(box?.x).toBeCloseTo(0.125 + (3 * 179.75) / 900, 9);
    expect(box?.y).toBeCloseTo(13.125 + (3 * 179.75) / 900, 9);
  });

  it("leaves a name out where it has no room and lists it below all the same", () => {
    const [page] = drawn([plate(10, 10)], [buildSheet(2000, 1000)]);
    expect(texts(page?.items ?? []).filter((text) => text === "Plate")).toHaveLength(1);
  });

  it("draws nothing for a sheet without pieces", () => {
    expect(drawn([plate(4000, 10)], [buildSheet(900, 300)])).toEqual([]);
  });
});

describe("room for a label", () => {
  const ring = [0, 1].map((at) => annulus(50, 20)[at]).flatMap((each) => (each ? [each] : []));
  const regionOfRing = ring.map(({ start, segments }) => [start, ...segments.map(({ to }) => to)]);

  it("is found beside an opening, not on it", () => {
    // Corners only, so a square frame on its tip: at the middle each side is 30 wide.
    const at = labelRoom(regionOfRing, 12, 2);
    expect(at).not.toBeNull();
    expect(Math.abs(at?.x ?? 0) + Math.abs(at?.y ?? 0)).toBeGreaterThan(20);
  });

  it("is not found where the text is wider than the shape", () => {
    expect(labelRoom(regionOfRing, 120, 2)).toBeNull();
  });
});
