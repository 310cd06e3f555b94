import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Item } from "#shared/drawing/display-list.ts";
import { drawOnWall } from "#shared/drawing/on-wall.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const draw = (document: MockupDocument) =>
  drawOnWall({ document, figures: computeFigures(document, kernel), kernel, unit: "mm" });
const idsOf = (items: readonly Item[]): string[] =>
  items.flatMap((item) => [
    ...("id" in item && item.id !== undefined ? [item.id] : []),
    ...("items" in item ? idsOf(item.items) : []),
  ]);

describe("the sign on its wall", () => {
  it("lies in planes from the wall outward, each as high as what it shows", () => {
    const document = orreryBooks();
    const { planes } = draw(document);
    const heights = planes.map(({ offWallMm }) => offWallMm);
    expect(heights).toEqual([...heights].sort((a, b) => a - b));
    expect(heights[0]).toBe(0);
    // The hanging's gap, then the backer's 20 mm; a disc of 4.5 mm on barrels of 19 mm; 3 mm on that.
    const offWall = (id: string) => planes.filter(({ list }) => idsOf(list.items).includes(id)).map((p) => p.offWallMm);
    expect(offWall("board")).toEqual([26]);
    expect(offWall("layer:B")[0]).toBeCloseTo(49.5, 6);
    expect(offWall("layer:D")[0]).toBeCloseTo(52.5, 6);
    // The body's edge, behind its face.
    expect(heights.filter((height) => height >= 6 && height < 26)).toHaveLength(8);
  });

  it("shows the sign with as much of the wall on every side as its shadow needs, and no wall's colour", () => {
    const document = orreryBooks();
    const { box, planes } = draw(document);
    expect(box.width - document.board.width).toBeCloseTo(-2 * box.x, 6);
    expect(box.height - document.board.height).toBeCloseTo(-2 * box.y, 6);
    for (const { list } of planes) expect([list.widthMm, list.heightMm]).toEqual([box.width, box.height]);
    const text = JSON.stringify(planes);
    expect(text).not.toContain(document.presentation.wall);
    expect(text).not.toContain('"kind":"text"');
  });

  it("leaves hidden layers out", () => {
    const document = orreryBooks();
    const layers = document.layers.map((layer) => ({ ...layer, hidden: layer.key === "C" }));
    const ids = draw({ ...document, layers }).planes.flatMap(({ list }) => idsOf(list.items));
    expect(ids).not.toContain("layer:C");
    expect(ids).toContain("layer:B");
  });
});
