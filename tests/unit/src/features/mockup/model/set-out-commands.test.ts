import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { documentSchema, type Layer, type MockupDocument, type Piece } from "#shared/mockup/document.ts";
import { bearingOf } from "#shared/setting-out/direction.ts";
import { anchors, middleAnchor } from "@/features/mockup/model/anchors.ts";
import { lineUp } from "@/features/mockup/model/commands/line-up.ts";
import { boxOfPieces, mirrorPieces, movePieces, turnPieces } from "@/features/mockup/model/commands/pieces.ts";
import { placeChosen } from "@/features/mockup/model/commands/place-chosen.ts";
import { stepOff, stepOffCopies } from "@/features/mockup/model/commands/step-off.ts";
import { usualTogether } from "@/features/mockup/model/together.ts";
import { barrel, brass, cement, emptyMockup, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

type Block = { id: string; x: number; y: number; width: number; height: number };

const block = ({ id, x, y, width, height }: Block): Piece => ({
  id,
  name: "",
  source: { kind: "plate" },
  path: rectanglePath({ x: -width / 2, y: -height / 2, width, height }).map((ring) => ({
    start: ring.start,
    segments: [...ring.segments],
  })),
  placement: { x, y, turn: 0, scale: 1, mirrored: false },
  reads: "",
});
const layer = (key: string, pieces: Piece[], fields: Partial<Layer> = {}): Layer => ({
  key,
  name: key,
  stock: brass,
  thickness: 3,
  hold: { kind: "bond", adhesive: cement, tack: null },
  locate: "none",
  marked: "not stated",
  pieces,
  hidden: false,
  locked: false,
  ...fields,
});

/** Three blocks in B, one in C; a panel D on two standoffs, its first hole in the piece "left", the other in "right". */
const blocks = () => [
  block({ id: "a", x: 50, y: 60, width: 20, height: 10 }),
  block({ id: "b", x: 140, y: 90, width: 40, height: 30 }),
  block({ id: "c", x: 300, y: 40, width: 10, height: 50 }),
];
const hole = (id: string, x: number, y: number, fixed: boolean) => ({ id, x, y, diameter: 6, fixed });
const panels = () =>
  layer(
    "D",
    [
      block({ id: "left", x: 100, y: 300, width: 80, height: 60 }),
      block({ id: "right", x: 400, y: 300, width: 80, height: 60 }),
    ],
    {
      stock: midnight,
      hold: {
        kind: "standoff",
        hardware: barrel(19),
        offset: 19,
        holes: [hole("h1", 90, 310, true), hole("h2", 420, 300, false)],
      },
    },
  );
const sign = (): MockupDocument =>
  emptyMockup({
    layers: [layer("B", blocks()), layer("C", [block({ id: "d", x: 500, y: 350, width: 60, height: 60 })]), panels()],
  });

const placementOf = (document: MockupDocument, id: string) =>
  document.layers.flatMap(({ pieces }) => pieces).find((piece) => piece.id === id)?.placement;
const boxOf = (document: MockupDocument, ...ids: string[]) => boxOfPieces(document, ids);
const holesOf = (document: MockupDocument) =>
  document.layers.flatMap(({ hold }) => (hold.kind === "standoff" ? hold.holes : [])).map(({ id, x, y }) => [id, x, y]);
const locked = (document: MockupDocument, key: string): MockupDocument => ({
  ...document,
  layers: document.layers.map((one) => (one.key === key ? { ...one, locked: true } : one)),
});

describe("placing what is chosen in figures", () => {
  it.each(anchors)("brings the $words to the place that was typed", (anchor) => {
    const placed = placeChosen(sign(), { pieceIds: ["a", "b"], anchor, x: 200, y: 100 });
    // From 40 to 160 across and from 55 to 105 down.
    expect(boxOf(placed, "a", "b")).toEqual({
      x: 200 - 120 * anchor.across,
      y: 100 - 50 * anchor.down,
      width: 120,
      height: 50,
    });
  });

  it("sizes several about their common box, and the other side follows", () => {
    const pieceIds = ["a", "b"];
    const wide = placeChosen(sign(), { pieceIds, anchor: middleAnchor, width: 180 });
    expect(boxOf(wide, ...pieceIds)).toEqual({ x: 10, y: 42.5, width: 180, height: 75 });
    expect(placementOf(wide, "a")).toMatchObject({ x: 25, y: 50, scale: 1.5 });
    const corner = anchors.find(({ words }) => words === "upper left corner") ?? middleAnchor;
    expect(boxOf(placeChosen(sign(), { pieceIds, anchor: corner, height: 25 }), ...pieceIds)).toEqual({
      x: 40,
      y: 55,
      width: 60,
      height: 25,
    });
  });

  it("reaches a typed width to a millionth of a millimetre, whatever it was before", () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 2000, noNaN: true }), (width) => {
        const placed = placeChosen(sign(), { pieceIds: ["a", "b", "c"], anchor: middleAnchor, width });
        expect(Math.abs((boxOf(placed, "a", "b", "c")?.width ?? 0) - width)).toBeLessThan(1e-6);
      }),
    );
  });

  it("adds sixty-fourths of an inch up to a whole one", () => {
    let document = sign();
    for (let step = 0; step < 64; step++) document = movePieces(document, { pieceIds: ["a"], dx: 25.4 / 64, dy: 0 });
    expect(placementOf(document, "a")?.x).toBe(75.4);
  });

  it("leaves what is locked, and a size of nothing", () => {
    const shut = locked(sign(), "B");
    expect(placeChosen(shut, { pieceIds: ["a"], anchor: middleAnchor, x: 1 })).toBe(shut);
    const document = sign();
    expect(placeChosen(document, { pieceIds: ["a"], anchor: middleAnchor, width: 0 })).toBe(document);
  });
});

