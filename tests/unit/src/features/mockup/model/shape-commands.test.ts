import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path } from "#shared/geometry/path.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { documentSchema, type MockupDocument, type Piece, type PieceSource } from "#shared/mockup/document.ts";
import { cutAway } from "#shared/shaping/cut-away.ts";
import { joinOutlines } from "#shared/shaping/join-outlines.ts";
import { looseBits } from "#shared/shaping/loose-bits.ts";
import { marginPlate } from "#shared/shaping/margin-plate.ts";
import { splitToBed } from "#shared/shaping/split-to-bed.ts";
import { addLayer } from "@/features/mockup/model/commands/add-layer.ts";
import { addMargin } from "@/features/mockup/model/commands/add-margin.ts";
import { addPlate, addPlateToLayer, type PlateShape } from "@/features/mockup/model/commands/add-plate.ts";
import { cutAwayPieces, dropLooseBits, joinPieces, splitPiece } from "@/features/mockup/model/commands/shape-pieces.ts";
import { lockLayer } from "@/features/mockup/model/commands/show-layer.ts";
import { cutReasons, cutTargets, cutTools } from "@/features/mockup/model/cut-choices.ts";
import { chooseLayer, type Selection } from "@/features/mockup/model/selection.ts";
import { barrel, brass, cement, emptyMockup } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const [sun, moon] = ["0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11", "5e1f0c88-7d0a-4f6b-8f3e-2b9c6d7e8f90"] as const;
const artwork = (artworkId: string): PieceSource => ({ kind: "artwork", artworkId, index: 0, colour: "#112233" });

const piece = (id: string, path: Path, fields: Partial<Piece> = {}): Piece => ({
  id,
  name: "",
  source: { kind: "plate" },
  path: path.map(({ start, segments }) => ({ start, segments: [...segments] })),
  placement: { x: 0, y: 0, turn: 0, scale: 1, mirrored: false },
  reads: "",
  ...fields,
});
const box = (x: number, y: number, width: number, height: number) => rectanglePath({ x, y, width, height });

const bonded = { stock: brass, thickness: 3, hold: { kind: "bond", adhesive: cement } } as const;

/** Layers of these pieces from the wall outward, keys from B. */
function sign(...layers: readonly (readonly Piece[])[]): MockupDocument {
  return layers.reduce(
    (document, pieces, index) =>
      addLayer(document, { ...bonded, name: `Layer ${index + 1}`, id: `l${index}`, site: inside, pieces }),
    emptyMockup(),
  );
}

/** The same with standoffs at places of the first layer. */
function standing(document: MockupDocument, places: readonly (readonly [number, number])[]): MockupDocument {
  const [first, ...rest] = document.layers;
  if (!first) return document;
  const holes = places.map(([x, y], index) => ({ id: `hole${index}`, x, y, diameter: 8, fixed: index === 0 }));
  const hold = { kind: "standoff" as const, hardware: barrel(19), offset: 19, holes };
  return { ...document, layers: [{ ...first, hold }, ...rest] };
}

const piecesOf = (document: MockupDocument, index = 0) => document.layers[index]?.pieces ?? [];
const boxOf = ({ path, placement }: Piece) => boxOfPath(placePath(path, placement));
const areaOf = ({ path, placement }: Piece) =>
  regionAreaMm2(kernel.union(flattenPath(placePath(path, placement), 0.001), "evenodd"));
const holesOf = (document: MockupDocument) => {
  const hold = document.layers[0]?.hold;
  return hold?.kind === "standoff" ? hold.holes : [];
};
const isValid = (document: MockupDocument) =>
  expect(documentSchema.safeParse(document).error?.issues ?? []).toEqual([]);

describe("a plate", () => {
  const add = (shape: PlateShape) =>
    piecesOf(addPlate(emptyMockup(), { ...bonded, name: "Plate", id: "p", site: inside, shape }))[0];

  it.each([
    { shape: { kind: "ellipse", width: 120, height: 70 } as const, area: Math.PI * 60 * 35 },
    { shape: { kind: "circle", diameter: 90 } as const, area: Math.PI * 45 * 45 },
    { shape: { kind: "rounded", width: 80, height: 50, radius: 12 } as const, area: 80 * 50 - (4 - Math.PI) * 144 },
    { shape: { kind: "rectangle", width: 80, height: 50 } as const, area: 4000 },
  ])("of $shape covers what it should", ({ shape, area }) => {
    const plate = add(shape);
    // A quarter circle as one cubic covers at most 0.028 % too much.
    expect(Math.abs((plate ? areaOf(plate) : 0) / area - 1)).toBeLessThan(3e-4);
    expect(plate?.placement).toMatchObject({ x: 300, y: 200 });
  });

  it("of an impossible size is none", () => {
    expect(add({ kind: "ellipse", width: 0, height: 10 })).toBeUndefined();
    expect(add({ kind: "rounded", width: 10, height: 10, radius: Number.NaN })).toBeUndefined();
  });

  it("comes into a layer that is there, and into no locked one", () => {
    const before = sign([piece("a", box(0, 0, 10, 10))]);
    const plate = { key: "B", shape: { kind: "circle", diameter: 20 } as const, id: "p", name: "Disc" };
    const after = addPlateToLayer(before, plate);
    expect(piecesOf(after).map(({ id, name }) => [id, name])).toEqual([
      ["a", ""],
      ["p", "Disc"],
    ]);
    isValid(after);
    const locked = lockLayer(before, { key: "B", locked: true });
    expect(addPlateToLayer(locked, plate)).toBe(locked);
  });
});

