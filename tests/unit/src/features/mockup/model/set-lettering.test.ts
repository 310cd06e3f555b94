import createClipper from "clipper2-wasm";
import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { type LaidWords, layWords, type Setting } from "#shared/lettering/lay-words.ts";
import { lettersOnBoard } from "#shared/lettering/letters-on-board.ts";
import { documentSchema, type Lettering, type MockupDocument, type Piece } from "#shared/mockup/document.ts";
import { addLettering } from "@/features/mockup/model/commands/add-lettering.ts";
import { removeLayer } from "@/features/mockup/model/commands/order-layers.ts";
import {
  boxOfPieces,
  mirrorPieces,
  movePieces,
  removePieces,
  scalePieces,
  turnPieces,
} from "@/features/mockup/model/commands/pieces.ts";
import { setLetteringAgain } from "@/features/mockup/model/commands/set-lettering-again.ts";
import { letteringByHand } from "@/features/mockup/model/lettering-by-hand.ts";
import { openFaceOf } from "../../../../../support/open-faces.ts";
import { barrel, emptyMockup, epoxy, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = clipperKernel(await createClipper());
});

const plain: Setting = {
  words: "ORRERY",
  capHeight: 40,
  letterSpacing: 0,
  kerning: true,
  lineSpacing: 64,
  align: "centre",
  along: { kind: "line" },
};
const face = { face: "montserrat-600", fontSha256: "a".repeat(64) };
const laidOnce = new Map<string, LaidWords>();

function lay(setting: Setting): LaidWords {
  const key = JSON.stringify(setting);
  const known = laidOnce.get(key);
  if (known) return known;
  const outcome = layWords(setting, openFaceOf(face.face), kernel);
  if (!outcome.ok) throw new Error(outcome.problem);
  laidOnce.set(key, outcome.laid);
  return outcome.laid;
}
const letteringOf = (setting: Setting): Lettering => ({ ...setting, ...face, id: "w" });

function added(setting: Partial<Setting> = {}, document = emptyMockup()): MockupDocument {
  const whole = { ...plain, ...setting };
  const { letters, box } = lay(whole);
  if (!box) throw new Error("No letters.");
  return addLettering(document, {
    set: { lettering: letteringOf(whole), letters, box },
    id: "p",
    into: {
      kind: "new",
      layer: { name: "Words", stock: midnight, thickness: 3, hold: { kind: "bond", adhesive: epoxy } },
      site: inside,
    },
  });
}
function again(
  document: MockupDocument,
  setting: Partial<Setting> = {},
  more: { putBack?: boolean } = {},
): MockupDocument {
  const whole = { ...plain, ...setting };
  return setLetteringAgain(document, { lettering: letteringOf(whole), letters: lay(whole).letters, id: "q", ...more });
}
const pieces = (document: MockupDocument): Piece[] => document.layers.flatMap((layer) => layer.pieces);
const idsOf = (document: MockupDocument) => pieces(document).map(({ id }) => id);
const reads = (document: MockupDocument) =>
  lettersOnBoard(document, "w")
    .map(({ piece }) => piece.reads)
    .join("");
const at = (document: MockupDocument, letter: number): Piece => {
  const found = lettersOnBoard(document, "w").find(({ source }) => source.letter === letter)?.piece;
  if (!found) throw new Error(`Letter ${letter} is not on the board.`);
  return found;
};
const isSound = (document: MockupDocument) => documentSchema.safeParse(document).success;

