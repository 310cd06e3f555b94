import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { type ArtworkToBringIn, bringInArtwork } from "@/features/mockup/model/commands/bring-in-artwork.ts";
import {
  boxOfPieces,
  movePieces,
  removePieces,
  scalePieces,
  turnPieces,
} from "@/features/mockup/model/commands/pieces.ts";
import { replaceArtwork } from "@/features/mockup/model/commands/replace-artwork.ts";
import { matchArtworks } from "@/features/mockup/model/match-artworks.ts";
import { layersForCome, reportReplacement } from "@/features/mockup/model/replacement-report.ts";
import { barrel, brass, cement, emptyMockup, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const oldId = "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c11";
const newId = "0b8f7c52-2c1e-4a55-9d55-0a2c5a1f9c22";

type Square = { colour: string; x: number; y: number; size: number };
const artworkOf = (
  artworkId: string,
  squares: readonly Square[],
  page = { width: 200, height: 100 },
): ArtworkToBringIn => ({
  artworkId,
  widthMm: page.width,
  heightMm: page.height,
  pieces: squares.map(({ colour, x, y, size }, index) => ({
    index,
    colour,
    path: rectanglePath({ x, y, width: size, height: size }),
    box: { x, y, width: size, height: size },
    areaMm2: size * size,
  })),
});
const gold = "#C8992F";
const blue = "#27314F";
const squares: Square[] = [
  { colour: blue, x: 10, y: 10, size: 60 },
  { colour: blue, x: 90, y: 20, size: 20 },
  { colour: gold, x: 130, y: 30, size: 40 },
];
const before = artworkOf(oldId, squares);

/** Blue on four standoffs (B, pieces in-1 and in-2), gold bonded (C, piece in-3). */
function sign(): MockupDocument {
  const common = { solid: false, name: "", thickness: 3 };
  return bringInArtwork(emptyMockup(), {
    artwork: before,
    choices: [
      { ...common, colour: blue, stock: midnight, hold: { kind: "standoff", hardware: barrel(19) } },
      { ...common, colour: gold, stock: brass, hold: { kind: "bond", adhesive: cement } },
    ],
    id: "in",
    site: inside,
  });
}

function replaced(
  document: MockupDocument,
  after: ArtworkToBringIn,
  { size = "as before" as "as before" | "its own", from = before } = {},
) {
  const match = matchArtworks(from, after, size);
  const come = layersForCome(document, { before: from, after, match });
  const replacement = { before: from, after, match, come };
  const next = replaceArtwork(document, { ...replacement, id: "new" });
  expect(documentSchema.safeParse(next).success).toBe(true);
  return { next, match, report: reportReplacement(document, replacement) };
}
const piecesOf = ({ layers }: MockupDocument) => layers.flatMap(({ pieces }) => pieces);
const withoutPieces = ({ layers, ...rest }: MockupDocument) => ({
  ...rest,
  layers: layers.map((layer) => ({ ...layer, pieces: [] })),
});

describe("replacing artwork", () => {
  it("by the same drawing changes nothing but where the outlines come from, wherever pieces were put since", () => {
    fc.assert(
      fc.property(
        fc.record({
          dx: fc.integer({ min: -50, max: 50 }),
          turn: fc.integer({ min: 0, max: 359 }),
          by: fc.constantFrom(0.5, 1, 1.25),
          chosen: fc.subarray(["in-1", "in-2", "in-3"], { minLength: 1 }),
          order: fc.constantFrom([0, 1, 2], [2, 0, 1], [1, 2, 0]),
        }),
        ({ dx, turn, by, chosen, order }) => {
          let document = movePieces(sign(), { pieceIds: chosen, dx, dy: 7 });
          document = turnPieces(document, { pieceIds: chosen, by: turn });
          document = scalePieces(document, { pieceIds: chosen, by });
          const after = artworkOf(
            newId,
            order.map((at) => squares[at] ?? { colour: "", x: 0, y: 0, size: 0 }),
          );
          const { next, report } = replaced(document, after);
          expect(withoutPieces(next)).toEqual(withoutPieces(document));
          for (const [at, piece] of piecesOf(next).entries()) {
            const was = piecesOf(document)[at];
            expect({ ...piece, source: null, placement: null }).toEqual({ ...was, source: null, placement: null });
            // What the last change left beyond the thousandth of a millimetre is rounded.
            expect(Math.abs(piece.placement.x - (was?.placement.x ?? 0))).toBeLessThanOrEqual(0.0005);
            expect(Math.abs(piece.placement.y - (was?.placement.y ?? 0))).toBeLessThanOrEqual(0.0005);
            expect(piece.placement).toMatchObject({ turn: was?.placement.turn, scale: was?.placement.scale });
            expect(piece.source).toMatchObject({ artworkId: newId });
          }
          for (const layer of report.layers) expect(layer).toMatchObject({ changed: [], gone: [], come: [] });
        },
      ),
      { seed: 42, numRuns: 20 },
    );
  });

  it("keeps a layer's stock, hold and holes when its pieces move, grow and change colour, and tells so", () => {
    const after = artworkOf(newId, [
      { colour: gold, x: 130, y: 30, size: 40 },
      { colour: blue, x: 10, y: 10, size: 64 },
      { colour: "#AA0000", x: 90, y: 22, size: 20 },
    ]);
    const { next, report } = replaced(sign(), after);
    expect(withoutPieces(next)).toEqual(withoutPieces(sign()));
    expect(piecesOf(next).map(({ id, source }) => [id, source])).toEqual([
      ["in-1", { kind: "artwork", artworkId: newId, index: 1, colour: blue }],
      ["in-2", { kind: "artwork", artworkId: newId, index: 2, colour: "#AA0000" }],
      ["in-3", { kind: "artwork", artworkId: newId, index: 0, colour: gold }],
    ]);
    // It grew to the right and down: its upper left corner stays at 210, 160 of the board.
    expect(boxOfPieces(next, ["in-1"])).toEqual({ x: 210, y: 160, width: 64, height: 64 });
    expect(boxOfPieces(next, ["in-2"])).toEqual({ x: 290, y: 172, width: 20, height: 20 });
    expect(report.layers.map(({ key, same, changed }) => [key, same, changed.map(({ how }) => how)])).toEqual([
      [
        "B",
        0,
        [
          ["moved", "of another size"],
          ["recoloured", "moved"],
        ],
      ],
      ["C", 1, []],
    ]);
  });

  it("lays what has come in the layer of its colour, beside what was there, and takes off what is gone", () => {
    const after = artworkOf(newId, [
      { colour: blue, x: 10, y: 10, size: 60 },
      { colour: gold, x: 130, y: 30, size: 40 },
      { colour: gold, x: 90, y: 80, size: 10 },
      { colour: "#AA0000", x: 0, y: 90, size: 8 },
    ]);
    const moved = movePieces(sign(), { pieceIds: ["in-3"], dx: 100, dy: 0 });
    const { next, report } = replaced(moved, after);
    expect(next.layers.map(({ pieces }) => pieces.map(({ id }) => id))).toEqual([["in-1"], ["in-3", "new-3"]]);
    // 40 left of and 50 below the gold square that was moved, corner to corner.
    expect(boxOfPieces(next, ["new-3"])).toEqual({ x: 390, y: 230, width: 10, height: 10 });
    expect(report.layers.map(({ gone, come }) => [gone.map(({ id }) => id), come.length])).toEqual([
      [["in-2"], 0],
      [[], 1],
    ]);
    expect(report.leftOut).toBe(1);
  });

  it("keeps a layer that loses all its pieces, with its holes", () => {
    const { next } = replaced(sign(), artworkOf(newId, [{ colour: gold, x: 130, y: 30, size: 40 }]));
    const [blueLayer] = next.layers;
    expect(blueLayer?.pieces).toEqual([]);
    expect(blueLayer?.hold).toEqual(sign().layers[0]?.hold);
  });

  it("does not bring back what was taken out of the mockup before", () => {
    const bare = removePieces(sign(), { pieceIds: ["in-2"] });
    const { next, report } = replaced(bare, artworkOf(newId, squares));
    expect(piecesOf(next).map(({ id }) => id)).toEqual(["in-1", "in-3"]);
    expect(report.leftOut).toBe(0);
  });

  it("leaves a locked layer as it is, and says so", () => {
    const document = sign();
    const locked = { ...document, layers: document.layers.map((layer, at) => ({ ...layer, locked: at === 0 })) };
    const { next, report } = replaced(locked, artworkOf(newId, [{ colour: gold, x: 130, y: 30, size: 44 }]));
    expect(next.layers[0]).toBe(locked.layers[0]);
    expect(report.layers[0]).toMatchObject({ isLocked: true, gone: [] });
    expect(next.layers[1]?.pieces[0]?.source).toMatchObject({ artworkId: newId });
  });

  it("of another page and scale comes as wide as before, or in its own size, middle to middle", () => {
    const twice = squares.map(({ colour, x, y, size }) => ({ colour, x: 500 + 2 * x, y: 2 * y, size: 2 * size }));
    const after = artworkOf(newId, twice, { width: 1000, height: 400 });
    const asBefore = replaced(sign(), after).next;
    for (const id of ["in-1", "in-2", "in-3"]) expect(boxOfPieces(asBefore, [id])).toEqual(boxOfPieces(sign(), [id]));
    const own = replaced(sign(), after, { size: "its own" }).next;
    expect(boxOfPieces(own, ["in-1"])?.width).toBeCloseTo(120, 6);
    const [was, is] = [boxOfPieces(sign(), ["in-1", "in-2", "in-3"]), boxOfPieces(own, ["in-1", "in-2", "in-3"])];
    expect((is?.x ?? 0) + (is?.width ?? 0) / 2).toBeCloseTo((was?.x ?? 0) + (was?.width ?? 0) / 2, 6);
  });

  it("keeps the size a piece has in the mockup when the true size of the artwork was set anew since", () => {
    const half = artworkOf(
      oldId,
      squares.map(({ colour, x, y, size }) => ({ colour, x: x / 2, y: y / 2, size: size / 2 })),
      { width: 100, height: 50 },
    );
    const after = artworkOf(
      newId,
      half.pieces.map(({ colour, box }) => ({ colour, x: box.x, y: box.y, size: box.width })),
      {
        width: 100,
        height: 50,
      },
    );
    const { next } = replaced(sign(), after, { from: half });
    expect(boxOfPieces(next, ["in-1"])).toEqual(boxOfPieces(sign(), ["in-1"]));
  });

  it("keeps openings closed that were closed when the artwork was brought in", () => {
    const ring = (artworkId: string, size: number): ArtworkToBringIn => {
      const [piece] = artworkOf(artworkId, [{ colour: gold, x: 0, y: 0, size }]).pieces;
      if (!piece) throw new Error("No piece.");
      const opening = rectanglePath({ x: 10, y: 10, width: 20, height: 20 });
      return { artworkId, widthMm: 200, heightMm: 100, pieces: [{ ...piece, path: [...piece.path, ...opening] }] };
    };
    const bring = (solid: boolean) =>
      bringInArtwork(emptyMockup(), {
        artwork: ring(oldId, 80),
        choices: [
          { solid, colour: gold, name: "", stock: brass, thickness: 3, hold: { kind: "bond", adhesive: cement } },
        ],
        id: "in",
        site: inside,
      });
    const after = ring(newId, 90);
    for (const solid of [true, false])
      expect(piecesOf(replaced(bring(solid), after, { from: ring(oldId, 80) }).next)[0]?.path).toHaveLength(
        solid ? 1 : 2,
      );
  });

  it("does nothing to a mockup without pieces of that artwork", () => {
    const document = emptyMockup();
    expect(replaced(document, artworkOf(newId, squares)).next).toBe(document);
  });
});
