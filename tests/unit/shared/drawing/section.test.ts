import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Item } from "#shared/drawing/display-list.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import { drawSection, stepsAbove } from "#shared/drawing/section.ts";
import { spreadPlaces } from "#shared/drawing/section-labels.ts";
import { boxesOverlap, boxOfPath } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";
import { textBoxesOf } from "../../../support/text-boxes.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const draw = (depthScale: number, document = orreryBooks()) =>
  drawSection({ document, figures: computeFigures(document, kernel), unit: "mm", paperScale: 5, depthScale });

const planeItems = (list: ReturnType<typeof draw>): readonly Item[] => {
  const plane = list.items[0];
  if (plane?.kind !== "group") throw new Error("The section has no board plane.");
  return plane.items;
};

function boxNamed(list: ReturnType<typeof draw>, id: string) {
  const item = planeItems(list).find((each) => each.kind === "path" && each.id === id);
  return item?.kind === "path" ? boxOfPath(item.path) : null;
}

describe("the section", () => {
  it.each([1, 3])("draws heights true and depths %d times as deep", (depthScale) => {
    const list = draw(depthScale);
    // Backer 20; the disc on 19 mm barrels, 4.5 thick, 260 high from y = 30.
    expect(boxNamed(list, "board")).toEqual({ x: 0, y: 0, width: 20 * depthScale, height: 400 });
    const disc = boxNamed(list, "layer:B");
    expect(disc?.x).toBeCloseTo(39 * depthScale, 6);
    expect(disc?.width).toBeCloseTo(4.5 * depthScale, 6);
    expect(disc?.y).toBeCloseTo(30, 1);
    expect(disc?.height).toBeCloseTo(260, 1);
  });

  it("draws barrels from the wood to the panel and caps on it, one a height", () => {
    const list = draw(1);
    const metal = planeItems(list).flatMap((item) =>
      item.kind === "path" && item.id?.startsWith("hole:") ? [boxOfPath(item.path)] : [],
    );
    expect(metal.map((box) => [box?.x, box?.width, box?.height])).toEqual([
      [20, 19, 15],
      [20, 19, 15],
      [43.5, 4, 18],
      [43.5, 4, 18],
    ]);
  });

  it("keys every layer and the backer with the top above the back of the board", () => {
    const texts = textBoxesOf(draw(1)).map(({ text }) => text);
    expect(texts).toEqual(expect.arrayContaining(["A", "B", "C", "D", "E", "F", "G", "20", "43.5", "46.5", "24.5"]));
  });

  it("dimensions backer, offset, gap and the depth off the wall", () => {
    // Highest is a cap: 20 + 19 + 4.5 + 4 = 47.5; with the gap of 6: 53.5.
    const texts = textBoxesOf(draw(1)).map(({ text }) => text);
    expect(texts).toEqual(expect.arrayContaining(["20", "19", "6", "53.5"]));
  });

  it("has its board where it says, for the elevation to stand beside", () => {
    const list = draw(1);
    expect(boardOriginOf(list)?.y).toBeGreaterThan(0);
    expect((boardOriginOf(list)?.y ?? 0) + 400).toBeLessThan(list.heightMm);
  });

  it("of a bare board has no depth but its own", () => {
    const list = draw(1, { ...orreryBooks(), layers: [], hanging: { ...orreryBooks().hanging, kind: "none", gap: 0 } });
    expect(textBoxesOf(list).map(({ text }) => text)).toEqual(["20", "20", "A", "20", "Top at"]);
  });
});

describe("heights with their tolerances", () => {
  const banded = () =>
    drawSection({
      document: orreryBooks(),
      figures: computeFigures(orreryBooks(), kernel),
      unit: "mm",
      paperScale: 5,
      depthScale: 1,
      heights: "with bands",
    });

  it("stand below the height that is meant, and no lettering runs into another", () => {
    const boxes = textBoxesOf(banded());
    const of = (text: string) => boxes.find((box) => box.text === text);
    // Cast 4.5 mm sheet on barrels of 19 on a board of 20: 43.5 ± (0.4 + 0.45).
    expect(of("42.65 to 44.35")?.box.y).toBeGreaterThan(of("43.5")?.box.y ?? Number.POSITIVE_INFINITY);
    for (const [index, one] of boxes.entries())
      for (const other of boxes.slice(index + 1))
        expect(boxesOverlap(one.box, other.box), `${one.text} and ${other.text}`).toBe(false);
  });
});

describe("the steps above the section", () => {
  it("are the backer and each height that barrels stand, once for layers of one height", () => {
    const document = orreryBooks();
    // The disc at a third of its size, left and right on the board.
    const discs = [150, 450].flatMap((x, place) =>
      document.layers.flatMap((layer) => {
        if (layer.hold.kind !== "standoff") return [];
        const id = (before: string) => `${before} ${place}`;
        const holes = layer.hold.holes.map((hole) => ({ ...hole, id: id(hole.id), x: x + (hole.x - 300) / 3 }));
        const pieces = layer.pieces.map((piece) => ({
          ...piece,
          id: id(piece.id),
          placement: { ...piece.placement, x, scale: 1 / 3 },
        }));
        return [{ ...layer, key: place === 0 ? "B" : "C", pieces, hold: { ...layer.hold, holes } }];
      }),
    );
    const twice = { ...document, layers: discs };
    expect(discs).toHaveLength(2);
    expect(stepsAbove(document, computeFigures(document, kernel))).toEqual([
      { from: 0, to: 20 },
      { from: 20, to: 39 },
    ]);
    expect(stepsAbove(twice, computeFigures(twice, kernel))).toEqual([
      { from: 0, to: 20 },
      { from: 20, to: 39 },
    ]);
  });
});

describe("spreadPlaces", () => {
  it.each([
    { wanted: [0, 50, 100], places: [0, 50, 100] },
    { wanted: [50, 50], places: [45, 55] },
    { wanted: [1, 1], places: [0, 10] },
    { wanted: [], places: [] },
  ])("$wanted ten apart becomes $places", ({ wanted, places }) => {
    expect(spreadPlaces(wanted, { pitch: 10, least: 0 })).toEqual(places);
  });
});
