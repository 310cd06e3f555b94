import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { boardOriginOf, drawElevation } from "#shared/drawing/elevation.ts";
import { scheduleRows } from "#shared/drawing/schedule.ts";
import { drawSection } from "#shared/drawing/section.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import { pine, slatSign, walnut, walnutFrame } from "../../../support/slat-signs.ts";

// What was drawn of one document is known again when the next test draws a part of it.
let kernel: Kernel;
beforeAll(async () => {
  kernel = rememberingKernel(await loadKernel());
});
const plain = slatSign();
const framed: MockupDocument = { ...plain, frame: walnutFrame };

const draw = (document: MockupDocument, options: { dimensions?: boolean; wall?: boolean } = {}) =>
  drawElevation({
    document,
    figures: computeFigures(document, kernel),
    kernel,
    unit: "mm",
    dimensions: options.dimensions ?? false,
    paperScale: 5,
    wall: options.wall ?? false,
  });
const section = (document: MockupDocument) =>
  drawSection({ document, figures: computeFigures(document, kernel), unit: "mm", paperScale: 5, depthScale: 1 });

function everyItem(items: readonly Item[]): Item[] {
  return items.flatMap((item) => ("items" in item ? [item, ...everyItem(item.items)] : [item]));
}
const textsIn = (items: readonly Item[]) =>
  everyItem(items).flatMap((item) => (item.kind === "text" ? [item.text] : []));
const pathsOf = (list: DisplayList) => everyItem(list.items).flatMap((item) => (item.kind === "path" ? [item] : []));
const boxNamed = (list: DisplayList, id: string) => {
  const found = pathsOf(list).find((item) => item.id === id);
  return found ? boxOfPath(found.path) : null;
};
const overall = (list: DisplayList) => {
  const found = everyItem(list.items).find((item) => item.kind === "group" && item.id === "dimension:overall");
  return found?.kind === "group" ? textsIn(found.items) : [];
};
const bare = (document: MockupDocument): MockupDocument => ({ ...document, layers: [] });
const round = { outline: { kind: "ellipse" }, width: 600, height: 400, measures: "body" } as const;

describe("slats from the front", () => {
  it("are one picture of grain inside the board's outline, with a line round every one of them", () => {
    const items = everyItem(draw(bare(plain)).items);
    expect(items.filter(({ kind }) => kind === "image")).toHaveLength(1);
    const lines = pathsOf(draw(bare(plain))).find(({ path, fill }) => path.length > 20 && fill === undefined);
    // 13 strips on each side of 281 by 400 at 45 degrees: (281 + 400) / (38 · √2) = 12.7, and the spine.
    expect(lines?.path).toHaveLength(27);
  });

  it("with gaps show the substrate between them, in shadow", () => {
    const paths = pathsOf(draw(bare(slatSign({ gap: 6 }))));
    expect(paths.find(({ id }) => id === "board")?.fill).not.toBe(pathsOf(draw(bare(plain)))[0]?.fill);
    expect(paths.some(({ fill, opacity }) => fill === "#1A1208" && opacity !== undefined)).toBe(true);
    expect(pathsOf(draw(bare(plain))).some(({ opacity }) => opacity !== undefined)).toBe(false);
  });

  it("end at the outline of a round board", () => {
    const list = draw(bare(slatSign({}, { board: round })));
    const clip = everyItem(list.items).find((item) => item.kind === "clip");
    expect(clip?.kind === "clip" && clip.clip[0]?.segments.every(({ kind }) => kind === "cubic")).toBe(true);
  });

  it("that can't be laid leave a plank of their wood", () => {
    const list = draw(bare(slatSign({ slatWidth: 5000, stock: walnut })));
    expect(pathsOf(list).find(({ id }) => id === "board")?.fill).toBe(walnut.colour);
  });
});