describe("mirroring and turning", () => {
  it("mirrors a whole layer about its middle with its holes, and twice is as before", () => {
    const document = sign();
    const pieceIds = ["left", "right"];
    const once = mirrorPieces(document, { pieceIds, way: "across" });
    expect(holesOf(once)).toEqual([
      ["h1", 410, 310],
      ["h2", 80, 300],
    ]);
    expect(placementOf(once, "left")).toEqual({ x: 400, y: 300, turn: 0, scale: 1, mirrored: true });
    const twice = mirrorPieces(once, { pieceIds, way: "across" });
    expect(twice).toEqual(document);
    const down = mirrorPieces(document, { pieceIds, way: "down" });
    expect(placementOf(down, "left")).toMatchObject({ x: 100, turn: 180, mirrored: true });
    expect(holesOf(down)).toEqual([
      ["h1", 90, 290],
      ["h2", 420, 300],
    ]);
  });

  it("mirrors a turned piece as a mirror shows it", () => {
    const turned = turnPieces(sign(), { pieceIds: ["a"], by: 30 });
    const mirrored = mirrorPieces(turned, { pieceIds: ["a"], way: "across" });
    expect(placementOf(mirrored, "a")).toMatchObject({ turn: 330, mirrored: true });
    expect(boxOf(mirrored, "a")?.width).toBeCloseTo(boxOf(turned, "a")?.width ?? 0, 9);
  });

  it("takes the holes that lie in a turned piece along", () => {
    const turned = turnPieces(sign(), { pieceIds: ["left"], by: 90 });
    expect(holesOf(turned)).toEqual([
      ["h1", 90, 290],
      ["h2", 420, 300],
    ]);
  });
});

describe("lining up", () => {
  const pieceIds = ["b", "a", "c"];
  it.each([
    { to: "the board", by: "left", lefts: [0, 0, 0] },
    { to: "each other", by: "left", lefts: [40, 40, 40] },
    { to: "the first chosen", by: "left", lefts: [120, 120, 120] },
    { to: "the first chosen", by: "right", lefts: [140, 120, 150] },
    { to: "the board", by: "centre", lefts: [290, 280, 295] },
  ] as const)("with $to by the $by brings left edges to $lefts", ({ to, by, lefts }) => {
    const done = lineUp(sign(), { pieceIds, together: "each piece", to, by });
    expect(["a", "b", "c"].map((id) => boxOf(done, id)?.x)).toEqual(lefts);
    expect(boxOf(done, "a")?.y).toBe(55);
  });

  it("moves whole layers as one, with their holes, and what stands first stays", () => {
    const ids = ["d", "left", "right"];
    const done = lineUp(sign(), { pieceIds: ids, together: "each layer", to: "the first chosen", by: "bottom" });
    expect(boxOf(done, "d")).toEqual({ x: 470, y: 320, width: 60, height: 60 });
    expect(boxOf(done, "left", "right")).toEqual({ x: 60, y: 320, width: 380, height: 60 });
    expect(holesOf(done)).toEqual([
      ["h1", 90, 360],
      ["h2", 420, 350],
    ]);
  });

  it("lines up with what is locked, which stays", () => {
    const done = lineUp(locked(sign(), "C"), {
      pieceIds: ["d", "left"],
      together: "each piece",
      to: "the first chosen",
      by: "top",
    });
    expect(boxOf(done, "d")?.y).toBe(320);
    expect(boxOf(done, "left")?.y).toBe(320);
    expect(placementOf(done, "right")?.y).toBe(300);
  });

  it("gives the same document back when all lie in line, and when all are to be one with themselves", () => {
    const done = lineUp(sign(), { pieceIds, together: "each piece", to: "the board", by: "top" });
    expect(lineUp(done, { pieceIds, together: "each piece", to: "the board", by: "top" })).toBe(done);
    expect(lineUp(done, { pieceIds, together: "all as one", to: "the first chosen", by: "left" })).toBe(done);
  });

  it("sets layers that are chosen whole out as layers", () => {
    expect(usualTogether(sign(), ["a", "b"])).toBe("each piece");
    expect(usualTogether(sign(), ["a", "b", "c"])).toBe("all as one");
    expect(usualTogether(sign(), ["d", "a", "b", "c"])).toBe("each layer");
  });
});