describe("adding lettering", () => {
  it("puts a piece for each letter on a new layer, in the middle of the board", () => {
    const document = added({ words: "AN O" });
    expect(document.layers.map(({ key, name }) => [key, name])).toEqual([["B", "Words"]]);
    expect(pieces(document).map(({ reads: text, name }) => [text, name])).toEqual([
      ["A", "Letter 1: A"],
      ["N", "Letter 2: N"],
      ["O", "Letter 3: O"],
    ]);
    const box = boxOfPieces(document, idsOf(document));
    expect((box?.x ?? 0) + (box?.width ?? 0) / 2).toBeCloseTo(300, 3);
    expect((box?.y ?? 0) + (box?.height ?? 0) / 2).toBeCloseTo(200, 3);
    expect(document.lettering).toEqual([letteringOf({ ...plain, words: "AN O" })]);
    expect(isSound(document)).toBe(true);
  });

  it("puts more words under those that are there, and in the middle when there is no room under them", () => {
    const { letters, box } = lay(plain);
    if (!box) throw new Error("No letters.");
    const into = { kind: "existing" as const, key: "B" };
    let document = added();
    const words = (id: string) => ({ lettering: { ...letteringOf(plain), id }, letters, box });
    const boxes = ["v", "u", "t", "s", "r"].map((id) => {
      document = addLettering(document, { set: words(id), id, into });
      return boxOfPieces(
        document,
        idsOf(document).filter((one) => one.startsWith(`${id}-`)),
      );
    });
    const first = boxOfPieces(
      document,
      idsOf(document).filter((one) => one.startsWith("p-")),
    );
    const gap = 0.75 * plain.capHeight;
    expect(boxes[0]?.y).toBeCloseTo((first?.y ?? 0) + (first?.height ?? 0) + gap, 3);
    expect(boxes[1]?.y).toBeCloseTo((boxes[0]?.y ?? 0) + box.height + gap, 3);
    expect(boxes.at(-1)?.y).toBeCloseTo(200 - box.height / 2, 3);
  });

  it("puts them on a layer that is there, after its pieces; a locked one takes none", () => {
    const first = added();
    const set = {
      lettering: { ...letteringOf(plain), id: "v" },
      letters: lay(plain).letters,
      box: lay(plain).box ?? { x: 0, y: 0, width: 1, height: 1 },
    };
    const into = { kind: "existing" as const, key: "B" };
    const more = addLettering(first, { set, id: "r", into });
    expect(more.layers[0]?.pieces).toHaveLength(12);
    expect(more.lettering.map(({ id }) => id)).toEqual(["w", "v"]);
    expect(isSound(more)).toBe(true);
    const locked = { ...first, layers: first.layers.map((layer) => ({ ...layer, locked: true })) };
    expect(addLettering(locked, { set, id: "r", into })).toBe(locked);
    expect(addLettering(first, { set, id: "r", into: { ...into, key: "K" } })).toBe(first);
    expect(addLettering(first, { set: { ...set, letters: [] }, id: "r", into })).toBe(first);
  });
});

describe("the document's entry", () => {
  it("goes with the last letter, and not before", () => {
    const document = added({ words: "AB" });
    const [first = "", second = ""] = idsOf(document);
    const one = removePieces(document, { pieceIds: [first] });
    expect(one.lettering).toHaveLength(1);
    expect(removePieces(one, { pieceIds: [second] }).lettering).toEqual([]);
    expect(removeLayer(document, { key: "B" }).lettering).toEqual([]);
  });
});

/** What a hand may do to all letters together. */
const hand = fc.record({
  dx: fc.double({ min: -200, max: 200, noNaN: true }),
  dy: fc.double({ min: -200, max: 200, noNaN: true }),
  turn: fc.double({ min: -180, max: 180, noNaN: true }),
  scale: fc.constantFrom(1, 0.5, 1.25, 2),
  mirror: fc.constantFrom(null, "across" as const, "down" as const),
});
type Hand = typeof hand extends fc.Arbitrary<infer T> ? T : never;

function handled(document: MockupDocument, { dx, dy, turn, scale, mirror }: Hand): MockupDocument {
  const pieceIds = idsOf(document);
  const moved = movePieces(document, { pieceIds, dx, dy });
  const turned = turnPieces(moved, { pieceIds, by: turn });
  const mirrored = mirror ? mirrorPieces(turned, { pieceIds, way: mirror }) : turned;
  return scalePieces(mirrored, { pieceIds, by: scale });
}

/** A setting as large as the hand has made it. */
const scaled = (setting: Partial<Setting>, by: number): Partial<Setting> => {
  const { capHeight, letterSpacing, lineSpacing, along } = { ...plain, ...setting };
  return {
    ...setting,
    capHeight: capHeight * by,
    letterSpacing: letterSpacing * by,
    lineSpacing: lineSpacing * by,
    along: along.kind === "arc" ? { ...along, radius: along.radius * by } : along,
  };
};
const settings: readonly Partial<Setting>[] = [
  {},
  { words: "AN ORB\nOF BRASS", align: "left" },
  { along: { kind: "arc", radius: 160, side: "over" } },
  { along: { kind: "arc", radius: 160, side: "under" }, align: "right" },
];

function expectSamePlaces(got: MockupDocument, wanted: MockupDocument): void {
  expect(pieces(got).map(({ id }) => id)).toEqual(pieces(wanted).map(({ id }) => id));
  for (const [index, { path, placement }] of pieces(got).entries()) {
    const to = pieces(wanted)[index];
    const [box, other] = [boxOfPieces(got, [idsOf(got)[index] ?? ""]), boxOfPieces(wanted, [to?.id ?? ""])];
    expect(path.length).toBeGreaterThan(0);
    expect(Math.abs((box?.x ?? 0) - (other?.x ?? 9))).toBeLessThan(0.02);
    expect(Math.abs((box?.y ?? 0) - (other?.y ?? 9))).toBeLessThan(0.02);
    expect(placement.mirrored).toBe(to?.placement.mirrored);
  }
}