describe("a frame from the front", () => {
  it("lies outside the body, and the picture has room for it", () => {
    const list = draw(framed);
    expect(boxNamed(list, "frame")).toEqual({ x: -18, y: -18, width: 636, height: 436 });
    expect(boxNamed(list, "board")).toEqual({ x: 0, y: 0, width: 600, height: 400 });
    const origin = boardOriginOf(list) ?? { x: 0, y: 0 };
    expect(origin.x).toBeGreaterThan(18);
    expect(list.widthMm - origin.x).toBeGreaterThan(618);
    expect(list.heightMm - origin.y).toBeGreaterThan(418);
  });

  it("is dimensioned over all, the body inside it too; without one the body alone", () => {
    expect(overall(draw(framed, { dimensions: true }))).toEqual(["body 600", "body 400", "636", "436"]);
    expect(overall(draw(plain, { dimensions: true }))).toEqual(["600", "400"]);
  });

  it("keeps the dimensions of the layers outside it", () => {
    const list = draw(framed, { dimensions: true });
    const rows = everyItem(list.items).find((item) => item.kind === "group" && item.id === "dimension:across");
    const lines = rows?.kind === "group" ? rows.items.flatMap((item) => (item.kind === "line" ? item.points : [])) : [];
    expect(Math.min(...lines.map(({ y }) => y))).toBeGreaterThan(418);
  });

  it("throws its shadow on the wall and, where it stands proud, on the face", () => {
    const shadows = (depth: number, wall: boolean) =>
      everyItem(draw(bare({ ...plain, frame: { ...walnutFrame, depth } }), { wall }).items).flatMap((item) =>
        item.kind === "image" && item.opacity !== undefined ? [item.box] : [],
      );
    // The face lies at 12 + 8 - 0.3 mm: level with it a frame throws nothing.
    expect(shadows(19.7, false)).toEqual([]);
    expect(shadows(30, false)).toHaveLength(1);
    const [onWall] = shadows(19.7, true);
    // Light from the upper left: the shadow ends right of the frame, not only of the body.
    expect((onWall?.x ?? 0) + (onWall?.width ?? 0)).toBeGreaterThan(620);
  });

  it("is left out, with its room, where it can't go round the board", () => {
    const document = slatSign({}, { frame: walnutFrame, board: round });
    expect(signBox(document)).toEqual({ x: 0, y: 0, width: 600, height: 400 });
    expect(boxNamed(draw(document), "frame")).toBeNull();
    expect(overall(draw(document, { dimensions: true }))).toEqual(["600", "400"]);
  });
});

describe("slats and frame from the side", () => {
  it("show the substrate, each slat cut, and the frame at its depth above and below", () => {
    const list = section(bare(framed));
    expect(boxNamed(list, "board")).toEqual({ x: 0, y: 0, width: 12, height: 400 });
    const filled = (colour: string) => pathsOf(list).filter(({ fill }) => fill === colour);
    const slats = filled(pine.colour).map(({ path }) => boxOfPath(path));
    // 400 / (38 · √2) = 7.4: whole ones, and parts at the ends.
    expect(slats.length).toBeGreaterThanOrEqual(8);
    expect(slats.length).toBeLessThanOrEqual(9);
    for (const slat of slats) expect([slat?.x, slat?.width]).toEqual([12, expect.closeTo(7.7, 6)]);
    expect(slats.reduce((sum, slat) => sum + (slat?.height ?? 0), 0)).toBeCloseTo(400, 6);
    const frame = filled(walnut.colour).map(({ path }) => boxOfPath(path));
    expect(frame).toEqual([
      { x: 0, y: -18, width: 24, height: 18 },
      { x: 0, y: 400, width: 24, height: 18 },
    ]);
  });

  it("show how far the standoffs' screws reach into the wood, dashed", () => {
    const dashed = everyItem(section(plain).items).flatMap((item) =>
      item.kind === "line" && item.stroke.dashMm !== undefined && item.points.length === 6 ? [item.points] : [],
    );
    expect(dashed).toHaveLength(2);
    // A pan head on a floor of 3: 16 - 3 = 13 mm below the face at 19.7.
    for (const points of dashed) {
      expect(Math.min(...points.map(({ x }) => x))).toBeCloseTo(6.7, 6);
      expect(Math.max(...points.map(({ x }) => x))).toBeCloseTo(19.7, 6);
    }
  });
});

describe("the schedule", () => {
  it("says what the slats lie on, how thick both are, and what frames them", () => {
    const document = framed;
    const [first] = scheduleRows(document, computeFigures(document, kernel), "mm");
    expect(first).toMatchObject({
      what: "Backer, slats at 45°, framed in Black walnut 18 × 24, bare",
      stock: "Birch plywood, slats of Eastern white pine",
      thickness: "12 + 8",
    });
  });
});