describe("stepping off what is chosen", () => {
  const pieceIds = ["a", "b", "c"];
  it("leaves equal gaps between first and last, to 1e-9 in the document itself", () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.5, max: 90, noNaN: true }), { minLength: 3, maxLength: 20 }),
        (widths) => {
          const pieces = widths.map((width, index) =>
            block({ id: `p${index}`, x: index * 37.3, y: 50, width, height: 9 }),
          );
          const document = emptyMockup({ layers: [layer("B", pieces)] });
          const ids = pieces.map(({ id }) => id);
          const way = { kind: "along", angle: 0, spacing: { kind: "equal gaps" }, onto: false } as const;
          const done = stepOff(document, { pieceIds: ids, together: "each piece", way });
          const boxes = ids.map((id) => boxOf(done, id) ?? { x: 0, y: 0, width: 0, height: 0 });
          const gaps = boxes
            .slice(1)
            .map((box, index) => box.x - ((boxes[index]?.x ?? 0) + (boxes[index]?.width ?? 0)));
          for (const gap of gaps) expect(Math.abs(gap - (gaps[0] ?? 0))).toBeLessThan(1e-9);
        },
      ),
      { numRuns: 50 },
    );
  });

  it("steps middles off at a pitch down the board and brings them onto one line when asked", () => {
    const way = { kind: "along", angle: 90, spacing: { kind: "pitch", mm: 70 } } as const;
    const free = stepOff(sign(), { pieceIds, together: "each piece", way: { ...way, onto: false } });
    // From the uppermost, c at 40.
    expect(["c", "a", "b"].map((id) => placementOf(free, id))).toMatchObject([
      { x: 300, y: 40 },
      { x: 50, y: 110 },
      { x: 140, y: 180 },
    ]);
    const onto = stepOff(sign(), { pieceIds, together: "each piece", way: { ...way, onto: true } });
    expect(pieceIds.map((id) => placementOf(onto, id)?.x)).toEqual([300, 300, 300]);
  });

  it("brings pieces round the board's middle a third of 360° apart", () => {
    const centre = { x: 300, y: 200 };
    const way = { kind: "round", centre, radius: 120, sweep: 360, turned: false } as const;
    const done = stepOff(sign(), { pieceIds, together: "each piece", way });
    const bearings = ["a", "b", "c"].map((id) => bearingOf(centre, placementOf(done, id) ?? centre) ?? Number.NaN);
    const [first = Number.NaN, second = Number.NaN, third = Number.NaN] = bearings;
    expect((second - first + 360) % 360).toBeCloseTo(120, 9);
    expect((third - second + 360) % 360).toBeCloseTo(120, 9);
    for (const id of pieceIds) {
      const { x = 0, y = 0 } = placementOf(done, id) ?? {};
      expect(Math.hypot(x - 300, y - 200)).toBeCloseTo(120, 9);
    }
  });

  it("takes layers as one, with their holes", () => {
    const way = { kind: "along", angle: 0, spacing: { kind: "gap", mm: 10 }, onto: false } as const;
    const done = stepOff(sign(), { pieceIds: ["left", "right", "d"], together: "each layer", way });
    // The panels keep 60 to 440, so the block comes to 450.
    expect(boxOf(done, "d")?.x).toBe(450);
    expect(holesOf(done)).toEqual(holesOf(sign()));
  });
});