describe("setting again", () => {
  it("with nothing changed leaves the very same document, wherever the hand has brought it", () => {
    fc.assert(
      fc.property(fc.constantFrom(...settings), hand, (setting, moved) => {
        const document = handled(added(setting), { ...moved, scale: 1 });
        const next = again(document, setting);
        expectSamePlaces(next, document);
        expect(next.lettering).toEqual(document.lettering);
      }),
      { numRuns: 60 },
    );
    const untouched = added();
    expect(again(untouched)).toBe(untouched);
  });

  it("takes the size that the hand gave into the measures, and the letters stay where they lie", () => {
    fc.assert(
      fc.property(fc.constantFrom(...settings), hand, (setting, moved) => {
        const document = handled(added(setting), moved);
        const measures = letteringByHand(document, "w")?.lettering;
        expect(measures?.capHeight).toBeCloseTo(40 * moved.scale, 3);
        const next = again(document, scaled(setting, moved.scale));
        expectSamePlaces(next, document);
        for (const { placement } of pieces(next)) expect(placement.scale).toBeCloseTo(1, 6);
      }),
      { numRuns: 60 },
    );
  });

  it("keeps the place of its origin, where the middle of its first line stands", () => {
    fc.assert(
      fc.property(hand, fc.constantFrom(...settings.slice(1)), (moved, setting) => {
        const by = { dx: moved.dx, dy: moved.dy };
        const document = movePieces(added(), { pieceIds: idsOf(added()), ...by });
        const next = again(document, setting);
        // The origin, the middle of the first line's foot, lies where it lay.
        const before = lettersOnBoard(document, "w")[0];
        const after = lettersOnBoard(next, "w")[0];
        const origin = (one: typeof before) => ({
          x: (one?.piece.placement.x ?? 0) - (one?.source.laid.x ?? 0),
          y: (one?.piece.placement.y ?? 0) - (one?.source.laid.y ?? 0),
        });
        expect(origin(after).x).toBeCloseTo(origin(before).x, 6);
        expect(origin(after).y).toBeCloseTo(origin(before).y, 6);
        expect(isSound(next)).toBe(true);
      }),
      { numRuns: 40 },
    );
  });

  it("keeps what was done to one letter alone", () => {
    fc.assert(
      fc.property(
        hand,
        fc.integer({ min: 0, max: 5 }),
        fc.double({ min: -30, max: 30, noNaN: true }),
        (moved, letter, shift) => {
          const whole = handled(added(), { ...moved, scale: 1 });
          const piece = at(whole, letter);
          const document = movePieces(whole, { pieceIds: [piece.id], dx: shift, dy: 7 });
          const next = again(document, { letterSpacing: 6 });
          const straight = again(whole, { letterSpacing: 6 });
          const [own, base] = [at(next, letter).placement, at(straight, letter).placement];
          expect(own.x - base.x).toBeCloseTo(shift, 5);
          expect(own.y - base.y).toBeCloseTo(7, 5);
          expect(letteringByHand(document, "w")?.moved).toBe(1);
          for (const other of [0, 1, 2, 3, 4, 5].filter((one) => one !== letter))
            expect(at(next, other).placement.x).toBeCloseTo(at(straight, other).placement.x, 5);
        },
      ),
      { numRuns: 60 },
    );
  });

  it("keeps what one letter was turned and resized by alone, in mirrored lettering too", () => {
    fc.assert(
      fc.property(hand, fc.double({ min: -80, max: 80, noNaN: true }), (moved, by) => {
        const whole = handled(added(), { ...moved, scale: 1 });
        const { id, placement } = at(whole, 3);
        const turned = turnPieces(whole, { pieceIds: [id], by, about: placement });
        const document = scalePieces(turned, { pieceIds: [id], by: 1.5, about: placement });
        const [own, base] = [again(document, { letterSpacing: 6 }), again(whole, { letterSpacing: 6 })].map(
          (next) => at(next, 3).placement,
        );
        if (!own || !base) throw new Error("No letter.");
        const difference = own.turn - base.turn - by;
        expect(difference - 360 * Math.round(difference / 360)).toBeCloseTo(0, 5);
        expect(own.scale).toBeCloseTo(1.5, 6);
        expect([own.x, own.y]).toEqual([expect.closeTo(base.x, 5), expect.closeTo(base.y, 5)]);
      }),
      { numRuns: 60 },
    );
  });

  it("gives the letters of the words, and keeps the pieces of letters that are still the same", () => {
    const document = added({ words: "ORERY" });
    const next = again(document, { words: "ORRERY BOOKS" });
    expect(reads(next)).toBe("ORRERYBOOKS");
    expect(at(next, 0).id).toBe(at(document, 0).id);
    expect(next.layers[0]?.pieces.map(({ reads: text }) => text).join("")).toBe("ORRERYBOOKS");
    expect(new Set(idsOf(next)).size).toBe(11);
    expect(isSound(next)).toBe(true);
    const shorter = again(next, { words: "BOOKS" });
    expect(reads(shorter)).toBe("BOOKS");
    expect([0, 1, 2, 3, 4].map((letter) => at(shorter, letter).id)).toEqual(
      [7, 8, 9, 10, 11].map((letter) => at(next, letter).id),
    );
    expect(at(shorter, 0).name).toBe("Letter 1: B");
  });

  it("drops the shift of a letter that is another now", () => {
    const whole = added();
    const shifted = movePieces(whole, { pieceIds: [at(whole, 2).id], dx: 0, dy: 9 });
    expect(at(again(shifted, { words: "ORDERY" }), 2).placement.y).toBeCloseTo(at(whole, 0).placement.y, 0);
    expect(at(again(shifted, { words: "ORRERX" }), 2).placement.y).toBeCloseTo(at(shifted, 2).placement.y, 3);
  });

  it("leaves out what was taken out by hand, unless it is to be put back", () => {
    const whole = added();
    const document = removePieces(whole, { pieceIds: [at(whole, 1).id] });
    expect(letteringByHand(document, "w")?.out).toBe(1);
    expect(reads(again(document, { letterSpacing: 3 }))).toBe("ORERY");
    expect(reads(again(document, { letterSpacing: 3 }, { putBack: true }))).toBe("ORRERY");
    expect(reads(again(document, {}, { putBack: true }))).toBe("ORRERY");
  });

  it("sets each copy of doubled lettering where it lies", () => {
    const one = added();
    const copy = one.layers.map((layer) => ({
      ...layer,
      key: "C",
      pieces: layer.pieces.map((piece) => ({
        ...piece,
        id: `${piece.id}-copy`,
        placement: { ...piece.placement, y: piece.placement.y + 90 },
      })),
    }));
    const next = again({ ...one, layers: [...one.layers, ...copy] }, { words: "ORREY" });
    expect(next.layers.map((layer) => layer.pieces.map((piece) => piece.reads).join(""))).toEqual(["ORREY", "ORREY"]);
    const [b, c] = next.layers.map((layer) => layer.pieces[0]?.placement);
    expect((c?.y ?? 0) - (b?.y ?? 0)).toBeCloseTo(90, 5);
    expect(isSound(next)).toBe(true);
  });

  it("does nothing while a layer with its letters is locked, or for lettering that is not there", () => {
    const document = added();
    const locked = { ...document, layers: document.layers.map((layer) => ({ ...layer, locked: true })) };
    expect(again(locked, { words: "OTHER" })).toBe(locked);
    expect(letteringByHand(locked, "w")?.lockedLayer).toBe("B");
    const none = emptyMockup();
    expect(again(none)).toBe(none);
    expect(letteringByHand(none, "w")).toBeNull();
  });

  it("takes standoff holes along with their letters, and out with those that go", () => {
    const bonded = added({ words: "HO", capHeight: 120 });
    const hole = (id: string, x: number, y: number, fixed: boolean) => ({ id, x, y, diameter: 8, fixed });
    const [h, o] = [at(bonded, 0).placement, at(bonded, 1).placement];
    const document: MockupDocument = {
      ...bonded,
      layers: bonded.layers.map((layer) => ({
        ...layer,
        hold: {
          kind: "standoff",
          hardware: barrel(19),
          offset: 19,
          // In the crossbar of the H, and in the right side of the O.
          holes: [hole("h1", h.x, h.y, true), hole("h2", o.x + 52, o.y, false)],
        },
      })),
    };
    const next = again(document, { words: "HO", capHeight: 120, letterSpacing: 20 });
    const holes = (of: MockupDocument) => of.layers.flatMap(({ hold }) => (hold.kind === "standoff" ? hold.holes : []));
    expect(holes(next)[0]?.x).toBeCloseTo(at(next, 0).placement.x, 5);
    expect((holes(next)[1]?.x ?? 0) - at(next, 1).placement.x).toBeCloseTo(52, 5);
    const gone = again(document, { words: "O", capHeight: 120 });
    expect(holes(gone).map(({ id, fixed }) => [id, fixed])).toEqual([["h2", true]]);
  });
});