describe("a margin plate", () => {
  it("lies right under what it follows, and knows whose artwork that is", () => {
    const before = sign(
      [piece("a", box(0, 0, 10, 10))],
      [
        piece("b", box(100, 100, 40, 20), { source: artwork(sun) }),
        piece("c", box(130, 100, 40, 20), { source: artwork(moon) }),
      ],
    );
    const followed = piecesOf(before, 1);
    const choice = { marginMm: 8, corners: "sharp", openings: "filled" } as const;
    const made = marginPlate(followed, choice, kernel);
    const after = addMargin(before, {
      ...bonded,
      name: "Back",
      id: "m",
      site: inside,
      place: { under: "C" },
      pieceIds: ["b", "c"],
      plates: made?.plates ?? [],
      choice,
    });
    expect(after.layers.map(({ key }) => key)).toEqual(["B", "D", "C"]);
    const [plate] = piecesOf(after, 1);
    expect(plate).toMatchObject({
      name: "Back",
      source: { kind: "margin", margin: 8, corners: "sharp", artworkIds: [sun, moon] },
      placement: { x: 135, y: 110 },
    });
    expect(plate && boxOf(plate)).toEqual({ x: 92, y: 92, width: 86, height: 36 });
    isValid(after);
  });
});

describe("joining pieces", () => {
  it("makes one piece that reads in reading order, in the first one's place, and keeps the holes", () => {
    const before = standing(
      sign([
        piece("z", box(0, 0, 5, 5)),
        piece("n", box(128, 100, 30, 40), { reads: "N", source: artwork(moon) }),
        piece("i", box(100, 100, 30, 40), { reads: "I", name: "First", source: artwork(sun) }),
      ]),
      [[105, 110]],
    );
    const joined = joinOutlines(piecesOf(before).slice(1), kernel);
    const after = joinPieces(before, { joined, id: "j" });
    expect(piecesOf(after).map(({ id }) => id)).toEqual(["z", "j-1"]);
    expect(piecesOf(after)[1]).toMatchObject({
      name: "First",
      reads: "IN",
      source: { kind: "worked", how: "joined", artworkIds: [moon, sun] },
    });
    expect(holesOf(after)).toEqual(holesOf(before));
    isValid(after);
  });

  it("does nothing to a locked layer, nor to pieces that are gone", () => {
    const before = sign([piece("a", box(0, 0, 10, 10)), piece("b", box(5, 0, 10, 10))]);
    const joined = joinOutlines(piecesOf(before), kernel);
    const locked = lockLayer(before, { key: "B", locked: true });
    expect(joinPieces(locked, { joined, id: "j" })).toBe(locked);
    const without = sign([piece("a", box(0, 0, 10, 10))]);
    expect(joinPieces(without, { joined, id: "j" })).toBe(without);
  });
});

describe("cutting away", () => {
  const words = {
    id: "w",
    words: "O",
    face: "plain",
    fontSha256: "0".repeat(64),
    capHeight: 20,
    letterSpacing: 0,
    kerning: true,
    lineSpacing: 30,
    align: "left" as const,
    along: { kind: "line" as const },
  };
  const letter = piece("bar", box(0, 0, 100, 20), {
    reads: "O",
    name: "Bar",
    source: { kind: "lettering", letteringId: "w", letter: 0, laid: { x: 0, y: 0, turn: 0 } },
  });
  const barred = () => ({
    ...standing(sign([letter], [piece("cut", box(40, -5, 10, 30), { source: artwork(sun) })]), [
      [10, 10],
      [45, 10],
      [90, 10],
    ]),
    lettering: [words],
  });
  const cutOf = (document: MockupDocument) =>
    cutAway(piecesOf(document), { by: piecesOf(document, 1), roomMm: 2 }, kernel);

  it("leaves parts with their holes; the hole in what went goes, and words of which no piece is left", () => {
    const start = barred();
    const after = cutAwayPieces(start, { cut: cutOf(start), by: ["cut"], useUp: false, id: "k" });
    expect(piecesOf(after).map(({ id, name, reads }) => [id, name, reads])).toEqual([
      ["k-1-1", "Bar, part 1 of 2", "O"],
      ["k-1-2", "Bar, part 2 of 2", ""],
    ]);
    expect(piecesOf(after)[0]?.source).toEqual({ kind: "worked", how: "cut away", artworkIds: [sun] });
    expect(holesOf(after).map(({ id }) => id)).toEqual(["hole0", "hole2"]);
    expect(piecesOf(after, 1).map(({ id }) => id)).toEqual(["cut"]);
    expect(after.lettering).toEqual([]);
    isValid(after);
  });

  it("uses up what it cut with when that is wished, unless it is locked", () => {
    const start = barred();
    const args = { cut: cutOf(start), by: ["cut"], useUp: true, id: "k" };
    expect(piecesOf(cutAwayPieces(start, args), 1)).toEqual([]);
    const locked = lockLayer(start, { key: "C", locked: true });
    expect(piecesOf(cutAwayPieces(locked, args), 1)).toHaveLength(1);
    const shut = lockLayer(start, { key: "B", locked: true });
    expect(cutAwayPieces(shut, args)).toBe(shut);
  });
});