describe("stepping copies off", () => {
  const made = { id: "n", withHoles: true, site: inside };
  it("adds copies at a gap from edge to edge, with ids of their own", () => {
    const way = { kind: "along", angle: 0, spacing: { kind: "gap", mm: 5 } } as const;
    const done = stepOffCopies(sign(), { pieceIds: ["a", "b"], count: 2, way, ...made });
    expect(done.layers[0]?.pieces.map(({ id, placement: { x, y } }) => [id, x, y])).toEqual([
      ["a", 50, 60],
      ["b", 140, 90],
      ["c", 300, 40],
      ["n-1", 175, 60],
      ["n-2", 265, 90],
      ["n-3", 300, 60],
      ["n-4", 390, 90],
    ]);
    expect(documentSchema.parse(done)).toEqual(done);
  });

  it("copies the standoff holes in a piece, none of them fixed, or leaves them out", () => {
    const way = { kind: "along", angle: 90, spacing: { kind: "pitch", mm: -100 } } as const;
    const done = stepOffCopies(sign(), { pieceIds: ["left"], count: 1, way, ...made });
    expect(holesOf(done)).toEqual([
      ["h1", 90, 310],
      ["h2", 420, 300],
      ["n-Dh1", 90, 210],
    ]);
    const hold = done.layers[2]?.hold;
    expect(hold?.kind === "standoff" && hold.holes.map(({ fixed }) => fixed)).toEqual([true, false, false]);
    const bare = stepOffCopies(sign(), { pieceIds: ["left"], count: 1, way, ...made, withHoles: false });
    expect(holesOf(bare)).toHaveLength(2);
    expect(documentSchema.parse(done)).toEqual(done);
  });

  it("stands seven copies and the thing itself an eighth of the way round, turned along", () => {
    const centre = { x: 50, y: 160 };
    const way = { kind: "round", centre, radius: null, sweep: 360, turned: true } as const;
    const done = stepOffCopies(sign(), { pieceIds: ["a"], count: 7, way, ...made });
    const copies = done.layers[0]?.pieces.slice(3) ?? [];
    expect(copies.map(({ placement }) => placement.turn)).toEqual([45, 90, 135, 180, 225, 270, 315]);
    for (const { placement } of copies) expect(Math.hypot(placement.x - 50, placement.y - 160)).toBeCloseTo(100, 9);
    // Half the way round lies straight below.
    expect(copies[3]?.placement).toMatchObject({ x: 50, y: 260 });
  });

  it("gives a copied letter words of its own", () => {
    const words = {
      id: "w",
      words: "AB",
      face: "any-face",
      fontSha256: "0".repeat(64),
      capHeight: 40,
      letterSpacing: 0,
      kerning: true,
      lineSpacing: 60,
      align: "left" as const,
      along: { kind: "line" as const },
    };
    const letter = (id: string, x: number, index: number): Piece => ({
      ...block({ id, x, y: 100, width: 20, height: 40 }),
      source: { kind: "lettering", letteringId: "w", letter: index, laid: { x: index * 30, y: 0, turn: 0 } },
    });
    const document = emptyMockup({
      layers: [layer("B", [letter("A", 50, 0), letter("B", 80, 1)])],
      lettering: [words],
    });
    const way = { kind: "along", angle: 0, spacing: { kind: "pitch", mm: 100 } } as const;
    const done = stepOffCopies(document, { pieceIds: ["A", "B"], count: 2, way, ...made });
    const ofLetter = done.layers[0]?.pieces.map(
      ({ source }) => source.kind === "lettering" && [source.letteringId, source.letter],
    );
    expect(ofLetter).toEqual([
      ["w", 0],
      ["w", 1],
      ["n-l1-1", 0],
      ["n-l1-1", 1],
      ["n-l2-1", 0],
      ["n-l2-1", 1],
    ]);
    expect(done.lettering).toEqual([words, { ...words, id: "n-l1-1" }, { ...words, id: "n-l2-1" }]);
    expect(documentSchema.parse(done)).toEqual(done);
  });

  it("adds nothing to what is locked, beyond what a document takes, or from the centre without a radius", () => {
    const shut = locked(sign(), "B");
    const along = { kind: "along", angle: 0, spacing: { kind: "pitch", mm: 10 } } as const;
    expect(stepOffCopies(shut, { pieceIds: ["a"], count: 2, way: along, ...made })).toBe(shut);
    const document = sign();
    expect(stepOffCopies(document, { pieceIds: ["a"], count: 1998, way: along, ...made })).toBe(document);
    const far = { ...along, spacing: { kind: "pitch", mm: 9999 } } as const;
    expect(stepOffCopies(document, { pieceIds: ["a"], count: 2, way: far, ...made })).toBe(document);
    const once = stepOffCopies(document, { pieceIds: ["a"], count: 2, way: along, ...made });
    expect(stepOffCopies(once, { pieceIds: ["a"], count: 2, way: along, ...made })).toBe(once);
    const round = { kind: "round", centre: { x: 50, y: 60 }, radius: null, sweep: 360, turned: false } as const;
    expect(stepOffCopies(document, { pieceIds: ["a"], count: 2, way: round, ...made })).toBe(document);
  });
});
