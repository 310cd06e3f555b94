import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { boardOriginOf, drawElevation } from "#shared/drawing/elevation.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Coat, MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

let kernel: Kernel;
let rich: DisplayList;
beforeAll(async () => {
  kernel = await loadKernel();
  rich = draw(orreryBooks());
});

const draw = (document: MockupDocument, options: { dimensions?: boolean; wall?: boolean; unit?: "mm" | "in" } = {}) =>
  drawElevation({
    document,
    figures: computeFigures(document, kernel),
    kernel,
    unit: options.unit ?? "mm",
    dimensions: options.dimensions ?? true,
    paperScale: 5,
    wall: options.wall ?? false,
  });

function everyItem(items: readonly Item[]): Item[] {
  return items.flatMap((item) => ("items" in item ? [item, ...everyItem(item.items)] : [item]));
}
const idsOf = (list: DisplayList) =>
  everyItem(list.items).flatMap((item) => ("id" in item && item.id !== undefined ? [item.id] : []));
const textsOf = (list: DisplayList) =>
  everyItem(list.items).flatMap((item) => (item.kind === "text" ? [item.text] : []));

describe("the elevation of a rich sign", () => {
  it("names every piece, hole, layer and the board", () => {
    const document = orreryBooks();
    const ids = new Set(idsOf(rich));
    const pieces = document.layers.flatMap((layer) => layer.pieces.map(({ id }) => id));
    expect(pieces).toHaveLength(19);
    for (const id of [...pieces, "hole:h1", "hole:h4", "layer:B", "layer:G", "board", "board-plane"]) {
      expect(ids).toContain(id);
    }
  });

  it("draws what is higher later: board, disc, rings on it, planet on a ring", () => {
    const ids = idsOf(rich);
    const order = ["board", "letter-1", "disc", "ring-1", "planet-rust"].map((id) => ids.indexOf(id));
    expect(order).toEqual([...order].sort((a, b) => a - b));
    expect(order).not.toContain(-1);
  });

  it("casts one shadow on each level that has something above it: board, disc, rings", () => {
    const images = everyItem(rich.items).filter((item) => item.kind === "image" && item.opacity !== undefined);
    expect(images).toHaveLength(3);
  });

  it("dimensions the board, the chief layers and the holes in mm", () => {
    const texts = textsOf(rich);
    // 600 by 400; the disc 260 wide at (170, 30); hole centres 159.8 apart (113 mm from the middle at 45 degrees).
    expect(texts).toEqual(expect.arrayContaining(["600", "400", "B  260", "170", "30", "110", "B  holes 159.8"]));
  });

  it("dimensions in inches for a shop that works in them", () => {
    // 600 mm is 23.622 in: 23 and 10/16; 260 mm is 10.236 in: 10 and 4/16.
    expect(textsOf(draw(orreryBooks(), { unit: "in" }))).toEqual(expect.arrayContaining(["23 5/8″", "B  10 1/4″"]));
  });

  it("groups dimensions under names by which they can be left out", () => {
    const names = idsOf(rich).filter((id) => id.startsWith("dimension:"));
    expect(names).toEqual(["dimension:overall", "dimension:across", "dimension:down"]);
    expect(idsOf(draw(orreryBooks(), { dimensions: false })).some((id) => id.startsWith("dimension:"))).toBe(false);
  });

  it("says where the board lies, and keeps it inside the picture", () => {
    const list = rich;
    const origin = boardOriginOf(list);
    expect(origin?.x).toBeGreaterThan(40);
    expect((origin?.x ?? 0) + 600).toBeLessThan(list.widthMm);
    expect((origin?.y ?? 0) + 400).toBeLessThan(list.heightMm);
  });

  it("is the same each time", () => {
    expect(JSON.stringify(draw(orreryBooks()))).toBe(JSON.stringify(rich));
  });

  it("leaves hidden layers out, with what they would have thrown", () => {
    const document = orreryBooks();
    for (const layer of document.layers) layer.hidden = layer.key !== "G";
    const list = draw(document);
    expect(idsOf(list)).not.toContain("disc");
    expect(idsOf(list)).not.toContain("hole:h1");
    expect(everyItem(list.items).filter((item) => item.kind === "image" && item.opacity !== undefined)).toHaveLength(1);
  });
});

describe("the board's face", () => {
  const filled = (list: DisplayList) =>
    everyItem(list.items).flatMap((item) =>
      item.kind === "path" && item.id === "board" && item.fill ? [item.fill] : [],
    );
  const finished = (finish: Coat[]): MockupDocument => {
    const { backer, ...rest } = orreryBooks();
    return { ...rest, layers: [], backer: { ...backer, stock: { ...backer.stock, colour: "#E6CFA4" }, finish } };
  };
  const umber: Coat = { kind: "stain", name: "Umber", colour: "#3A2415", strength: 1, dryingHours: 8 };

  it("is the wood's own colour when it is bare or only sanded", () => {
    expect(filled(draw(finished([])))).toEqual(["#E6CFA4"]);
    expect(filled(draw(finished([{ kind: "sanding", grit: 180 }])))).toEqual(["#E6CFA4"]);
  });

  it("is stained when it is stained, with the grain on it", () => {
    const grainOf = (list: DisplayList) => everyItem(list.items).find((item) => item.kind === "image");
    const [bare, stained] = [draw(finished([])), draw(finished([umber]))];
    expect(filled(stained)).toEqual(["#3A2415"]);
    expect(grainOf(stained)).toBeDefined();
    expect(grainOf(stained)).not.toEqual(grainOf(bare));
  });
});

describe("an empty board", () => {
  it("is drawn with its own dimensions and no shadow", () => {
    const list = draw({ ...orreryBooks(), layers: [] });
    expect(textsOf(list)).toEqual(["600", "400"]);
    expect(everyItem(list.items).some((item) => item.kind === "image" && item.opacity !== undefined)).toBe(false);
  });

  it("throws its own shadow on the wall, when there is one", () => {
    const list = draw({ ...orreryBooks(), layers: [] }, { wall: true, dimensions: false });
    expect(everyItem(list.items).filter((item) => item.kind === "image" && item.opacity !== undefined)).toHaveLength(1);
  });
});