it("loose bits go from a piece that keeps its id, turn and reading, with the holes in them", () => {
  const crumbs = piece("p", [...box(0, 0, 30, 30), ...box(50, 0, 3, 3)], {
    reads: "!",
    placement: { x: 10, y: 20, turn: 90, scale: 2, mirrored: true },
  });
  const before = standing(sign([crumbs, piece("dot", box(200, 0, 2, 2))]), [[0, 0]]);
  const found = looseBits(piecesOf(before), { areaMm2: 40, widthMm: 0 }, kernel);
  const after = dropLooseBits(before, { found });
  expect(piecesOf(after)).toHaveLength(1);
  expect(piecesOf(after)[0]).toMatchObject({
    id: "p",
    reads: "!",
    source: { kind: "worked", how: "trimmed" },
    placement: { turn: 90, scale: 2, mirrored: true },
  });
  expect(piecesOf(after).map(areaOf)[0]).toBeCloseTo(3600, 3);
  expect(piecesOf(after).map(boxOf)[0]).toEqual({ x: -50, y: -40, width: 60, height: 60 });
  isValid(after);
});

it("a piece is split into parts that hold their own holes and lie where it lay", () => {
  const panel = piece("p", box(-400, -100, 800, 200), {
    name: "Panel",
    reads: "OPEN",
    placement: { x: 300, y: 200, turn: 30, scale: 1, mirrored: true },
  });
  const before = standing(sign([panel]), [
    [0, 60],
    [600, 340],
  ]);
  const bed = { widthMm: 600, heightMm: 400 };
  const split = splitToBed(panel, bed, { seams: "across", count: null, shiftMm: 0 }, kernel);
  const parts = split?.parts.map(({ shaped }) => shaped) ?? [];
  const after = splitPiece(before, { pieceId: "p", parts, id: "s" });
  expect(piecesOf(after).map(({ id, name, reads }) => [id, name, reads])).toEqual([
    ["s-1", "Panel, part 1 of 2", "OPEN"],
    ["s-2", "Panel, part 2 of 2", ""],
  ]);
  expect(Math.abs(piecesOf(after).reduce((sum, one) => sum + areaOf(one), 0) - 160_000)).toBeLessThan(1);
  expect(holesOf(after)).toEqual(holesOf(before));
  isValid(after);
  const [one, other] = piecesOf(after).map(({ placement }) => placement);
  expect(Math.hypot((one?.x ?? 0) - (other?.x ?? 0), (one?.y ?? 0) - (other?.y ?? 0))).toBeCloseTo(400, 1);
});

describe("what can be cut", () => {
  const document = sign(
    [piece("a", box(0, 0, 10, 10), { name: "Disc" })],
    [piece("b", box(0, 0, 5, 5), { name: "Ring" }), piece("c", box(3, 0, 5, 5))],
    [piece("d", box(0, 0, 5, 5))],
  );
  const choice = (...pieceIds: string[]): Selection => ({ layerKey: "B", pieceIds, holeId: null });

  it("says why a tool is idle", () => {
    const nothing = cutReasons(document, choice());
    expect(Object.values(nothing)).toEqual(Array(5).fill("Choose a layer or pieces first."));
    expect(cutReasons(document, choice("b")).join).toBe("Choose two or more pieces of a layer.");
    expect(cutReasons(document, choice("a", "b")).join).toMatch(/^Choose pieces of one layer/);
    expect(cutReasons(document, choice("b", "c"))).toEqual({
      margin: null,
      join: null,
      cutAway: null,
      looseBits: null,
      split: null,
    });
    const locked = cutReasons(lockLayer(document, { key: "C", locked: true }), choice("b", "c"));
    expect(locked).toMatchObject({ margin: null, join: "C is locked. Unlock it first." });
  });

  it("offers the first chosen piece to be cut by the others, and a whole layer by the one over it", () => {
    const [first] = cutTargets(document, choice("b", "a"));
    expect(first?.title).toBe("Ring of C");
    expect(first && cutTools(document, choice("b", "a"), first).map(({ title }) => title)).toEqual([
      "the other chosen pieces",
      "all of D, Layer 3, over it",
      "all of B, Layer 1, under it",
    ]);
    const [whole] = cutTargets(document, chooseLayer(document, "C"));
    expect(whole?.title).toBe("all of C, Layer 2");
    expect(whole && cutTools(document, chooseLayer(document, "C"), whole)[0]?.title).toBe("all of D, Layer 3, over it");
  });
});
