import { describe, expect, it } from "vitest";
import { documentSchema, type Lettering, type MockupDocument } from "#shared/mockup/document.ts";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { idsOfPaste, paste } from "@/features/mockup/model/commands/paste.ts";
import { movePieces } from "@/features/mockup/model/commands/pieces.ts";
import { copiedFromText, copiedToText, copyOf } from "@/features/mockup/model/copied.ts";
import { barrel, brass, cement, emptyMockup, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const words: Lettering = {
  id: "w",
  words: "O",
  face: "any-face",
  fontSha256: "0".repeat(64),
  capHeight: 40,
  letterSpacing: 0,
  kerning: true,
  lineSpacing: 60,
  align: "left",
  along: { kind: "line" },
};

/** B a disc of 275 on four standoffs in the middle of 600 × 400, C a bonded bar of 100 × 20 at 200, 50 that is a letter. */
function sign(): MockupDocument {
  const disc = addPlate(emptyMockup(), {
    shape: { kind: "circle", diameter: 275 },
    site: inside,
    id: "disc",
    name: "Night disc",
    stock: midnight,
    thickness: 4.5,
    hold: { kind: "standoff", hardware: barrel(19) },
  });
  const bar = addPlate(disc, {
    shape: { kind: "rectangle", width: 100, height: 20 },
    site: inside,
    id: "bar",
    name: "Bar",
    stock: brass,
    thickness: 3,
    hold: { kind: "bond", adhesive: cement },
  });
  const moved = movePieces(bar, { pieceIds: ["bar"], dx: -100, dy: -150 });
  return {
    ...moved,
    lettering: [words],
    layers: moved.layers.map((layer) => ({
      ...layer,
      pieces: layer.pieces.map((piece) =>
        piece.id === "bar"
          ? { ...piece, source: { kind: "lettering", letteringId: "w", letter: 0, laid: { x: 0, y: 0, turn: 0 } } }
          : piece,
      ),
    })),
  };
}
function copied(document: MockupDocument, ...pieceIds: string[]) {
  const copy = copyOf(document, pieceIds);
  const read = copy && copiedFromText(copiedToText(copy));
  if (!read?.ok) throw new Error("nothing was copied");
  return read.copied;
}
const how = { id: "n", site: inside };

describe("pasting what was copied", () => {
  it("adds layers of their own with stock, hold, holes and words, under new ids and keys, where they were", () => {
    const document = sign();
    const copy = copied(document, "disc", "bar");
    const done = paste(document, { copied: copy, into: null, ...how });
    expect(done.layers.map(({ key, name, pieces }) => [key, name, pieces.map(({ id }) => id)])).toEqual([
      ["B", "Night disc", ["disc"]],
      ["C", "Bar", ["bar"]],
      ["D", "Night disc 2", ["n-1"]],
      ["E", "Bar 2", ["n-2"]],
    ]);
    expect(idsOfPaste({ copied: copy, id: "n" })).toEqual(["n-1", "n-2"]);
    expect(done.layers[2]?.stock).toEqual(midnight);
    expect(done.layers[2]?.pieces[0]?.placement).toEqual(document.layers[0]?.pieces[0]?.placement);
    const hold = done.layers[2]?.hold;
    const before = document.layers[0]?.hold;
    expect(hold?.kind === "standoff" && before?.kind === "standoff" && hold.holes).toEqual(
      before?.kind === "standoff" && before.holes.map((hole, index) => ({ ...hole, id: `n-h1-${index + 1}` })),
    );
    expect(done.lettering).toEqual([words, { ...words, id: "n-l-1" }]);
    expect(done.layers[3]?.pieces[0]?.source).toMatchObject({ letteringId: "n-l-1", letter: 0 });
    expect(documentSchema.parse(done)).toEqual(done);
  });

  it("puts pieces into a layer on standoffs with the holes, none of them fixed", () => {
    const document = sign();
    const done = paste(document, { copied: copied(document, "disc"), into: "B", ...how });
    const hold = done.layers[0]?.hold;
    const holes = hold?.kind === "standoff" ? hold.holes : [];
    expect(done.layers[0]?.pieces.map(({ id }) => id)).toEqual(["disc", "n-1"]);
    expect(holes.map(({ id }) => id).slice(4)).toEqual(["n-h1-1", "n-h1-2", "n-h1-3", "n-h1-4"]);
    expect(holes.filter(({ fixed }) => fixed)).toHaveLength(1);
    expect(documentSchema.parse(done)).toEqual(done);
  });

  it("puts pieces without their holes into a layer that is bonded", () => {
    const document = sign();
    const done = paste(document, { copied: copied(document, "disc"), into: "C", ...how });
    expect(done.layers[1]?.pieces.map(({ id }) => id)).toEqual(["bar", "n-1"]);
    expect(done.layers[1]?.hold).toEqual(document.layers[1]?.hold);
  });

  it("brings what would lie off a smaller board to its middle, holes with it", () => {
    const document = sign();
    const small = emptyMockup({ board: { outline: { kind: "rectangle" }, width: 400, height: 300, measures: "body" } });
    const done = paste(small, { copied: copied(document, "disc"), into: null, ...how });
    expect(done.layers[0]?.key).toBe("B");
    expect(done.layers[0]?.pieces[0]?.placement).toMatchObject({ x: 200, y: 150 });
    const hold = done.layers[0]?.hold;
    const was = document.layers[0]?.hold;
    const [hole] = hold?.kind === "standoff" ? hold.holes : [];
    const [before] = was?.kind === "standoff" ? was.holes : [];
    expect([hole?.x, hole?.y]).toEqual([(before?.x ?? 0) - 100, (before?.y ?? 0) - 50]);
  });

  it("leaves a locked layer, one that is not there, and a document that has as many layers as it takes", () => {
    const document = sign();
    const copy = copied(document, "bar");
    const shut = { ...document, layers: document.layers.map((layer) => ({ ...layer, locked: true })) };
    expect(paste(shut, { copied: copy, into: "C", ...how })).toBe(shut);
    expect(paste(document, { copied: copy, into: "Z", ...how })).toBe(document);
    const [layer] = document.layers;
    const full = { ...document, layers: Array.from({ length: 60 }, () => layer).filter((one) => one !== undefined) };
    expect(paste(full, { copied: copy, into: null, ...how })).toBe(full);
  });
});

describe("what is kept of a copy", () => {
  it("is the chosen pieces, the holes in them and the words they are of, and which layers were whole", () => {
    const copy = copied(sign(), "bar");
    expect(copy.wholeKeys).toEqual(["C"]);
    expect(copy.document.layers.map(({ key }) => key)).toEqual(["C"]);
    expect(copy.document.lettering).toEqual([words]);
    expect(copied(sign(), "disc").document.lettering).toEqual([]);
    expect(copyOf(sign(), ["nobody"])).toBeNull();
  });

  const good = () => JSON.parse(copiedToText(copied(sign(), "bar")));
  it.each([
    { name: "no JSON", text: "{", why: "What was copied can’t be read. Copy it again." },
    {
      name: "another version",
      text: JSON.stringify({ ...good(), version: 2 }),
      why: "What was copied can’t be read. Copy it again.",
    },
    {
      name: "more than a copy",
      text: JSON.stringify({ ...good(), run: "x" }),
      why: "What was copied can’t be read. Copy it again.",
    },
    {
      name: "an empty copy",
      text: JSON.stringify({ ...good(), document: emptyMockup() }),
      why: "Nothing was copied. Copy it again.",
    },
  ])("$name is refused in words", ({ text, why }) => {
    expect(copiedFromText(text)).toEqual({ ok: false, why });
  });

  it("a document of a later version, or one that breaks a rule, is refused with the reason", () => {
    const later = copiedFromText(JSON.stringify({ ...good(), document: { ...emptyMockup(), version: 99 } }));
    expect(later).toMatchObject({ ok: false, why: expect.stringContaining("made by a later Standproud") });
    const { document, ...rest } = good();
    const bent = { ...document, lettering: [] };
    const broken = copiedFromText(JSON.stringify({ ...rest, document: bent }));
    expect(broken).toMatchObject({ ok: false, why: expect.stringContaining("lettering that is not there") });
  });
});
